import { z } from "zod";
import { inchesToMm, type LengthUnit } from "#shared/units/length.ts";

/** Spacings from a tenth of a millimetre, finer than anything is cut, to a metre. */
export const spacingRange = { least: 0.1, most: 1000 } as const;

const spacing = z.number().min(spacingRange.least).max(spacingRange.most);

export const deskAidsSchema = z.object({
  rulers: z.boolean(),
  /** Whether the grid is drawn, and whether its lines catch: only one that is drawn does. */
  grid: z.boolean(),
  gridMm: spacing,
  gridCatches: z.boolean(),
  /** How far from the board's edges a line catches; null for none. */
  marginMm: spacing.nullable(),
});

/** What helps the eye and the hand on the elevation, chosen by each person. None of it is part of the sign. */
export type DeskAids = z.infer<typeof deskAidsSchema>;

/** What one begins with: 5 and 20 mm, or a quarter and three quarters of an inch. */
export function usualAids(unit: LengthUnit): DeskAids {
  const [gridMm, marginMm] = unit === "mm" ? [5, 20] : [inchesToMm(1 / 4), inchesToMm(3 / 4)];
  return { rulers: true, grid: false, gridMm, gridCatches: true, marginMm };
}

/** Spacing of the lines that catch; null when none do. */
export const catchingGridMm = ({ grid, gridCatches, gridMm }: DeskAids): number | null =>
  grid && gridCatches ? gridMm : null;
