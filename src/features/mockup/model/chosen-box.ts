import { boxUnion } from "#shared/geometry/box.ts";
import type { Box } from "#shared/geometry/path.ts";
import { seenDiameterMm } from "#shared/hardware/standoff-parts.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Figures } from "#shared/stack/figures.ts";
import { boxShifted, type Shift } from "./shifts.ts";

/** The box around pieces, from figures and what was moved since they were computed; null for none. */
export function boxOfChosen(
  figures: Figures,
  pieceIds: readonly string[],
  shifts: ReadonlyMap<string, Shift>,
): Box | null {
  const chosen = new Set(pieceIds);
  return boxUnion(
    figures.pieces
      .filter(({ pieceId }) => chosen.has(pieceId))
      .map(({ pieceId, box }) => boxShifted(box, shifts.get(pieceId))),
  );
}

export type HoleOnBoard = {
  readonly id: string;
  readonly x: number;
  readonly y: number;
  readonly seenDiameter: number;
};

/** A hole by its id, with the diameter of what is seen of it. */
export function findHole(document: MockupDocument, holeId: string): HoleOnBoard | null {
  for (const { hold } of document.layers) {
    if (hold.kind !== "standoff") continue;
    const hole = hold.holes.find(({ id }) => id === holeId);
    if (hole) return { id: hole.id, x: hole.x, y: hole.y, seenDiameter: seenDiameterMm(hold.hardware) };
  }
  return null;
}
