import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  standardAcrylics,
  standardAdhesives,
  standardStandoffs,
  standardWoods,
} from "#shared/materials/standard-stock.ts";
import { listChanges } from "#shared/mockup/changes.ts";
import type { FrameOfSign, Layer, MockupDocument, Slats } from "#shared/mockup/document.ts";
import {
  bondHold,
  buildLayer,
  buildSign,
  disc,
  hole,
  plate,
  pocketHold,
  standoffHold,
} from "../../../support/build-sign.ts";

const acrylic = (name: string) => {
  const found = standardAcrylics.find((stock) => stock.acrylic.name === name);
  if (!found) throw new Error(`There is no ${name}.`);
  return found.acrylic;
};

const letters = () => [
  plate("l1", 20, 40, [100, 300], { name: "L" }),
  plate("l2", 20, 40, [130, 300]),
  plate("l3", 20, 40, [160, 300]),
];
const night = (overrides: Partial<Layer> = {}) =>
  buildLayer("B", [disc("d", 80, [300, 150])], {
    name: "Night disc",
    hold: standoffHold([hole("h1", 260, 150, { fixed: true }), hole("h2", 340, 150)]),
    ...overrides,
  });
const lettering = (overrides: Partial<Layer> = {}) => buildLayer("C", letters(), { name: "Lettering", ...overrides });
const before = buildSign([night(), lettering()]);
const said = (after: MockupDocument, unit?: "mm" | "in") => listChanges(before, after, unit).map(({ text }) => text);

it("a document does not differ from itself, nor from a copy out of other stock entries", () => {
  expect(listChanges(before, before)).toEqual([]);
  const copy = structuredClone(before);
  copy.backer.stock.stockId = "6f1d3a52-8f0e-4c0b-9a51-0d3c5c1b7a10";
  expect(listChanges(before, copy)).toEqual([]);
});

describe("the whole sign", () => {
  const walnut = standardWoods[2]?.wood ?? before.backer.stock;
  const slats: Slats = {
    stock: walnut,
    thickness: 9,
    pattern: "spine",
    angle: 45,
    slatWidth: 38,
    gap: 0,
    spineWidth: 38,
    spineOffset: 0,
    start: { kind: "corner" },
    direction: "up",
    overhang: 6,
  };
  const frame: FrameOfSign = { stock: walnut, width: 19, depth: 26, mitred: true };
  const oil = { kind: "clear coat" as const, name: "Oil", base: "oil or shellac" as const, dryingHours: 12 };
  it.each([
    { change: { board: { ...before.board, width: 650 } }, text: "Board 600 × 400 mm becomes 650 × 400 mm" },
    {
      change: { board: { ...before.board, measures: "body" as const } },
      text: "The board's measures mean body, not overall",
    },
    {
      change: { backer: { ...before.backer, stock: walnut } },
      text: "Backer of Eastern white pine becomes Black walnut",
    },
    { change: { backer: { ...before.backer, thickness: 25 } }, text: "Backer 18 mm thick becomes 25 mm" },
    {
      change: { backer: { ...before.backer, finish: [oil, oil] } },
      text: "Finish of the backer: bare becomes Oil, 2 coats",
    },
    { change: { backer: { ...before.backer, grainTurn: 90 } }, text: "Grain turned 0° becomes 90°" },
    {
      change: { board: { ...before.board, outline: { kind: "ellipse" as const } } },
      text: "Outline of the board: rectangle becomes ellipse",
    },
    { change: { hanging: { ...before.hanging, pose: "lying" as const } }, text: "The sign is upright, then lying" },
    { change: { hanging: { ...before.hanging, carriesKg: 5 } }, text: "Other load stated for the wall's fixing" },
    {
      change: { hanging: { ...before.hanging, points: [{ x: 300, y: 40 }] } },
      text: "The wall's fixings are set otherwise",
    },
    {
      change: { backer: { ...before.backer, slats } },
      text: "Slats of Black walnut are laid on the backer",
    },
    { change: { frame }, text: "A frame of Black walnut goes round it" },
    { change: { quantity: 3 }, text: "Quantity 1 becomes 3" },
    { change: { hanging: { ...before.hanging, kind: "cleat" as const } }, text: "Hanging: none becomes cleat" },
    { change: { hanging: { ...before.hanging, gap: 6 } }, text: "Gap to the wall 0 mm becomes 6 mm" },
    {
      change: { presentation: { ...before.presentation, viewingDistance: 6000 } },
      text: "Viewing distance 3000 mm becomes 6000 mm",
    },
  ])("$text", ({ change, text }) => {
    expect(said({ ...before, ...change })).toEqual([text]);
  });

  it("is told in inches where the shop works in inches", () => {
    expect(said({ ...before, board: { ...before.board, width: 609.6 } }, "in")).toEqual([
      "Board 23 5/8″ × 15 3/4″ becomes 24″ × 15 3/4″",
    ]);
  });
});

