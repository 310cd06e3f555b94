import { describe, expect, it } from "vitest";
import { applyMend } from "#shared/dry-fit/apply-mend.ts";
import type { MendStep } from "#shared/dry-fit/mend.ts";
import {
  standardAcrylics,
  standardAdhesives,
  standardScrews,
  standardStandoffs,
} from "#shared/materials/standard-stock.ts";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { buildLayer, buildSign, hole, plate, pocketHold, standoffHold } from "../../../support/build-sign.ts";
import { buildFrame, buildSlatSign, buildSlats } from "../../../support/slat-sign.ts";

const one = <T>(list: readonly T[], index = 0): T => {
  const found = list[index];
  if (found === undefined) throw new Error(`Nothing at ${index}.`);
  return found;
};
const sign = buildSign([
  buildLayer("B", [plate("p", 200, 100, [300, 200])], {
    hold: standoffHold([hole("h1", 220, 200, { fixed: true }), hole("h2", 380, 200)]),
  }),
  buildLayer("C", [plate("c1", 20, 20, [260, 200]), plate("c2", 20, 20, [340, 200])]),
  buildLayer("D", [plate("d", 10, 10, [300, 200])], { hold: pocketHold(1) }),
]);
const screw = one(standardScrews);
const barrel = one(standardStandoffs, 1);
const brass = one(standardAcrylics, 1).acrylic;
const epoxy = one(standardAdhesives, 3);
const layerOf = (document: MockupDocument, key: string) => document.layers.find((layer) => layer.key === key);

describe("a step", () => {
  it.each<{ step: MendStep; key: string; shows: object }>([
    {
      step: { kind: "hole diameter", layerKey: "B", holeId: "h2", diameter: 7 },
      key: "B",
      shows: { hold: { holes: [{ diameter: 8 }, { diameter: 7 }] } },
    },
    {
      step: { kind: "hole place", layerKey: "B", holeId: "h2", x: 370, y: 190 },
      key: "B",
      shows: { hold: { holes: [{ x: 220 }, { x: 370, y: 190 }] } },
    },
    {
      step: { kind: "fixed hole", layerKey: "B", holeId: "h2" },
      key: "B",
      shows: { hold: { holes: [{ fixed: false }, { fixed: true }] } },
    },
    { step: { kind: "offset", layerKey: "B", offset: 19 }, key: "B", shows: { hold: { offset: 19 } } },
    {
      step: { kind: "hardware", layerKey: "B", hardware: barrel, offset: 19 },
      key: "B",
      shows: { hold: { offset: 19, hardware: { name: barrel.name } } },
    },
    {
      step: { kind: "screw", layerKey: "B", screw },
      key: "B",
      shows: { hold: { hardware: { screw: { length: 12 } } } },
    },
    {
      step: { kind: "adhesive", layerKey: "C", adhesive: epoxy },
      key: "C",
      shows: { hold: { kind: "bond", adhesive: { family: "epoxy" } } },
    },
    { step: { kind: "tack", layerKey: "C", tack: epoxy }, key: "C", shows: { hold: { tack: { family: "epoxy" } } } },
    { step: { kind: "locate", layerKey: "C", locate: "scored line" }, key: "C", shows: { locate: "scored line" } },
    { step: { kind: "marked", layerKey: "C", marked: "back" }, key: "C", shows: { marked: "back" } },
    { step: { kind: "stock", layerKey: "C", stock: brass }, key: "C", shows: { stock: { name: "Brass" } } },
    { step: { kind: "thickness", layerKey: "C", thickness: 6 }, key: "C", shows: { thickness: 6 } },
    {
      step: { kind: "pocket", layerKey: "D", depth: 2, clearance: 0.1 },
      key: "D",
      shows: { hold: { depth: 2, clearance: 0.1 } },
    },
    {
      step: { kind: "move pieces", pieceIds: ["c2"], dx: 5, dy: -3 },
      key: "C",
      shows: { pieces: [{ placement: { x: 260 } }, { placement: { x: 345, y: 197 } }] },
    },
    {
      step: { kind: "reads", pieceId: "c1", reads: "O" },
      key: "C",
      shows: { pieces: [{ reads: "O" }, { reads: "" }] },
    },
  ])("$step.kind changes what it is about and nothing else", ({ step, key, shows }) => {
    const after = applyMend(sign, { label: "Mend", steps: [step] });
    expect(layerOf(after, key)).toMatchObject(shows);
    for (const layer of sign.layers) if (layer.key !== key) expect(layerOf(after, layer.key)).toBe(layer);
    expect(documentSchema.safeParse(after).success).toBe(true);
  });

  it.each<{ step: MendStep }>([
    { step: { kind: "hole diameter", layerKey: "B", holeId: "gone", diameter: 7 } },
    { step: { kind: "offset", layerKey: "Z", offset: 7 } },
    { step: { kind: "offset", layerKey: "C", offset: 7 } },
    { step: { kind: "tack", layerKey: "D", tack: null } },
    { step: { kind: "move pieces", pieceIds: ["gone"], dx: 5, dy: 5 } },
    { step: { kind: "split piece", pieceId: "gone", parts: [] } },
    { step: { kind: "slat start", start: { kind: "corner" } } },
    { step: { kind: "frame depth", depth: 20 } },
    { step: { kind: "split layer", layerKey: "C", pieceIds: ["c1", "c2"] } },
    { step: { kind: "split layer", layerKey: "C", pieceIds: [] } },
  ])("$step.kind that finds nothing leaves the very document", ({ step }) => {
    expect(applyMend(sign, { label: "Mend", steps: [step] })).toBe(sign);
  });
});

