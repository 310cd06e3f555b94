// @vitest-environment jsdom
import { act, useReducer, useState } from "react";
import { beforeEach, describe, expect, it } from "vitest";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { DeskContext } from "@/features/mockup/editor/desk-context.ts";
import { type Editor, nextEditor, startEditor } from "@/features/mockup/model/editor.ts";
import { BoardDialog } from "@/features/mockup/panels/board-dialog.tsx";
import { button, field, press, render, type, until } from "../../support/render.tsx";
import { buildDesk } from "./build-desk.ts";
import { emptyMockup, pine } from "./sample-mockup.ts";

let editor: Editor;
let isOpen: boolean;

function Page({ document, unit, at }: { document: MockupDocument; unit: LengthUnit; at?: "finish" }) {
  const [held, dispatch] = useReducer(nextEditor, document, startEditor);
  const [open, setOpen] = useState(true);
  editor = held;
  isOpen = open;
  const stock = { acrylics: [], woods: [{ wood: pine, thicknessesMm: [18, 20] }], hardware: [], adhesives: [] };
  const desk = buildDesk(held, dispatch, { unit, stock });
  return (
    <DeskContext value={desk}>
      <BoardDialog open={open} onOpenChange={setOpen} {...(at ? { at } : {})} />
    </DeskContext>
  );
}

const finish: MockupDocument["backer"]["finish"] = [
  { kind: "sanding", grit: 180 },
  { kind: "stain", name: "Umber", colour: "#4A2B12", strength: 0.5, dryingHours: 8 },
];
const show = (more: { at?: "finish"; unit?: LengthUnit; coats?: MockupDocument["backer"]["finish"] } = {}) => {
  const { at, unit = "mm", coats = finish } = more;
  const base = emptyMockup();
  const document = { ...base, backer: { ...base.backer, finish: coats } };
  return render(<Page document={document} unit={unit} {...(at ? { at } : {})} />);
};
const present = () => editor.history.present;
const says = (text: string) => document.body.textContent?.includes(text) ?? false;
const focusedName = () => document.activeElement?.getAttribute("aria-label") ?? document.activeElement?.textContent;
const coatsShown = () =>
  [...document.querySelectorAll('ol[aria-label="Coats, first to last"] > li')].map((one) =>
    one.getAttribute("aria-label"),
  );

async function choose(label: string, value: string) {
  const found = [...document.querySelectorAll("label")].find((one) => one.textContent?.trim() === label);
  const select = found && document.getElementById(found.htmlFor);
  if (!(select instanceof HTMLSelectElement)) throw new Error(`no choice is labelled "${label}"`);
  await act(async () => {
    Object.getOwnPropertyDescriptor(HTMLSelectElement.prototype, "value")?.set?.call(select, value);
    select.dispatchEvent(new Event("change", { bubbles: true }));
  });
}

/** The tables of the page ask for one; nothing here has a size that could change. */
class NoSizes implements ResizeObserver {
  observe() {}
  unobserve() {}
  disconnect() {}
}

beforeEach(() => {
  globalThis.ResizeObserver ??= NoSizes;
  // Names of coats are looked up by their ids, as a browser does.
  globalThis.CSS ??= {} as typeof CSS;
  CSS.escape ??= (text: string) => text;
});

