import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { costOfSign, unpricedWords } from "#shared/cost/cost-of-sign.ts";
import { boardId, hardwareId, sheetId, stripId } from "#shared/cost/entry-ids.ts";
import { measureSign, type SignMeasures } from "#shared/cost/measure-sign.ts";
import type { PriceBook } from "#shared/cost/price-book.ts";
import type { PricedSign } from "#shared/cost/priced-sign.ts";
import { quantitiesOfSign } from "#shared/cost/quantities-of-sign.ts";
import { emptyPriceBook } from "#shared/cost/works.ts";
import { usualSaws } from "#shared/cut-plan/shop-saws.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { standardStock } from "#shared/materials/standard-stock.ts";
import type { Acrylic, MockupDocument, Wood } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import {
  buildCapStud,
  buildLayer,
  buildSign,
  hole,
  plate,
  pocketHold,
  standoffHold,
} from "../../../support/build-sign.ts";
import { chevron, slatSign, walnutFrame } from "../../../support/slat-signs.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const tape = () => {
  const found = standardStock.adhesives.find(({ family }) => family === "high-bond tape");
  if (!found) throw new Error("There is no tape in stock.");
  return found;
};
const measured = (document: MockupDocument): SignMeasures =>
  measureSign({ document, figures: computeFigures(document, kernel), kernel, brads: { trim: 15, barrel: 10 } });

/**
 * B: a plate of 200 by 100 bonded to the board. C: one of 40 by 20 on its edge, a half of it over. D: one of 100 by 50 on two
 * standoffs with holes of 8 mm. E: one of 30 by 10, 6 mm thick, let into the board.
 */
const sign = (overrides: Partial<MockupDocument> = {}) =>
  buildSign(
    [
      buildLayer("B", [plate("b", 200, 100, [200, 150])]),
      buildLayer("C", [plate("c", 40, 20, [300, 150])], {
        hold: {
          kind: "bond",
          adhesive: tape(),
          tack: { stockId: null, name: "Thick cyanoacrylate", family: "cyanoacrylate" },
        },
      }),
      buildLayer("D", [plate("d", 100, 50, [480, 300])], {
        hold: standoffHold([hole("1", 450, 300), hole("2", 510, 300)]),
      }),
      buildLayer("E", [plate("e", 30, 10, [100, 350])], { thickness: 6, hold: pocketHold(2) }),
      buildLayer("F", []),
    ],
    {
      ...overrides,
      hanging: { kind: "cleat", gap: 10, pose: "upright", carriesKg: null, points: [] },
    },
  );

const coats: MockupDocument["backer"]["finish"] = [
  { kind: "sanding", grit: 120 },
  { kind: "sanding", grit: 180 },
  { kind: "clear coat", name: "Satin", base: "water-borne", dryingHours: 4 },
  { kind: "clear coat", name: "Satin", base: "water-borne", dryingHours: 4 },
];

const midnight = first(standardStock.acrylics).acrylic;
const pineInStock = first(standardStock.woods).wood;
function first<T>(list: readonly T[]): T {
  const [one] = list;
  if (one === undefined) throw new Error("The list is empty.");
  return one;
}

const order = (measures: SignMeasures, book: PriceBook, rest: Partial<PricedSign> = {}): PricedSign => ({
  measures,
  signs: 1,
  book,
  stock: standardStock,
  saws: usualSaws,
  unit: "mm",
  ...rest,
});
const book = (overrides: Partial<PriceBook>): PriceBook => ({ ...emptyPriceBook("EUR"), ...overrides });
const sheetOf = (acrylic: Acrylic, mm: number) => sheetId(acrylic, mm, standardStock);
const boardOf = (wood: Wood, mm: number) => boardId(wood, mm, standardStock);

