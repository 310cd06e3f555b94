import { describe, expect, it } from "vitest";
import { countParts } from "#shared/cut-plan/counts.ts";
import { sheetTasks } from "#shared/cut-plan/sheet-tasks.ts";
import { usualSaws } from "#shared/cut-plan/shop-saws.ts";
import { listToBuy } from "#shared/cut-plan/to-buy.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { adhesiveFits } from "#shared/dry-fit/rules/adhesive-fits.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { standardAdhesives, standardStock } from "#shared/materials/standard-stock.ts";
import type { Hold, MockupDocument } from "#shared/mockup/document.ts";
import type { SheetLayout } from "#shared/sheets/nesting.ts";
import {
  buildCapStud,
  buildHardware,
  buildLayer,
  buildSign,
  hole,
  plate,
  standoffHold,
} from "../../../support/build-sign.ts";
import { findingsOf } from "../../../support/dry-fit.ts";

const adhesive = (family: string) => {
  const found = standardAdhesives.find((one) => one.family === family);
  if (!found) throw new Error(`The standard stock has no ${family}.`);
  return found;
};
const wicked: Hold = { kind: "bond", adhesive: adhesive("solvent cement"), tack: adhesive("bodied cement") };
const barrel = buildCapStud({ name: "Barrel 12" });
const stud = buildHardware("blindStud", { name: "Stud", studDiameter: 4, studLength: 22 });

/** Three signs: a panel on four barrels, one hole of it fixed; a panel on two blind studs; three wicked letters. */
const signs = (): MockupDocument => ({
  ...buildSign([
    buildLayer("B", [plate("panel", 300, 200, [300, 200])], {
      hold: standoffHold(
        [
          hole("a", 200, 130, { diameter: 6, fixed: true }),
          hole("b", 400, 130),
          hole("c", 200, 270),
          hole("d", 400, 270),
        ],
        barrel,
      ),
    }),
    buildLayer("C", [plate("floating", 100, 50, [300, 60])], {
      hold: standoffHold([hole("e", 270, 60), hole("f", 330, 60)], stud, 10),
    }),
    buildLayer("D", [plate("1", 20, 20, [250, 200]), plate("2", 20, 20, [300, 200]), plate("3", 20, 20, [350, 200])], {
      hold: wicked,
    }),
    buildLayer("E", []),
  ]),
  quantity: 3,
});

describe("what is laid ready for a build", () => {
  const counts = countParts(signs(), "mm");

  it("counts pieces by layer, of one sign and of all; empty layers ask for nothing", () => {
    expect(counts.layers.map(({ key, each, all }) => [key, each, all])).toEqual([
      ["B", 1, 3],
      ["C", 1, 3],
      ["D", 3, 9],
    ]);
    expect(counts.board).toMatchObject({ thicknessMm: 18, widthMm: 600, heightMm: 400, count: 3 });
  });

  it("counts hardware with the holes it asks for", () => {
    expect(counts.hardware).toMatchObject([
      {
        hardware: { name: "Barrel 12" },
        layers: ["B"],
        count: 12,
        holes: [
          { into: "panel", diameterMm: 6, count: 3 },
          { into: "panel", diameterMm: 8, count: 9 },
        ],
      },
      // 22 of stud, 10 of it in the air, and 1 of room at the bottom.
      { hardware: { name: "Stud" }, count: 6, holes: [{ into: "wood", diameterMm: 4, depthMm: 13, count: 6 }] },
    ]);
  });

  it("counts screws with the drill for the backer: No. 6, root 0.1 in or so, 70 % of it in pine", () => {
    const [screw, ...more] = counts.screws;
    expect(more).toEqual([]);
    expect(screw).toMatchObject({ screw: { gauge: 6 }, count: 12 });
    // 0.7 · root of a No. 6 to the nearest tenth of a mm; the root stands in wood-screw-threads.ts.
    expect(screw?.pilotMm).toBe(2);
  });

  it("says how long each glued joint waits, a tack and what wicks in after it included", () => {
    // 15 minutes between the two, then half an hour; 24 hours and those 15 minutes until it is loaded.
    expect(counts.joints).toMatchObject([
      {
        layerKey: "D",
        pieces: 9,
        handlingHours: 0.75,
        fullHours: 24.25,
        adhesives: [expect.any(String), expect.any(String)],
      },
    ]);
  });
});