describe("a layer", () => {
  const [slim, longer] = standardStandoffs;
  if (!slim || !longer) throw new Error("There are no standoffs.");
  const holes = [hole("h1", 260, 150, { fixed: true }), hole("h2", 340, 150)];
  it.each([
    { layer: night({ stock: acrylic("Rust") }), texts: ["B, Night disc: Midnight becomes Rust"] },
    {
      layer: night({ stock: { ...acrylic("Midnight"), colour: "#000080" } }),
      texts: ["B, Night disc: Midnight: #27314F becomes #000080"],
    },
    {
      layer: night({ stock: { ...acrylic("Midnight"), process: "extruded" } }),
      texts: ["B, Night disc: cast sheet becomes extruded"],
    },
    { layer: night({ thickness: 4.5 }), texts: ["B, Night disc: thickness 3 mm becomes 4.5 mm"] },
    { layer: night({ name: "Moon" }), texts: ["B, Moon: called Night disc before"] },
    { layer: night({ hold: standoffHold(holes, slim, 19) }), texts: ["B, Night disc: offset 12 mm becomes 19 mm"] },
    {
      layer: night({ hold: standoffHold(holes, longer) }),
      texts: [
        "B, Night disc: on Standoff 15 × 12 becomes on Standoff 15 × 19",
        "B, Night disc: offset 12 mm becomes 19 mm",
      ],
    },
    {
      layer: night({ hold: bondHold }),
      texts: ["B, Night disc: on Standoff 15 × 12 becomes bonded with High-bond tape"],
    },
    { layer: night({ locate: "none" }), texts: ["B, Night disc: place found by template becomes nothing"] },
    { layer: night({ hidden: true }), texts: ["B, Night disc: hidden in the mockup"] },
    {
      layer: night({ hold: standoffHold([hole("h1", 260, 150, { fixed: true }), hole("h2", 350, 150)]) }),
      texts: ["B, Night disc: 1 hole moved"],
    },
    {
      layer: night({ hold: standoffHold([hole("h1", 260, 150, { fixed: true, diameter: 9 }), hole("h2", 340, 150)]) }),
      texts: ["B, Night disc: 1 hole 8 mm wide becomes 9 mm"],
    },
    {
      layer: night({ hold: standoffHold([hole("h1", 260, 150, { fixed: true }), hole("h3", 340, 150)]) }),
      texts: ["B, Night disc: 1 hole added", "B, Night disc: 1 hole taken out"],
    },
  ])("$texts", ({ layer, texts }) => {
    expect(said(buildSign([layer, lettering()]))).toEqual(texts);
  });

  it("that is bonded otherwise, or let in deeper, says so", () => {
    const glued = (hold: Layer["hold"]) => buildSign([night({ hold })]);
    const epoxy = standardAdhesives[3];
    if (!epoxy) throw new Error("There is no epoxy.");
    const texts = (was: Layer["hold"], is: Layer["hold"]) => listChanges(glued(was), glued(is)).map(({ text }) => text);
    expect(texts(bondHold, { kind: "bond", adhesive: epoxy, tack: null })).toEqual([
      "B, Night disc: bonded with High-bond tape becomes bonded with Slow epoxy",
    ]);
    expect(texts(pocketHold(2), pocketHold(2.5))).toEqual([
      "B, Night disc: let in 2 mm deep with High-bond tape becomes let in 2.5 mm deep with High-bond tape",
    ]);
    expect(texts(pocketHold(2, 0.1), pocketHold(2, 0.2))).toEqual([
      "B, Night disc: let in 2 mm deep with High-bond tape: other measures",
    ]);
  });

  it("that comes or goes is one entry, with its pieces and a spot", () => {
    const stars = buildLayer("D", [disc("s", 5, [50, 60])], { name: "Stars" });
    expect(listChanges(before, buildSign([night(), lettering(), stars]))).toEqual([
      {
        kind: "come",
        text: "D, Stars: new layer of Midnight, 1 piece",
        layerKey: "D",
        pieceIds: ["s"],
        where: { x: 50, y: 60 },
      },
    ]);
    const gone = listChanges(before, buildSign([night()]));
    expect(gone.map(({ kind, text }) => ({ kind, text }))).toEqual([
      { kind: "gone", text: "C, Lettering: the layer is gone, with 3 pieces" },
    ]);
  });

  it("that changes its place in the order says so", () => {
    expect(said(buildSign([lettering(), night()]))).toEqual(["Order from the wall outward: B, C becomes C, B"]);
  });
});