describe("the board's dialog", () => {
  it("puts everything that was written into the drawing as one step", async () => {
    await show();
    await choose("Outline", "ellipse");
    await choose("Grain runs", "90");
    await choose("The sign is", "lying");
    await type(field("Width"), "700");
    await type(field("The wall’s fixing carries"), "25");
    await press(button("Spread them evenly"));
    await press(button("Change the board"));
    expect(isOpen).toBe(false);
    expect(editor.history.past.map(({ label }) => label)).toEqual(["Change the board"]);
    expect(present().board).toMatchObject({ outline: { kind: "ellipse" }, width: 700, height: 400 });
    expect(present().backer).toMatchObject({ grainTurn: 90, finish });
    expect(present().hanging).toMatchObject({ pose: "lying", carriesKg: 25, gap: 8, kind: "cleat" });
    expect(present().hanging.points.map(({ x }) => x)).toEqual([175, 525]);
  });

  it("makes no step when nothing was written", async () => {
    await show();
    await press(button("Change the board"));
    expect(isOpen).toBe(false);
    expect(editor.history.past).toEqual([]);
  });

  it("says at the field what is wrong, takes nothing, and keeps what was written", async () => {
    await show();
    await type(field("Width"), "19");
    await type(field("Height"), "");
    expect(says("From 20 mm to 10000 mm.")).toBe(true);
    expect(field("Height").getAttribute("aria-invalid")).toBeNull();
    await press(button("Change the board"));
    expect(isOpen).toBe(true);
    expect(field("Width").getAttribute("aria-invalid")).toBe("true");
    expect(field("Height").getAttribute("aria-invalid")).toBe("true");
    expect(field("Width").value).toBe("19");
    expect(editor.history.past).toEqual([]);
  });

  it("asks before it throws away what was written, and not when nothing was", async () => {
    await show();
    await type(field("Width"), "640");
    await press(button("Cancel"));
    expect(says("Leave the board as it was?")).toBe(true);
    await press(button("Go on writing"));
    expect(field("Width").value).toBe("640");
    await press(button("Cancel"));
    await press(button("Leave it as it was"));
    expect(isOpen).toBe(false);
    expect(present().board.width).toBe(600);

    await show();
    await press(button("Cancel"));
    expect(isOpen).toBe(false);
  });

  it("asks for the load in pounds at a shop that works in inches", async () => {
    await show({ unit: "in" });
    await type(field("The wall’s fixing carries"), "44");
    await press(button("Change the board"));
    // 44 · 0.45359237
    expect(present().hanging.carriesKg).toBe(19.958);
  });
});

describe("the coats of the finish", () => {
  it("begin under the focus when the finish was pressed in the schedule", async () => {
    await show({ at: "finish" });
    await until(() => focusedName() === "Finish");
    expect(says("sanded to 180, Umber, dries 8 hours in all")).toBe(true);
  });

  it("are added at the end with the focus in them, and summed", async () => {
    await show();
    await press(button("clear coat"));
    expect(coatsShown()).toEqual(["Coat 1, Sanding", "Coat 2, Stain", "Coat 3, Clear coat"]);
    expect(document.activeElement?.closest("li")?.getAttribute("aria-label")).toBe("Coat 3, Clear coat");
    expect(says("dries 10 hours in all")).toBe(true);
    await press(button("Change the board"));
    expect(present().backer.finish.at(-1)).toMatchObject({ kind: "clear coat", base: "water-borne", dryingHours: 2 });
  });

  it("change places by keys, with the focus going along", async () => {
    await show();
    await press(button("conditioner"));
    await press(button("Coat 3 earlier"));
    expect(coatsShown()).toEqual(["Coat 1, Sanding", "Coat 2, Conditioner", "Coat 3, Stain"]);
    expect(focusedName()).toBe("Coat 2 earlier");
    await press(button("Coat 2 earlier"));
    expect(focusedName()).toBe("Coat 1 later");
    expect(button("Coat 1 earlier").disabled).toBe(true);
    await press(button("Change the board"));
    expect(present().backer.finish.map(({ kind }) => kind)).toEqual(["conditioner", "sanding", "stain"]);
  });

  it("are removed one by one, down to bare wood", async () => {
    await show();
    await press(button("Remove coat 1"));
    expect(coatsShown()).toEqual(["Coat 1, Stain"]);
    expect(document.activeElement?.closest("li")?.getAttribute("aria-label")).toBe("Coat 1, Stain");
    await press(button("Remove coat 1"));
    expect(says("The wood stays bare.")).toBe(true);
    await press(button("Change the board"));
    expect(present().backer.finish).toEqual([]);
  });

  it("of which one has no name are not taken, and the drawing keeps its own", async () => {
    await show();
    await press(button("other"));
    await press(button("Change the board"));
    expect(says("Give the coat a name.")).toBe(true);
    expect(isOpen).toBe(true);
    expect(present().backer.finish).toEqual(finish);
  });

  it("are twelve at the most", async () => {
    await show({ coats: Array.from({ length: 12 }, () => ({ kind: "sanding" as const, grit: 120 })) });
    expect(button("stain").disabled).toBe(true);
    expect(says("12 coats are the most.")).toBe(true);
  });
});
