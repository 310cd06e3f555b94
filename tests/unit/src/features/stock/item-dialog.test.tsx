// @vitest-environment jsdom
import "@/lib/zod-words.ts";
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act } from "react";
import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { StockItem } from "#shared/contracts/stock.ts";
import type { StockKind } from "#shared/contracts/stock-entry.ts";
import { standardHardware, standardScrews } from "#shared/materials/standard-stock.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { ItemDialog } from "@/features/stock/components/item-dialog.tsx";
import { type Answer, startAnswers } from "../../support/answers.ts";
import { button, field, press, render, type, until } from "../../support/render.tsx";

const id = "00000000-0000-4000-8000-000000000601";
const kept = { id, version: 3, retiredAt: null };
const epoxy: StockItem = {
  ...kept,
  name: "Slow epoxy",
  kind: "adhesive",
  adhesive: { stockId: id, name: "Slow epoxy", family: "epoxy" },
};
const [barrel] = standardHardware;
if (!barrel) throw new Error("There are usual standoffs.");
const standoff: StockItem = { ...kept, name: barrel.name, kind: "hardware", hardware: barrel, quantity: 24 };
const screws: StockItem[] = standardScrews.map((screw, index) => ({
  id: `00000000-0000-4000-8000-00000000070${index}`,
  version: 1,
  retiredAt: null,
  name: screw.name,
  kind: "screw",
  screw,
  quantity: null,
}));

let answers: Answer[];
let server: Awaited<ReturnType<typeof startAnswers>>;
const done: string[] = [];
let closed = 0;

beforeAll(async () => {
  // The document of these tests has no window that could scroll.
  Element.prototype.scrollIntoView = () => undefined;
  server = await startAnswers(({ method }) =>
    method === "GET"
      ? { status: 200, json: { items: screws, next: null } }
      : (answers.shift() ?? { status: 200, json: epoxy }),
  );
});
afterAll(() => server.end());
beforeEach(() => {
  server.asked.length = 0;
  done.length = 0;
  closed = 0;
  answers = [];
});

const sent = () => server.asked.filter(({ method }) => method !== "GET").map(({ body }) => body);

function open(subject: { kind: StockKind } | { item: StockItem }, unit: LengthUnit = "mm") {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  return render(
    <QueryClientProvider client={client}>
      <main tabIndex={-1}>
        <ItemDialog
          shop="copperlark-signs"
          unit={unit}
          subject={subject}
          onClose={() => {
            closed += 1;
          }}
          onDone={(words) => done.push(words)}
        />
      </main>
    </QueryClientProvider>,
  );
}

function select(label: string): HTMLSelectElement {
  const found = [...document.querySelectorAll("label")].find((one) => one.textContent?.trim() === label);
  const control = found && document.getElementById(found.htmlFor);
  if (!(control instanceof HTMLSelectElement)) throw new Error(`no choice is labelled "${label}"`);
  return control;
}
const choose = (label: string, value: string) =>
  act(async () => {
    const control = select(label);
    Object.getOwnPropertyDescriptor(HTMLSelectElement.prototype, "value")?.set?.call(control, value);
    control.dispatchEvent(new Event("change", { bubbles: true }));
  });
/** What the page says under a control. */
const faultOf = (control: HTMLElement): string =>
  (control.getAttribute("aria-describedby") ?? "")
    .split(" ")
    .map((one) => document.getElementById(one)?.textContent ?? "")
    .join(" ");