it("says the same waiting time as the dry fit, whatever tacks and bonds", async () => {
  const hold: Hold = { kind: "bond", adhesive: adhesive("bodied cement"), tack: adhesive("cyanoacrylate") };
  const sign = buildSign([
    buildLayer("B", [plate("panel", 300, 200, [300, 200])]),
    buildLayer("C", [plate("1", 20, 20, [250, 200])], { hold }),
  ]);
  // 15 minutes between the two, then an hour; 24 hours and those 15 minutes until it is loaded.
  const { joints } = countParts(sign, "mm");
  expect(joints.at(-1)).toMatchObject({ layerKey: "C", handlingHours: 1.25, fullHours: 24.25 });
  const findings = await findingsOf(adhesiveFits, sign);
  expect(findings.find(({ layerKey }) => layerKey === "C")).toMatchObject({ severity: "remark", value: 24.25 });
});

describe("what to buy", () => {
  const counts = countParts(signs(), "mm");
  const layoutOf = (sheets: number): SheetLayout => ({
    sheets: [],
    needed: [{ stockId: "stock-1", sheets }],
    unplaced: [],
    use: 0.5,
    consumedMm2: 1,
    remarks: [],
    stopped: false,
  });
  const [task] = sheetTasks({
    document: signs(),
    stock: standardStock,
    limits: defaultLimits,
    saws: usualSaws,
    unit: "mm",
  });
  if (!task) throw new Error("Nothing is cut.");
  const given = { bars: [], counts, saws: usualSaws, unit: "mm" as const };
  const nobodyCounted = { hardware: [], screws: [] };

  it("takes what is on hand off what is needed, and says where nobody counted", () => {
    const counted = {
      hardware: [
        { hardware: barrel, quantity: 8 },
        { hardware: stud, quantity: null },
      ],
      screws: [{ screw: barrel.screw, quantity: 40 }],
    };
    expect(listToBuy({ ...given, sheets: [], counted })).toEqual([
      { what: "Backer: Eastern white pine, 18 mm, 600 × 400 mm", need: 3, onHand: null, buy: null },
      { what: "Barrel 12", need: 12, onHand: 8, buy: 4 },
      { what: "Stud", need: 6, onHand: null, buy: null },
      { what: barrel.screw.name, need: 12, onHand: 40, buy: 0 },
    ]);
  });

  it("buys where the stock list counts none", () => {
    const sheets = [{ task, layout: layoutOf(2), bought: null }];
    const [line] = listToBuy({ ...given, sheets, counted: nobodyCounted });
    expect(line).toEqual({ what: "Midnight, 3 mm, sheet 1220 × 610 mm", need: 2, onHand: 0, buy: 2 });
  });

  it("buys what the counted sheets are too few for", () => {
    const stock = [
      {
        id: "stock-1",
        name: "Sheet in stock",
        path: rectanglePath({ x: 0, y: 0, width: 600, height: 400 }),
        quantity: 2,
        grainTurn: 0,
        isOffcut: false,
      },
    ];
    const counted = { ...task, sheetsAreCounted: true, request: { ...task.request, stock } };
    const sheets = [{ task: counted, layout: layoutOf(2), bought: layoutOf(1) }];
    expect(listToBuy({ ...given, sheets, counted: nobodyCounted }).slice(0, 2)).toEqual([
      { what: "Midnight, 3 mm, sheet 600 × 400 mm", need: 2, onHand: 2, buy: 0 },
      { what: "Midnight, 3 mm, sheet 1220 × 610 mm", need: 1, onHand: 0, buy: 1 },
    ]);
  });
});