describe("what goes into a sign", () => {
  it("is measured by hand to the same", () => {
    const { backer } = sign();
    const measures = measured(sign({ backer: { ...backer, finish: coats } }));
    const [three, six] = measures.sheets;
    // 200·100 + 40·20 + 100·50, and 30·10 of the thicker.
    expect(three?.areaMm2).toBeCloseTo(25_800, 3);
    expect(six).toMatchObject({ thicknessMm: 6 });
    expect(six?.areaMm2).toBeCloseTo(300, 3);
    // 600 + 120 + 300 of edges and two holes of π·8.
    expect(three?.cutMm).toBeCloseTo(1020 + 16 * Math.PI, 3);
    expect(six?.cutMm).toBeCloseTo(80, 3);
    expect(measures.board).toMatchObject({ thicknessMm: 18, isRectangle: true });
    expect(measures.board.areaMm2).toBeCloseTo(240_000, 3);
    expect(measures.board.outlineMm).toBeCloseTo(2000, 3);
    expect(measures.faceMm2).toBeCloseTo(240_000, 3);
    expect(measures.pocketsMm2.engraved).toBeCloseTo(300, 3);
    expect(measures.pocketsMm2.routed).toBe(0);
    expect(measures.standoffs.map(({ hardware, count }) => [hardware.name, count])).toEqual([[buildCapStud().name, 2]]);
    // The tape: all of B, the half of C that lies on it, all of E in its pocket. C's tack is a bead of 20.
    const [tape, tack] = measures.bonds;
    expect(tape?.areaMm2).toBeCloseTo(20_000 + 400 + 300, 0);
    expect(tack).toMatchObject({ areaMm2: 0, beadMm: 20, adhesive: { name: "Thick cyanoacrylate" } });
    expect(measures).toMatchObject({ strips: [], brads: 0, woodGlueMm2: 0, pieces: 4, slats: 0, framePieces: 0 });
  });

  it("has slats, spine and frame as strips by their section, and the glue under them", () => {
    const measures = measured(slatSign({}, { frame: walnutFrame }));
    const [slats, frame] = measures.strips;
    // Board of 600 by 400. Frame of 18: uprights 436 and levels 636 over their long points, each end mitred at 45 degrees.
    expect(frame).toMatchObject({ widthMm: 18, thicknessMm: 24, pieces: 4, settings: 1 });
    expect(frame?.lengthMm).toBeCloseTo(2 * 436 + 2 * 636, 3);
    expect(frame?.cutMm).toBeCloseTo(8 * 18 * Math.SQRT2, 3);
    expect(slats).toMatchObject({ widthMm: chevron.slatWidth, thicknessMm: 8, pieces: measures.slats + 1 });
    // Laid over a board of 240 000 mm² and trimmed: more than that, and not half as much again.
    expect(measures.woodGlueMm2).toBeGreaterThan(240_000);
    expect(measures.woodGlueMm2).toBeLessThan(360_000);
    expect(measures.brads).toBeGreaterThan(measures.slats);
    expect(measures.framePieces).toBe(4);
  });

  it("lays a dot of the tack under each piece", () => {
    const tack = { stockId: null, name: "Thick cyanoacrylate", family: "cyanoacrylate" as const };
    const two = [plate("one", 40, 20, [100, 100]), plate("two", 40, 20, [300, 100])];
    const tacked = buildSign([buildLayer("B", two, { hold: { kind: "bond", adhesive: tape(), tack } })]);
    expect(measured(tacked).bonds.find(({ adhesive }) => adhesive.name === tack.name)?.beadMm).toBe(40);
  });

  it("counts no hole where the hardware passes no panel, and no bond on nothing", () => {
    const away = buildSign([
      buildLayer("B", [plate("b", 100, 50, [-400, -400])]),
      buildLayer("C", [plate("c", 100, 50, [300, 200])], { hold: standoffHold([]) }),
    ]);
    const measures = measured(away);
    expect(measures.sheets[0]?.cutMm).toBeCloseTo(600, 3);
    expect(measures.bonds[0]?.areaMm2).toBe(0);
    expect(measures.standoffs).toEqual([]);
  });
});

