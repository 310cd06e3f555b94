import type { Box, Placement } from "#shared/geometry/path.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";

export type Shift = { readonly dx: number; readonly dy: number };

/**
 * How far each piece and hole of a document lies from where a picture of an earlier one shows it, by id; those that lie
 * where they are shown are left out. A piece that was turned, scaled or mirrored since can't be shown by moving it and is left
 * out, too.
 */
export function shiftsBetween(shown: MockupDocument, wanted: MockupDocument): ReadonlyMap<string, Shift> {
  const shifts = new Map<string, Shift>();
  if (shown === wanted) return shifts;
  const before = placesOf(shown);
  for (const [id, place] of placesOf(wanted)) {
    const was = before.get(id);
    if (!was || was.turn !== place.turn || was.scale !== place.scale || was.mirrored !== place.mirrored) continue;
    if (was.x !== place.x || was.y !== place.y) shifts.set(id, { dx: place.x - was.x, dy: place.y - was.y });
  }
  return shifts;
}

/** A box where it lies after a shift; where it was without one. */
export function boxShifted(box: Box, shift: Shift | undefined): Box {
  return shift ? { ...box, x: box.x + shift.dx, y: box.y + shift.dy } : box;
}

type Place = Readonly<Placement>;

function placesOf(document: MockupDocument): Map<string, Place> {
  const places = new Map<string, Place>();
  for (const { pieces, hold } of document.layers) {
    for (const { id, placement } of pieces) places.set(id, placement);
    if (hold.kind === "standoff")
      for (const { id, x, y } of hold.holes) places.set(id, { x, y, turn: 0, scale: 1, mirrored: false });
  }
  return places;
}
