import { longestMm } from "#shared/mockup/schema-parts.ts";

/** The bounds of the document's schema, for commands that hold a value inside instead of refusing it. */
export const mostLayers = 60;
export const mostPieces = 2000;
export const mostHoles = 1000;
export const mostLettering = 200;
export const mostOffsetMm = 1000;
export const offsetBounds = { least: 0, most: mostOffsetMm } as const;
/** Pockets, as the document takes them; our choice within it for the depth. */
export const pocketDepthBounds = { least: 0.1, most: 100 } as const;
export const clearanceBounds = { least: 0, most: 5 } as const;
export const bitRadiusBounds = { least: 0, most: 25 } as const;
export const coordinateBounds = { least: -longestMm, most: longestMm } as const;
/** Width or height of pieces; our choice for the least: nothing thinner is cut. */
export const sizeBounds = { least: 0.1, most: longestMm } as const;
/** Our choice for the least. */
export const spineWidthBounds = { least: 1, most: longestMm } as const;
/** Our choice: no drill of a sign shop makes a smaller or a wider hole. */
export const holeBounds = { least: 0.5, most: 100 } as const;
/** Sizes of a piece against its artwork, as a share. */
export const scaleBounds = { least: 0.001, most: 1000 } as const;

/** Lengths are kept to a thousandth of a millimetre, the kernel's grid, so that sums of small moves leave no dust. */
export function roundMm(value: number): number {
  const rounded = Math.round(value * 1000) / 1000;
  return rounded === 0 ? 0 : rounded;
}

/** A place on the board, rounded; null for what is no number or further off than a document takes. */
export function coordinateOf(value: number): number | null {
  const rounded = roundMm(value);
  return Math.abs(rounded) <= longestMm ? rounded : null;
}

/** A length over 0 and up to `most` mm, rounded; null when it is not one. */
export function lengthOf(value: number, most = longestMm, least = 0): number | null {
  if (!Number.isFinite(value)) return null;
  const rounded = roundMm(value);
  return rounded > 0 && rounded >= least && rounded <= most ? rounded : null;
}

/** The step on which places, turns and sizes are kept that were worked out: far under the kernel's, yet sums leave no dust on it. */
const finest = 1e10;
const onFinest = (value: number): number => Math.round(value * finest) / finest || 0;

/**
 * A place on the board to the ten-thousandth of a micrometre, so that equal gaps stay equal and sixty-fourths of an inch
 * add up; null for what is no number or further off than a document takes.
 */
export function exactCoordinateOf(value: number): number | null {
  const exact = onFinest(value);
  return Math.abs(exact) <= longestMm ? exact : null;
}

/** Degrees clockwise, 0 up to 360; null for what is no number. */
export function turnOf(value: number): number | null {
  if (!Number.isFinite(value)) return null;
  const turn = onFinest(((value % 360) + 360) % 360);
  return turn >= 360 ? 0 : turn;
}

/** A size as a share; null when a document takes none such. */
export function exactScaleOf(value: number): number | null {
  const scale = Math.round(value * 1e12) / 1e12;
  return scale > 0 && scale <= scaleBounds.most ? scale : null;
}

/** A name as the document keeps it: trimmed, one to 120 characters; null when nothing is left. */
export function nameOf(text: string): string | null {
  const name = text.trim().slice(0, 120).trim();
  return name === "" ? null : name;
}
