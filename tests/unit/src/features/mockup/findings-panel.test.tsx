// @vitest-environment jsdom
import { QueryClient, QueryClientProvider } from "@tanstack/react-query";
import { act } from "react";
import { MemoryRouter } from "react-router-dom";
import { afterEach, beforeEach, describe, expect, it } from "vitest";
import type { Role } from "#shared/contracts/account.ts";
import type { SetAside } from "#shared/contracts/set-asides.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import type { Mend } from "#shared/dry-fit/mend.ts";
import { boundFinding } from "#shared/dry-fit/set-aside.ts";
import { useSettingAside } from "@/features/mockup/editor/use-setting-aside.ts";
import { useStandings } from "@/features/mockup/editor/use-standings.ts";
import { FindingsPanel } from "@/features/mockup/panels/findings-panel.tsx";
import { type Reader, ReaderContext } from "@/lib/shop-context.ts";
import { type Asked, startAnswers } from "../../support/answers.ts";
import { button, press, render, until } from "../../support/render.tsx";

const jobId = "00000000-0000-4000-8000-000000000007";
const place = { shop: "copperlark-signs", jobId };
const thin: Finding = {
  rule: 3,
  title: "Thin stroke",
  severity: "stop",
  text: "Ring of C is 1.82 mm at its thinnest.",
  layerKey: "C",
  pieceIds: ["ring"],
  holeId: null,
  where: { x: 10, y: 20 },
  value: 1.82,
  limit: 2,
  unit: "mm",
  source: "common practice",
};
const heavy: Finding = { ...thin, rule: 36, title: "Hanging", text: "The fixing carries 20 kg.", layerKey: null };
const asideOf = (finding: Finding, id = "00000000-0000-4000-8000-0000000000a1"): SetAside => ({
  id,
  finding: boundFinding(finding),
  reason: "Drawn so by the client",
  by: "Ada Maker",
  at: "2026-12-01T09:00:00.000Z",
  can: { takeBack: true },
});

let kept: SetAside[];
let refusal: { code: string; detail: string } | null;
let server: Awaited<ReturnType<typeof startAnswers>>;
function answer({ method, path, body }: Asked) {
  if (method === "GET") return { status: 200, json: { items: kept, next: null } };
  if (refusal) return { status: 409, json: { type: "/problems/x", title: "No.", status: 409, ...refusal } };
  if (method === "DELETE") kept = kept.filter(({ id }) => !path.endsWith(id));
  else kept = [{ ...asideOf(thin), ...(body as Pick<SetAside, "finding" | "reason">) }, ...kept];
  return method === "DELETE" ? { status: 204 } : { status: 201, json: kept[0] };
}
beforeEach(async () => {
  kept = [];
  refusal = null;
  server = await startAnswers(answer);
});
afterEach(() => server.end());
const written = () => server.asked.filter(({ method }) => method !== "GET");

type Given = {
  findings: readonly Finding[];
  mends?: readonly Mend[];
  onMend?: (mend: Mend) => void;
  role?: Role;
  editing?: boolean;
  save?: () => Promise<number | null>;
};

function Panel({ findings, mends = [], onMend, editing = true, save = async () => 4 }: Given) {
  const standings = useStandings(place, findings);
  const settingAside = useSettingAside({ ...place, save });
  return (
    <FindingsPanel
      dryFit={{ findings, fine: 9 }}
      mends={findings.map(() => mends)}
      standings={standings}
      isCurrent
      onShow={() => undefined}
      {...(editing ? { settingAside } : {})}
      {...(onMend ? { onMend } : {})}
    />
  );
}