describe("adding acrylic", () => {
  it("sends colour, thicknesses and sheets; a thickness counts as soon as its field is left", async () => {
    await open({ kind: "acrylic" });
    await type(field("Name"), "Teal");
    await type(field("Colour"), "#1f7a7a");
    await type(field("Thickness"), "6");
    await type(field("Another thickness"), "3");
    await press(button("Take out 6 mm"));
    await press(button("Add a sheet size"));
    await type(field("Long"), "1.22 m");
    await type(field("Wide"), "610");
    await type(field("How many"), "2");
    await press(button("Add to stock"));
    await until(() => done.length > 0);
    expect(sent()).toEqual([
      {
        entry: {
          kind: "acrylic",
          acrylic: {
            name: "Teal",
            colour: "#1F7A7A",
            look: "opaque",
            process: "cast",
            facesDiffer: false,
            densityKgM3: 1190,
          },
          thicknessesMm: [3],
          sheets: [{ thicknessMm: 3, widthMm: 1220, heightMm: 610, quantity: 2 }],
        },
      },
    ]);
  });

  it("says what is missing at each field, goes to the first, and sends nothing", async () => {
    await open({ kind: "acrylic" });
    await type(field("Colour"), "teal");
    await press(button("Add to stock"));
    expect(document.activeElement).toBe(field("Name"));
    expect(faultOf(field("Name"))).toContain("Write a name.");
    expect(faultOf(field("Colour"))).toContain("Write a colour as #");
    await type(field("Colour"), "#1F7A7A");
    expect(faultOf(field("Colour"))).not.toContain("Write a colour");
    await type(field("Name"), "Teal");
    expect(faultOf(field("Thickness"))).toContain("Add at least one thickness.");
    expect(sent()).toEqual([]);
  });
});

describe("adding wood", () => {
  it("fills gravity and movement from the species by how it is sawn", async () => {
    await open({ kind: "wood" });
    await choose("Species", "black walnut");
    expect(field("Name").value).toBe("Black walnut");
    // Wood Handbook GTR-190: gravity 0.55 (table 5-3), 0.274 % flatsawn and 0.190 % quartersawn (table 13-5).
    expect([field("Specific gravity").value, field("Movement across the grain").value]).toEqual(["0.55", "0.274"]);
    await choose("Sawn", "quartersawn");
    expect(field("Movement across the grain").value).toBe("0.19");
    await type(field("Thickness"), "18");
    await press(button("Add to stock"));
    await until(() => done.length > 0);
    expect(sent()).toMatchObject([
      { entry: { wood: { gravity: 0.55, movementPerPoint: 0.0019, hardness: "hardwood", moisturePercent: 8 } } },
    ]);
  });

  it("knows a wood of the shop's own by no species", async () => {
    await open({ kind: "wood" });
    await choose("Species", "white ash");
    await type(field("Movement across the grain"), "0,3");
    expect(select("Species").value).toBe("");
    expect(select("Sawn").disabled).toBe(true);
  });
});

describe("a standoff", () => {
  it("is drawn as it is written, and says which measures don't agree", async () => {
    await open({ item: standoff });
    const drawing = () => document.querySelector("svg[role=img]")?.getAttribute("aria-label") ?? "";
    expect(drawing()).toContain("1 Barrel, long: 12;");
    await type(field("1  Barrel, long"), "13");
    expect(drawing()).toContain("1 Barrel, long: 13;");
    await press(button("Save"));
    expect(faultOf(field("1  Barrel, long"))).toBe(
      "Bore and floor make 12 mm, the barrel is 13 mm. One of the three is wrong.",
    );
    await type(field("3  Bore, deep"), "10.5");
    await press(button("Save"));
    await until(() => done.length > 0);
    expect(sent()).toMatchObject([
      { version: 3, entry: { hardware: { barrelLength: 13, boreDepth: 10.5 }, quantity: 24 } },
    ]);
  });

  it("takes its screw from the stock", async () => {
    await open({ item: standoff });
    await until(() => select("Wood screw").options.length > 3);
    expect(select("Wood screw").selectedOptions[0]?.textContent).toBe("No. 6 × 16, flat head");
    await choose("Wood screw", "5");
    await press(button("Save"));
    await until(() => done.length > 0);
    expect(sent()).toMatchObject([{ entry: { hardware: { screw: { name: "No. 6 × 38, flat head", length: 38 } } } }]);
  });

  it("may have a screw of its own, with its own fields", async () => {
    await open({ item: standoff });
    await until(() => select("Wood screw").options.length > 3);
    await choose("Wood screw", "own");
    await choose("Number", "8");
    await press(button("Save"));
    expect(faultOf(field("6  Floor hole, across"))).toContain("The screw's shank is 4.17 mm");
    expect(sent()).toEqual([]);
  });

  it("asks for a screw in words while there is none", async () => {
    await open({ kind: "hardware" });
    await until(() => select("Wood screw").options.length > 3);
    await type(field("Name"), "New");
    await press(button("Add to stock"));
    expect(faultOf(select("Wood screw"))).toContain("Choose the screw that holds it.");
  });
});