describe("pieces", () => {
  const placed = (id: string, change: Partial<Layer["pieces"][number]["placement"]>) =>
    buildSign([
      night(),
      lettering({
        pieces: letters().map((piece) =>
          piece.id === id ? { ...piece, placement: { ...piece.placement, ...change } } : piece,
        ),
      }),
    ]);

  it("that moved together are one entry, by x and y", () => {
    const moved = letters().map((piece) => ({
      ...piece,
      placement: { ...piece.placement, x: piece.placement.x + 5, y: piece.placement.y - 2.25 },
    }));
    expect(listChanges(before, buildSign([night(), lettering({ pieces: moved })]))).toEqual([
      {
        kind: "moved",
        text: "C, Lettering: 3 pieces moved 5 mm right and 2.25 mm up",
        layerKey: "C",
        pieceIds: ["l1", "l2", "l3"],
        where: { x: 105, y: 297.75 },
      },
    ]);
  });

  it.each([
    { change: { x: 90 }, text: "C, Lettering: L moved 10 mm left" },
    { change: { y: 300.001 }, text: "C, Lettering: L moved by a hair" },
    { change: { scale: 0.8 }, text: "C, Lettering: L resized to 80 % of what it was" },
    { change: { turn: 15 }, text: "C, Lettering: L turned 15° clockwise" },
    { change: { turn: 345 }, text: "C, Lettering: L turned 15° anticlockwise" },
    { change: { turn: 180 }, text: "C, Lettering: L turned 180°" },
    { change: { mirrored: true }, text: "C, Lettering: L mirrored" },
  ])("$text", ({ change, text }) => {
    expect(said(placed("l1", change))).toEqual([text]);
  });

  it("that come, go, are redrawn or change their layer", () => {
    const [l1, l2, l3] = letters();
    if (!l1 || !l2 || !l3) throw new Error("There are three letters.");
    const wider = plate("l2", 24, 40, [130, 300]);
    const fresh = plate("l4", 20, 40, [190, 300]);
    const after = buildSign([
      night({ pieces: [disc("d", 80, [300, 150]), l3] }),
      lettering({ pieces: [wider, fresh] }),
    ]);
    expect(said(after)).toEqual([
      "B, Night disc: 1 piece moved over from C, Lettering",
      "C, Lettering: 1 piece redrawn",
      "C, Lettering: 1 piece added",
      "C, Lettering: L taken out",
    ]);
  });
});

it("whatever changes has an entry, and the entry names what is on one of the signs", () => {
  const edits: ((document: MockupDocument, amount: number) => void)[] = [
    ({ board }, amount) => {
      board.height += amount;
    },
    (document, amount) => {
      document.quantity += amount;
    },
    ({ backer }, amount) => {
      backer.thickness += amount;
    },
    ({ hanging }, amount) => {
      hanging.gap += amount;
    },
    ({ presentation }, amount) => {
      presentation.light.elevation += amount / 10;
    },
    ...before.layers.flatMap((layer, index) => [
      (document: MockupDocument, amount: number) => {
        const edited = document.layers[index];
        if (edited) edited.thickness += amount;
      },
      ...layer.pieces.flatMap((_, place) =>
        (["x", "y", "turn", "scale"] as const).map((field) => (document: MockupDocument, amount: number) => {
          const piece = document.layers[index]?.pieces[place];
          if (piece) piece.placement[field] += amount;
        }),
      ),
    ]),
  ];
  fc.assert(
    fc.property(fc.constantFrom(...edits), fc.integer({ min: 1, max: 40 }), (edit, amount) => {
      const after = structuredClone(before);
      edit(after, amount);
      const changes = listChanges(before, after);
      expect(changes).toHaveLength(1);
      const ids = before.layers.flatMap((layer) => layer.pieces.map(({ id }) => id));
      for (const id of changes[0]?.pieceIds ?? []) expect(ids).toContain(id);
    }),
  );
});