const reader = (role: Role): Reader => ({
  shop: {
    slug: place.shop,
    name: "Copperlark Signs",
    unit: "mm",
    jobPrefix: "CL",
    paper: "A3",
    timeZone: "UTC",
    buildDays: 5,
    freightDays: 2,
    demo: false,
    can: {
      changeShop: false,
      manageTeam: false,
      openJob: true,
      seeClients: true,
      seeStock: true,
      changeStock: false,
      seePrices: false,
      seePortfolio: true,
      sharePortfolio: false,
      seeOutgoingMail: false,
    },
  },
  person: {
    id: "00000000-0000-4000-8000-000000000001",
    name: "Ada Maker",
    email: "ada@copperlark.example",
    hasPassword: true,
  },
  side: "shop",
  role,
  client: null,
});
const page = (given: Given, client: QueryClient) => (
  <MemoryRouter>
    <QueryClientProvider client={client}>
      <ReaderContext value={reader(given.role ?? "maker")}>
        <Panel {...given} />
      </ReaderContext>
    </QueryClientProvider>
  </MemoryRouter>
);
async function show(given: Given) {
  const client = new QueryClient({ defaultOptions: { queries: { retry: false } } });
  const { redraw } = await render(page(given, client));
  await until(() => document.querySelector('[aria-busy="false"]'));
  return (next: Given) => redraw(page(next, client));
}

const says = (text: string) => document.body.textContent?.replaceAll("\u00a0", " ").includes(text) ?? false;
const summary = () => document.querySelector("h2 [role=status]")?.textContent;
const asideRegion = () => document.querySelector('section[aria-label="Set aside"]');
const area = (): HTMLTextAreaElement => {
  const found = document.querySelector("textarea");
  if (!found) throw new Error("no form is open");
  return found;
};
async function write(text: string) {
  await act(async () => {
    // React listens to the element's own setter, so the text goes in past it.
    Object.getOwnPropertyDescriptor(HTMLTextAreaElement.prototype, "value")?.set?.call(area(), text);
    area().dispatchEvent(new Event("input", { bubbles: true }));
  });
}
const buttonNames = () => [...document.querySelectorAll("button")].map((one) => one.textContent);

it("offers what mends a finding, and hands over the one that is pressed", async () => {
  const pressed: Mend[] = [];
  const mends: Mend[] = [
    { label: "Move it in by 2 mm", steps: [{ kind: "move pieces", pieceIds: ["p"], dx: 2, dy: 0 }] },
    { label: "Take 6 mm sheet", steps: [{ kind: "thickness", layerKey: "B", thickness: 6 }] },
  ];
  const redraw = await show({ findings: [thin], mends, onMend: (mend) => pressed.push(mend) });
  expect(buttonNames()).toEqual(expect.arrayContaining(["Move it in by 2 mm", "Take 6 mm sheet"]));
  const second = [...document.querySelectorAll("button")].find(({ textContent }) => textContent === "Take 6 mm sheet");
  await act(async () => second?.click());
  expect(pressed).toEqual([mends[1]]);
  // What was pressed is gone until the next run: the focus is not lost with it.
  expect(document.activeElement?.textContent).toContain("Dry fit");
  await redraw({ findings: [thin], mends });
  expect(buttonNames()).not.toContain("Take 6 mm sheet");
});