describe("a screw", () => {
  it("is filled by its number and named by what it is", async () => {
    await open({ kind: "screw" }, "in");
    await choose("Number", "8");
    await type(field("Length"), "1 1/4");
    expect(field("Name").value).toBe("No. 8 × 1 1/4″, flat head");
    expect(field("Head, across").value).toBe("0.332″");
    await press(button("Add to stock"));
    await until(() => done.length > 0);
    expect(sent()).toMatchObject([{ entry: { kind: "screw", screw: { gauge: 8, length: 31.75 }, quantity: null } }]);
  });
});

describe("an adhesive", () => {
  it("shows its family's cautions", async () => {
    await open({ item: epoxy });
    expect(document.body.textContent).toContain("wear gloves");
    await choose("Family", "solvent cement");
    expect(document.body.textContent).toContain("Flammable vapour");
    expect(document.body.textContent).not.toContain("wear gloves");
  });
});

describe("saving", () => {
  const problem = (status: number, code: string, rest: object = {}): Answer => ({
    status,
    json: { type: `/problems/${code}`, title: "No.", status, code, detail: "In words.", ...rest },
  });

  it("lays another's change before the writer, who may save over it", async () => {
    const theirs = { ...epoxy, version: 4, name: "Quick epoxy", adhesive: { ...epoxy.adhesive, name: "Quick epoxy" } };
    answers = [problem(409, "stale", { extra: { newer: theirs } })];
    await open({ item: epoxy });
    await type(field("Name"), "Our epoxy");
    await press(button("Save"));
    await until(() => document.body.textContent?.includes("They saved it as “Quick epoxy”."));
    expect(field("Name").value).toBe("Our epoxy");
    await press(button("Save mine over it"));
    await until(() => done.length > 0);
    expect(sent()).toMatchObject([{ version: 3 }, { version: 4, entry: { adhesive: { name: "Our epoxy" } } }]);
  });

  it("takes theirs when asked to, and goes on from there", async () => {
    const theirs = { ...epoxy, version: 4, name: "Quick epoxy", adhesive: { ...epoxy.adhesive, name: "Quick epoxy" } };
    answers = [problem(409, "stale", { extra: { newer: theirs } })];
    await open({ item: epoxy });
    await type(field("Name"), "Our epoxy");
    await press(button("Save"));
    await until(() => document.body.textContent?.includes("Take theirs"));
    await press(button("Take theirs"));
    expect(field("Name").value).toBe("Quick epoxy");
    expect(button("Save").disabled).toBe(true);
  });

  it("puts a refused name at its field", async () => {
    answers = [
      problem(409, "already_exists", {
        errors: [{ pointer: "/entry/adhesive/name", detail: "It is in stock already." }],
      }),
    ];
    await open({ item: epoxy });
    await type(field("Name"), "Wood glue");
    await press(button("Save"));
    await until(() => faultOf(field("Name")).includes("It is in stock already."));
    expect(document.activeElement).toBe(field("Name"));
    expect(done).toEqual([]);
  });

  it("is asked about before what was written is thrown away", async () => {
    await open({ item: epoxy });
    await press(button("Close"));
    expect(closed).toBe(1);
    await type(field("Name"), "Our epoxy");
    await press(button("Close"));
    expect(closed).toBe(1);
    await press(button("Close it"));
    expect(closed).toBe(2);
  });
});
