import { describe, expect, it } from "vitest";
import { standardAdhesives } from "#shared/materials/standard-stock.ts";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { mostLayers, splitLayer } from "#shared/mockup/split-layer.ts";
import { buildLayer, buildSign, hole, plate, standoffHold } from "../../../support/build-sign.ts";

const sign = buildSign([
  buildLayer("B", [plate("left", 100, 100, [150, 200]), plate("right", 100, 100, [450, 200])], {
    name: "Panel",
    locate: "hole pattern",
    hold: standoffHold([hole("l1", 120, 200, { fixed: true }), hole("l2", 180, 200), hole("r1", 420, 200)]),
  }),
  buildLayer("C", [plate("sun", 20, 20, [150, 200])], { name: "Panel 2" }),
]);
const facts = ({ layers }: MockupDocument) =>
  layers.map(({ key, name, pieces, hold }) => [
    key,
    name,
    pieces.map(({ id }) => id),
    hold.kind === "standoff" ? hold.holes.map(({ id, fixed }) => (fixed ? `${id} fixed` : id)) : hold.kind,
  ]);

describe("splitLayer", () => {
  it("takes the holes that lie in the pieces along, and each part has its fixed one", () => {
    const after = splitLayer(sign, { layerKey: "B", pieceIds: ["right"] });
    expect(facts(after)).toEqual([
      ["B", "Panel", ["left"], ["l1 fixed", "l2"]],
      ["D", "Panel 3", ["right"], ["r1 fixed"]],
      ["C", "Panel 2", ["sun"], "bond"],
    ]);
    expect(documentSchema.safeParse(after).success).toBe(true);
  });

  it("bonds them when it is given an adhesive, and holes find their place no longer", () => {
    const [adhesive] = standardAdhesives;
    const after = splitLayer(sign, { layerKey: "B", pieceIds: ["left"], adhesive });
    expect(facts(after).slice(0, 2)).toEqual([
      ["B", "Panel", ["right"], ["r1 fixed"]],
      ["D", "Panel 3", ["left"], "bond"],
    ]);
    expect(after.layers.map(({ locate }) => locate).slice(0, 2)).toEqual(["hole pattern", "none"]);
    expect(documentSchema.safeParse(after).success).toBe(true);
  });

  it.each([
    { layerKey: "B", pieceIds: [] },
    { layerKey: "B", pieceIds: ["left", "right"] },
    { layerKey: "B", pieceIds: ["sun"] },
    { layerKey: "Z", pieceIds: ["left"] },
  ])("leaves the very document when $pieceIds of $layerKey are all or none", (split) => {
    expect(splitLayer(sign, split)).toBe(sign);
  });

  it("makes no more layers than a document takes", () => {
    const [first, second] = sign.layers;
    if (!first || !second) throw new Error("Two layers were built.");
    const full = { ...sign, layers: [first, ...Array.from({ length: mostLayers - 1 }, () => second)] };
    expect(splitLayer(full, { layerKey: "B", pieceIds: ["left"] })).toBe(full);
  });
});