describe("setting a finding aside", () => {
  it("asks why, sends the saved version's finding, and moves it below with reason, name and day", async () => {
    await show({ findings: [thin] });
    expect(summary()).toBe("1 stop, 9 fine");
    await press(button("Set aside: Thin stroke of C"));
    expect(document.activeElement).toBe(area());
    await write("Drawn so by the client");
    await press(button("Set aside"));
    await until(() => asideRegion());
    expect(written()).toEqual([
      {
        method: "POST",
        path: `/api/shops/copperlark-signs/jobs/${jobId}/set-asides`,
        body: { mockupVersion: 4, finding: boundFinding(thin), reason: "Drawn so by the client" },
      },
    ]);
    expect(asideRegion()?.textContent).toContain("“Drawn so by the client”Ada Maker, 1 Dec 2026");
    expect(summary()).toBe("1 set aside, 9 fine");
    await until(() => document.activeElement === asideRegion()?.querySelector("h3"));
  });

  it("sends nothing without a reason, and gives the focus back when it is left by Escape", async () => {
    await show({ findings: [thin] });
    await press(button("Set aside: Thin stroke of C"));
    await write("  ok ");
    await press(button("Set aside"));
    expect(says("Say why, in a few words.")).toBe(true);
    expect(area().getAttribute("aria-invalid")).toBe("true");
    await act(async () => area().dispatchEvent(new KeyboardEvent("keydown", { key: "Escape", bubbles: true })));
    expect(document.querySelector("textarea")).toBeNull();
    expect(document.activeElement).toBe(button("Set aside: Thin stroke of C"));
    expect(written()).toEqual([]);
  });

  it("says under the reason what the server refused, and keeps what was written", async () => {
    refusal = { code: "already_exists", detail: "Ben Owner has set this aside already: as meant" };
    await show({ findings: [thin] });
    await press(button("Set aside: Thin stroke of C"));
    await write("Drawn so by the client");
    await press(button("Set aside"));
    await until(() => says("Ben Owner has set this aside already: as meant"));
    expect(area().value).toBe("Drawn so by the client");
  });

  it("sends nothing when the mockup could not be saved", async () => {
    await show({ findings: [thin], save: async () => null });
    await press(button("Set aside: Thin stroke of C"));
    await write("Drawn so by the client");
    await press(button("Set aside"));
    await until(() => says("The mockup could not be saved, so nothing was set aside."));
    expect(written()).toEqual([]);
  });
});

describe("what was set aside", () => {
  it("stands again when its value changes, says what it was, and keeps a form open meanwhile", async () => {
    kept = [asideOf(thin)];
    const redraw = await show({ findings: [thin] });
    expect(summary()).toBe("1 set aside, 9 fine");
    await redraw({ findings: [{ ...thin, value: 1.64 }] });
    expect(summary()).toBe("1 stop, 9 fine");
    expect(asideRegion()).toBeNull();
    expect(says("Ada Maker set this aside on 1 Dec 2026: “Drawn so by the client”")).toBe(true);
    expect(says("The value was 1.82 mm then, it is 1.64 mm now.")).toBe(true);
    await press(button("Set aside: Thin stroke of C"));
    await write("Thinner still");
    await redraw({ findings: [{ ...thin, value: 1.5 }] });
    expect(area().value).toBe("Thinner still");
    expect(says("it is 1.5 mm now.")).toBe(true);
  });

  it("is taken back with a press, and the focus goes to what stands", async () => {
    kept = [asideOf(thin)];
    await show({ findings: [thin] });
    await press(button("Take back: Thin stroke of C"));
    await until(() => asideRegion() === null);
    expect(written()).toEqual([
      {
        method: "DELETE",
        path: `/api/shops/copperlark-signs/jobs/${jobId}/set-asides/${asideOf(thin).id}`,
        body: null,
      },
    ]);
    expect(summary()).toBe("1 stop, 9 fine");
    await until(() => document.activeElement === document.querySelector("h2"));
  });
});

describe("who is offered what", () => {
  it("a maker is told that a safety stop is an owner's, and an owner may", async () => {
    await show({ findings: [thin, heavy], role: "maker" });
    expect(buttonNames().filter((name) => name?.startsWith("Set aside"))).toHaveLength(1);
    expect(says("A stop about safety: only an owner can set it aside.")).toBe(true);
    await show({ findings: [thin, heavy], role: "owner" });
    expect(buttonNames().filter((name) => name?.startsWith("Set aside"))).toHaveLength(2);
    expect(says("only an owner")).toBe(false);
  });

  it("a rep, and whoever only looks at it, reads it all and is offered nothing", async () => {
    kept = [asideOf(thin)];
    await show({ findings: [thin, heavy], role: "rep" });
    expect(asideRegion()?.textContent).toContain("Drawn so by the client");
    expect(buttonNames().filter((name) => name?.startsWith("Set aside"))).toEqual([]);
    expect(says("only an owner")).toBe(false);
    await show({ findings: [thin, heavy], role: "owner", editing: false });
    expect(asideRegion()?.textContent).toContain("Ada Maker, 1 Dec 2026");
    expect(buttonNames().filter((name) => /^(Set aside|Take back)/.test(name ?? ""))).toEqual([]);
  });
});