describe("what a sign costs by the book", () => {
  const full = () =>
    book({
      materials: [
        { id: sheetOf(midnight, 3), name: "Midnight, 3 mm", unit: "m²", price: 6000, waste: 0.5 },
        { id: sheetOf(midnight, 6), name: "Midnight, 6 mm", unit: "m²", price: 11_000, waste: 0.5 },
        { id: boardOf(pineInStock, 18), name: "Pine, 18 mm", unit: "m²", price: 3500, waste: 0.2 },
      ],
      machines: [
        {
          id: "sheet cutting",
          name: "Cutting sheet",
          perHour: 6000,
          cutMmPerMinute: 500,
          pocketMm2PerMinute: 1,
          setUpMinutes: 5,
        },
        {
          id: "engraving",
          name: "Engraving",
          perHour: 6000,
          cutMmPerMinute: 1,
          pocketMm2PerMinute: 100,
          setUpMinutes: 4,
        },
        {
          id: "sawing",
          name: "Sawing",
          perHour: 3000,
          cutMmPerMinute: 1000,
          pocketMm2PerMinute: 1,
          setUpMinutes: 3,
        },
      ],
      hardware: [
        { id: hardwareId(buildCapStud(), standardStock), name: "Standoff", price: 900, pack: 4 },
        { id: `screw ${buildCapStud().screw.name}`, name: "Screw", price: 800, pack: 100 },
        { id: "hanging cleat", name: "Cleat", price: 650, pack: 1 },
      ],
      adhesives: [
        {
          id: "adhesive High-bond tape",
          name: "Tape",
          unit: "cm²",
          price: 2000,
          containerMl: 5000,
          mlPerM2: 10_000,
          mlPerM: 0,
        },
        { id: "adhesive Thick cyanoacrylate", name: "CA", price: 500, containerMl: 20, mlPerM2: 200, mlPerM: 10 },
      ],
      labour: [
        { id: "piece", name: "A piece", perHour: 4800, minutesEach: 5 },
        { id: "standoff", name: "A standoff", perHour: 4800, minutesEach: 2 },
        { id: "sign", name: "A sign", perHour: 4800, minutesEach: 30 },
      ],
      markup: 0.5,
      tax: { name: "VAT", share: 0.2 },
    });

  it("comes out line by line as reckoned by hand, setting up once for all signs", () => {
    const { outcome, unpriced } = costOfSign(order(measured(sign()), full(), { signs: 2 }));
    expect(unpriced).toEqual([]);
    if (!outcome.ok) throw new Error(outcome.problems.map(({ words }) => words).join(" "));
    expect(outcome.value.lines.map(({ what, quantity, unit, amount }) => [what, quantity, unit, amount])).toEqual([
      // 2 · 25 800 mm² and half as much waste; 2 · 300; 2 · 240 000 and a fifth.
      ["Midnight, 3 mm", 0.0774, "m²", 464],
      ["Midnight, 6 mm", 0.0009, "m²", 10],
      ["Pine, 18 mm", 0.576, "m²", 2016],
      // 2 · (1020 + 16π + 80) / 500 and two set-ups of 5, for two thicknesses.
      ["Cutting sheet", 14.6, "min", 1460],
      ["Engraving", 10, "min", 1000],
      ["Sawing", 7, "min", 350],
      ["Standoff", 4, "each", 900],
      ["Screw", 4, "each", 32],
      ["Cleat", 2, "each", 1300],
      // 2 · 20 700 mm² are 414 cm²; 2 · 20 mm of bead at 10 ml a metre.
      ["Tape", 414, "cm²", 166],
      ["CA", 0.4, "ml", 10],
      ["A piece", 40, "min", 3200],
      ["A standoff", 8, "min", 640],
      ["A sign", 60, "min", 4800],
    ]);
    // The lines add up to 16 348; a half on it, a fifth on both.
    expect(outcome.value.whole).toEqual({ subtotal: 16_348, markup: 8174, tax: 4904, total: 29_426 });
  });

  it("lists what has no price and counts it nowhere", () => {
    const { materials, ...rest } = full();
    const priced = materials.filter(({ id }) => id !== sheetOf(midnight, 3));
    const { backer } = sign();
    const finished = measured(sign({ backer: { ...backer, finish: coats } }));
    const { outcome, unpriced } = costOfSign(order(finished, { ...rest, materials: priced }));
    expect(unpriced).toEqual([
      { group: "materials", id: sheetOf(midnight, 3), name: "Midnight, 3 mm" },
      { group: "finishes", id: "sanding", name: "Sanding" },
      { group: "finishes", id: "coat Satin", name: "Satin" },
    ]);
    expect(unpriced.map(unpricedWords)[0]).toBe("no price yet for Midnight, 3 mm");
    if (!outcome.ok) throw new Error("It is refused.");
    expect(outcome.value.lines.map(({ what }) => what)).not.toContain("Midnight, 3 mm");
  });

  it("lists everything by an empty book and says nothing of money", () => {
    const { outcome, unpriced } = costOfSign(order(measured(sign()), emptyPriceBook("EUR"), { unit: "in" }));
    expect(unpriced.map(({ name }) => name)).toEqual([
      "Midnight, 1/8″",
      "Midnight, 1/4″",
      "Eastern white pine, 11/16″",
      "Cutting sheet",
      "Engraving pockets",
      "Sawing boards, slats and frames",
      buildCapStud().name,
      buildCapStud().screw.name,
      "Cleat, a pair",
      "High-bond tape",
      "Thick cyanoacrylate",
      "Cleaning and setting, a piece",
      "Boring and screwing, a standoff",
      "Sanding, hanging and packing, a sign",
    ]);
    expect(outcome).toMatchObject({ ok: true, value: { lines: [], whole: { total: 0 } } });
  });

  it("counts two coats of one name as one finish twice", () => {
    const { backer } = sign();
    const finishes = [{ id: "coat Satin", name: "Satin", pricePerM2: 300, minutesPerM2: 10, perHour: 4800 }];
    const { each } = quantitiesOfSign(
      order(measured(sign({ backer: { ...backer, finish: coats } })), book({ finishes })),
    );
    expect(each.finishes).toHaveLength(1);
    expect(each.finishes[0]).toMatchObject({ id: "coat Satin", coats: 2 });
    expect(each.finishes[0]?.areaMm2).toBeCloseTo(240_000, 3);
  });
});

