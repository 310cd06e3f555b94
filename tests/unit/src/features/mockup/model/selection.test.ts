import { describe, expect, it } from "vitest";
import { addPlate } from "@/features/mockup/model/commands/add-plate.ts";
import { removePieces } from "@/features/mockup/model/commands/pieces.ts";
import {
  chooseAlso,
  chooseHole,
  chooseLayer,
  choosePiece,
  choosePieceAlso,
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

describe("choosePieceAlso", () => {
  const [layer] = disc.layers;
  const piece = layer?.pieces[0];
  if (!layer || !piece) throw new Error("A disc was added.");
  const three = { ...disc, layers: [{ ...layer, pieces: ["a", "b", "c"].map((id) => ({ ...piece, id })) }] };
  const chosen = (...pieceIds: string[]) => ({ layerKey: "B", pieceIds, holeId: null });

  it("adds a piece, takes it out again, and starts anew from the whole layer or another one", () => {
    expect(choosePieceAlso(three, chosen("a"), "c")).toEqual(chosen("a", "c"));
    expect(choosePieceAlso(three, chosen("a", "c"), "a")).toEqual(chosen("c"));
    expect(choosePieceAlso(three, chosen("a", "b", "c"), "b")).toEqual(chosen("b"));
    expect(choosePieceAlso(three, { ...chosen("a"), layerKey: "D" }, "b")).toEqual(chosen("b"));
    expect(choosePieceAlso(three, nothingChosen, "gone")).toBe(nothingChosen);
  });
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