describe("many findings", () => {
  const remark: Finding = {
    ...thin,
    rule: 18,
    title: "Adhesive",
    severity: "remark",
    text: "Wicking cement bonds C, Rings: it can be moved after 30 minutes, and is at its full strength after 24 hours. Air the room, keep flames away, and test on scrap of the same sheet first.",
    pieceIds: [],
    value: 24,
    unit: "h",
  };
  const caution = (index: number): Finding => ({
    ...thin,
    rule: 1,
    title: "Unsupported",
    severity: "caution",
    text: `Letter ${index} lies on nothing.`,
    pieceIds: [`letter ${index}`],
  });
  const six = Array.from({ length: 6 }, (_, index) => caution(index));
  const isHidden = (text: string) => {
    const item = [...document.querySelectorAll("li")].findLast((one) => one.textContent?.includes(text));
    if (!item) throw new Error(`nothing says "${text}"`);
    return item.closest("[hidden]") !== null;
  };
  beforeEach(() => window.sessionStorage.clear());

  it("stand as stops, then the first cautions of a rule, and remarks wait behind their count, which is of all", async () => {
    await show({ findings: [thin, ...six, remark] });
    expect(summary()).toBe("1 stop, 6 cautions, 1 remark, 9 fine");
    expect([...document.querySelectorAll("ul")].map((list) => list.getAttribute("aria-label"))).toEqual([
      "Stops",
      "Cautions",
      "More: Unsupported",
      "Remarks",
    ]);
    expect(isHidden("Letter 2")).toBe(false);
    expect(isHidden("Letter 3")).toBe(true);
    expect(isHidden("Wicking cement")).toBe(true);
    await press(button("3 more: Unsupported"));
    expect(isHidden("Letter 5")).toBe(false);
    await press(button("1 remark"));
    expect(button("1 remark").getAttribute("aria-expanded")).toBe("true");
    expect(isHidden("Wicking cement")).toBe(false);
  });

  it("stay open in this tab once they were opened", async () => {
    await show({ findings: [remark] });
    await press(button("1 remark"));
    await show({ findings: [remark] });
    expect(isHidden("Wicking cement")).toBe(false);
    await press(button("1 remark"));
    await show({ findings: [remark] });
    expect(isHidden("Wicking cement")).toBe(true);
  });

  it("say a long remark's first sentence and the rest on demand, but a stop in full", async () => {
    await show({ findings: [{ ...remark, severity: "stop" }, remark] });
    await press(button("1 remark"));
    const items = () => [...document.querySelectorAll("li")].map((one) => one.textContent ?? "");
    expect(items()[0]).toContain("keep flames away");
    expect(items()[1]).not.toContain("keep flames away");
    await press(button("More of this: Adhesive"));
    expect(items()[1]).toContain("keep flames away");
    await press(button("Less of this: Adhesive"));
    expect(items()[1]).not.toContain("keep flames away");
  });

  it("lead to the calculation of their rule, where there is one", async () => {
    const bed: Finding = { ...thin, rule: 21, title: "Bed", pieceIds: ["plate"] };
    await show({ findings: [thin, bed] });
    const links = [...document.querySelectorAll("li")].map((one) => one.querySelector("a")?.getAttribute("href"));
    expect(links).toEqual(["/shop/copperlark-signs/how-we-work-it-out#thinnest-stroke", undefined]);
  });
});

it("lets every finding stand, and says so, when what is set aside can't be loaded", async () => {
  server.end();
  server = await startAnswers(() => ({ status: 500 }));
  await show({ findings: [thin] });
  expect(summary()).toBe("1 stop, 9 fine");
  expect(says("What was set aside could not be loaded.")).toBe(true);
});
