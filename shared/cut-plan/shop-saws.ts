import { z } from "zod";

const mm = (most: number) => z.number().finite().min(0).max(most);

/** How a shop cuts: what its machines leave and take. Defaults are common practice until the shop states its own. */
export const shopSawsSchema = z.strictObject({
  /** Between a piece and the edge of its sheet, and between neighbours beside the kerf. */
  sheetMarginMm: mm(100).default(6),
  sheetSpacingMm: mm(50).default(1),
  /** An offcut with both sides this long is kept. */
  leastOffcutMm: mm(2000).default(150),
  /** A sheet where the stock list has none: what is usually bought. */
  usualSheetWidthMm: mm(10_000).positive().default(1220),
  usualSheetHeightMm: mm(10_000).positive().default(610),
  /** The blade that cuts slats and frames, square to itself; what squares a bar's first end, kerf included. */
  sawKerfMm: mm(20).default(3),
  squaringMm: mm(500).default(10),
  /** Share of a bar that knots and flaws take. */
  rejectShare: z.number().finite().min(0).max(0.9).default(0.1),
  /** Lengths that slat and frame stock is bought in. */
  barLengthMm: mm(10_000).positive().default(2440),
});

export type ShopSaws = z.infer<typeof shopSawsSchema>;

export const usualSaws: ShopSaws = shopSawsSchema.parse({});