describe("whole sheets and bars", () => {
  const bySheet = book({
    materials: [{ id: sheetOf(midnight, 3), name: "Midnight, 3 mm", unit: "sheet", price: 5000, waste: 0.5 }],
  });

  it("are the plan's where there is one, else the share of a sheet as usually bought", () => {
    const measures = measured(sign());
    const plan = { sheets: [{ stock: midnight, thicknessMm: 3, count: 2 }], bars: [] };
    const planned = quantitiesOfSign(order(measures, bySheet, { signs: 3, plan }));
    expect(planned.each.materials).toEqual([]);
    expect(planned.once.materials).toEqual([{ id: sheetOf(midnight, 3), measure: { kind: "count", count: 2 } }]);
    const [share] = quantitiesOfSign(order(measures, bySheet, { signs: 3 })).each.materials;
    // 25 800 and a half more, of 1220 by 610.
    expect(share?.measure.kind === "count" && share.measure.count).toBeCloseTo(38_700 / 744_200, 6);
  });

  it("of a size that is counted in stock are shares of that one", () => {
    const [row, ...others] = standardStock.acrylics;
    const counted = { ...first([row]), sheets: [{ thicknessMm: 3, widthMm: 600, heightMm: 300, quantity: 4 }] };
    const stock = { ...standardStock, acrylics: [counted as (typeof others)[number], ...others] };
    const [share] = quantitiesOfSign(order(measured(sign()), bySheet, { stock })).each.materials;
    expect(share?.measure.kind === "count" && share.measure.count).toBeCloseTo(38_700 / 180_000, 6);
  });

  it("of bars are filled by all signs together; a strip of no entry is taken from its board by area", () => {
    const document = slatSign({}, { frame: walnutFrame });
    const measures = measured(document);
    const section = { widthMm: 18, thicknessMm: 24 };
    const bar = {
      id: stripId(walnutFrame.stock, section, standardStock),
      name: "Walnut",
      unit: "bar" as const,
      price: 2000,
      waste: 0.2,
    };
    // 2144 and a fifth more, three times: 7718 of bars of 2440.
    const priced = quantitiesOfSign(order(measures, book({ materials: [bar] }), { signs: 3 }));
    expect(priced.once.materials).toEqual([{ id: bar.id, measure: { kind: "count", count: 4 } }]);
    expect(priced.unpriced.map(({ name }) => name)).toContain("Eastern white pine, strip 38 × 8 mm");
    const plank = { id: boardOf(chevron.stock, 8), name: "Pine, 8 mm", unit: "m²" as const, price: 2000, waste: 0.2 };
    const fromPlank = quantitiesOfSign(order(measures, book({ materials: [plank] })));
    const slats = measures.strips[0];
    expect(fromPlank.each.materials).toEqual([
      { id: plank.id, measure: { kind: "area", mm2: (slats?.lengthMm ?? 0) * 38 } },
    ]);
  });

  it("keep their price when the stock list gives a thing another name", () => {
    const stockId = "0d1f5b9e-6a53-4d6c-9a3f-2f1b7c0c8a11";
    const renamed = {
      ...standardStock,
      acrylics: [{ ...first(standardStock.acrylics), acrylic: { ...midnight, stockId, name: "Night" } }],
    };
    expect(sheetId({ ...midnight, stockId }, 3, renamed)).toBe(`sheet ${stockId} 3`);
    // Drawn before there was a row: by its name.
    expect(sheetId({ ...midnight, stockId: null, name: "Night" }, 4.5, renamed)).toBe(`sheet ${stockId} 4.5`);
    expect(sheetId(midnight, 3, renamed)).toBe("sheet Midnight 3");
  });
});
