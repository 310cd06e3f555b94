import { describe, expect, it } from "vitest";
import { addPlate } from "@/features/mockup/model/commands/add-plate.ts";
import { removePieces } from "@/features/mockup/model/commands/pieces.ts";
import {
  chooseAlso,
  chooseHole,
  chooseLayer,
  choosePiece,
  keepChosen,
  nothingChosen,
} from "@/features/mockup/model/selection.ts";
import { barrel, brass, cement, emptyMockup, midnight } from "../sample-mockup.ts";
import { inside } from "../sites.ts";

const disc = addPlate(emptyMockup(), {
  shape: { kind: "circle", diameter: 200 },
  site: inside,
  id: "disc",
  name: "Disc",
  stock: midnight,
  thickness: 5,
  hold: { kind: "standoff", hardware: barrel(19) },
});
const document = addPlate(disc, {
  shape: { kind: "circle", diameter: 40 },
  site: inside,
  id: "sun",
  name: "Sun",
  stock: brass,
  thickness: 3,
  hold: { kind: "bond", adhesive: cement },
});

describe("selection", () => {
  it("chooses layers, pieces and holes, and nothing for what is not there", () => {
    expect(chooseLayer(document, "C")).toEqual({ layerKey: "C", pieceIds: ["sun"], holeId: null });
    expect(choosePiece(document, "disc")).toEqual({ layerKey: "B", pieceIds: ["disc"], holeId: null });
    expect(chooseHole(document, "disc-h-2")).toEqual({ layerKey: "B", pieceIds: [], holeId: "disc-h-2" });
    expect(chooseLayer(document, "Q")).toBe(nothingChosen);
  });

  it("adds a layer to what is chosen and takes it out again", () => {
    const both = chooseAlso(document, chooseLayer(document, "B"), "C");
    expect(both).toEqual({ layerKey: "C", pieceIds: ["disc", "sun"], holeId: null });
    expect(chooseAlso(document, both, "B").pieceIds).toEqual(["sun"]);
    expect(chooseAlso(document, chooseLayer(document, "B"), "B")).toBe(nothingChosen);
  });

  it("keeps what is still there after a change", () => {
    const both = chooseAlso(document, chooseLayer(document, "B"), "C");
    expect(keepChosen(document, both)).toBe(both);
    expect(keepChosen(removePieces(document, { pieceIds: ["disc"] }), both)).toEqual({
      layerKey: "C",
      pieceIds: ["sun"],
      holeId: null,
    });
    expect(keepChosen(emptyMockup(), chooseHole(document, "disc-h-2"))).toEqual(nothingChosen);
  });
});