it("pieces are dropped from their layers only", () => {
  const after = applyMend(sign, { label: "Drop", steps: [{ kind: "drop pieces", pieceIds: ["c1", "d"] }] });
  expect(after.layers.map(({ key, pieces }) => [key, pieces.map(({ id }) => id)])).toEqual([
    ["B", ["p"]],
    ["C", ["c2"]],
    ["D", []],
  ]);
});

it("a layer is split into two neighbours of the same stock and hold, under a free key", () => {
  const after = applyMend(sign, { label: "Split", steps: [{ kind: "split layer", layerKey: "C", pieceIds: ["c2"] }] });
  expect(after.layers.map(({ key, name, pieces }) => [key, name, pieces.length])).toEqual([
    ["B", "Layer B", 1],
    ["C", "Layer C", 1],
    ["E", "Layer C 2", 1],
    ["D", "Layer D", 1],
  ]);
  expect(documentSchema.safeParse(after).success).toBe(true);
});

it("a piece is replaced by its parts in its place, and what it reads is read once", () => {
  const [{ path: left }, { path: right }] = [plate("x", 10, 20, [0, 0]), plate("y", 12, 20, [0, 0])];
  const at = (x: number) => ({ x, y: 200, turn: 0, scale: 1, mirrored: false });
  const named = buildSign([
    buildLayer("B", [plate("a", 5, 5, [0, 0]), plate("p", 22, 20, [300, 200], { name: "Plate", reads: "OPEN" })]),
  ]);
  const parts = [
    { id: "p-1", path: left, placement: at(294) },
    { id: "p-2", path: right, placement: at(305) },
  ];
  const worked = { kind: "worked", how: "split", artworkIds: [] };
  const after = applyMend(named, { label: "Split", steps: [{ kind: "split piece", pieceId: "p", parts }] });
  expect(after.layers[0]?.pieces).toMatchObject([
    { id: "a" },
    { id: "p-1", name: "Plate, part 1 of 2", reads: "OPEN", path: left, placement: { x: 294, y: 200 }, source: worked },
    { id: "p-2", name: "Plate, part 2 of 2", reads: "", path: right, placement: { x: 305, y: 200 }, source: worked },
  ]);
  expect(documentSchema.safeParse(after).success).toBe(true);
});

it("slats begin elsewhere and a frame is made deeper, and nothing else changes", () => {
  const before = buildSlatSign({}, [], { frame: buildFrame() });
  const start = { kind: "height", height: 12.5 } as const;
  const begun = applyMend(before, { label: "Begin", steps: [{ kind: "slat start", start }] });
  expect(begun).toEqual({ ...before, backer: { ...before.backer, slats: buildSlats({ start }) } });
  expect(begun.frame).toBe(before.frame);
  const deeper = applyMend(before, { label: "Make it deeper", steps: [{ kind: "frame depth", depth: 21 }] });
  expect(deeper).toEqual({ ...before, frame: buildFrame({ depth: 21 }) });
  expect(deeper.backer).toBe(before.backer);
});
