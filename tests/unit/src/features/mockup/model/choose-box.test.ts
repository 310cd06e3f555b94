import { describe, expect, it } from "vitest";
import { boxBetween, chooseWithin, piecesWithin } from "@/features/mockup/model/choose-box.ts";
import { movePieces } from "@/features/mockup/model/commands/pieces.ts";
import { hideLayer, lockLayer } from "@/features/mockup/model/commands/show-layer.ts";
import { chooseLayer, nothingChosen } from "@/features/mockup/model/selection.ts";
import { shiftsBetween } from "@/features/mockup/model/shifts.ts";
import { signWithFigures } from "../sign-with-figures.ts";

const { document, figuresOf } = signWithFigures();
const figures = await figuresOf(document);
/** Round the ring of 220 mm in the middle of the board of 600 × 400, but not round the disc of 275. */
const roundRing = boxBetween({ x: 420, y: 80 }, { x: 180, y: 320 });
const idsIn = (...[of, box]: [typeof document, typeof roundRing]) =>
  piecesWithin({ document: of, figures, shifts: shiftsBetween(document, of) }, box).map(({ pieceId }) => pieceId);

describe("a box drawn round pieces", () => {
  it("is the same whichever way it is drawn", () => {
    expect(roundRing).toEqual({ x: 180, y: 80, width: 240, height: 240 });
  });

  it("chooses what lies wholly in it, of layers that are shown and not locked", () => {
    expect(idsIn(document, roundRing)).toEqual(["ring", "sun"]);
    expect(idsIn(hideLayer(document, { key: "C", hidden: true }), roundRing)).toEqual(["sun"]);
    expect(idsIn(lockLayer(document, { key: "D", locked: true }), roundRing)).toEqual(["ring"]);
  });

  it("goes by where pieces lie now, before the figures have followed", () => {
    const moved = movePieces(document, { pieceIds: ["sun"], dx: 120, dy: 0 });
    expect(idsIn(moved, roundRing)).toEqual(["ring"]);
  });

  it("chooses these alone, or with Shift adds them behind what was chosen", () => {
    const sun = chooseLayer(document, "D");
    const pieceIds = ["ring", "sun"];
    expect(chooseWithin(document, nothingChosen, { pieceIds, more: false })).toEqual({
      layerKey: "C",
      pieceIds,
      holeId: null,
    });
    expect(chooseWithin(document, sun, { pieceIds, more: true }).pieceIds).toEqual(["sun", "ring"]);
  });

  it("lets go of everything when nothing lies in it, but not with Shift", () => {
    const sun = chooseLayer(document, "D");
    expect(chooseWithin(document, sun, { pieceIds: [], more: false })).toEqual(nothingChosen);
    expect(chooseWithin(document, sun, { pieceIds: [], more: true })).toBe(sun);
  });
});
