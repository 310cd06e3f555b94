import { boxesOverlap } from "../geometry/box.ts";
import type { Hold, Hole, Layer } from "../mockup/document.ts";
import type { PieceFigures } from "../stack/figures.ts";
import { holdsPiece } from "../stack/held-piece.ts";
import type { RuleInput } from "./rule.ts";
import { layersWithFigures } from "./words.ts";

export type StandoffHold = Extract<Hold, { kind: "standoff" }>;

/** A layer on standoffs with its pieces' figures. */
export type StandoffLayer = {
  readonly layer: Layer;
  readonly hold: StandoffHold;
  readonly level: number;
  readonly pieces: readonly PieceFigures[];
};

/** The layers that stand on standoffs, in document order. */
export function standoffLayers(input: Pick<RuleInput, "document" | "figures">): StandoffLayer[] {
  return layersWithFigures(input).flatMap(({ layer, level, pieces }) =>
    layer.hold.kind === "standoff"
      ? [{ layer, hold: layer.hold, level, pieces: pieces.map(({ figures }) => figures) }]
      : [],
  );
}

/** One of them, by its key. */
export function standoffLayerOf(
  input: Pick<RuleInput, "document" | "figures">,
  key: string | null,
): StandoffLayer | null {
  return standoffLayers(input).find(({ layer }) => layer.key === key) ?? null;
}

/** The piece that a hole's standoff holds; null when it holds none. */
export function pieceAt({ hold, pieces }: Pick<StandoffLayer, "hold" | "pieces">, hole: Hole): PieceFigures | null {
  const { hardware } = hold;
  const reach = hardware.kind === "edgeGrip" ? hardware.barrelDiameter / 2 : 0;
  const place = { x: hole.x - reach, y: hole.y - reach, width: 2 * reach, height: 2 * reach };
  return pieces.find(({ box, region }) => boxesOverlap(box, place) && holdsPiece(hardware, region, hole)) ?? null;
}

/** Height of what a held piece's barrels stand on, mm above the back of the board. */
export const footHeightMm = (hold: StandoffHold, piece: PieceFigures): number => piece.bottom.nominal - hold.offset;
