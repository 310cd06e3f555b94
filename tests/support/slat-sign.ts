import type { FrameOfSign, Layer, MockupDocument, Slats } from "#shared/mockup/document.ts";
import { buildSign } from "./build-sign.ts";

const pine = buildSign([]).backer.stock;
/** Red oak: its gravity, and movement by point of moisture (Wood Handbook, GTR-282, tables 5-3 and 13-5). */
export const oak = {
  ...pine,
  name: "Red oak",
  gravity: 0.63,
  hardness: "hardwood" as const,
  movementPerPoint: 0.00369,
};

/** Oak slats of 40 by 9 mm that lie across, from the lower edge up, without gaps, unless overridden. */
export const buildSlats = (rest: Partial<Slats> = {}): Slats => ({
  stock: oak,
  thickness: 9,
  pattern: "single",
  angle: 90,
  slatWidth: 40,
  gap: 0,
  spineWidth: 40,
  spineOffset: 0,
  start: { kind: "corner" },
  direction: "up",
  overhang: 0,
  ...rest,
});

/** A frame of oak, 20 by 30 mm, mitred, unless overridden. */
export const buildFrame = (rest: Partial<FrameOfSign> = {}): FrameOfSign => ({
  stock: oak,
  width: 20,
  depth: 30,
  mitred: true,
  ...rest,
});

/** Slats on pine of 12 mm, 600 by 400 mm, with these layers: the face is 12 + 9 − 0.3 = 20.7 mm above the back. */
export function buildSlatSign(
  slats: Partial<Slats> = {},
  layers: Layer[] = [],
  overrides: Partial<MockupDocument> = {},
): MockupDocument {
  const plain = buildSign(layers);
  return buildSign(layers, {
    backer: { ...plain.backer, thickness: 12, slats: buildSlats(slats) },
    ...overrides,
  });
}
