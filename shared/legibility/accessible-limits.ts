import { inchesToMm } from "../units/length.ts";

/**
 * Limits of 2010 ADA Standards, section 703, that can be measured on a drawing. An aid: it states no compliance, and says
 * nothing of clauses that are not measured here (contrast, finish, typeface, place of the sign, braille's translation).
 * Lengths mm; shares without unit. Null where the standard sets no limit on that side.
 */
export type AccessibleLimit = {
  readonly id: AccessibleMeasure;
  readonly clause: string;
  readonly what: string;
  readonly unit: "mm" | "share";
  readonly least: number | null;
  readonly most: number | null;
};

export type AccessibleMeasure =
  | "raised depth"
  | "raised width to height"
  | "raised height"
  | "raised stroke"
  | "raised gap"
  | "raised gap at base"
  | "raised to border"
  | "raised line spacing"
  | "braille dot base"
  | "braille dot spacing"
  | "braille cell spacing"
  | "braille dot height"
  | "braille line spacing"
  | "braille to text"
  | "tactile lowest baseline"
  | "tactile highest baseline"
  | "visual width to height"
  | "visual height above floor"
  | "visual stroke"
  | "visual gap"
  | "visual line spacing"
  | "pictogram field";

type Inches = readonly [least: number | null, most: number | null];

const mm = (id: AccessibleMeasure, clause: string, what: string, [least, most]: Inches): AccessibleLimit => ({
  id,
  clause,
  what,
  unit: "mm",
  least: least === null ? null : inchesToMm(least),
  most: most === null ? null : inchesToMm(most),
});

const share = (id: AccessibleMeasure, clause: string, what: string, [least, most]: Inches): AccessibleLimit => ({
  id,
  clause,
  what,
  unit: "share",
  least,
  most,
});

export const accessibleLimits: readonly AccessibleLimit[] = [
  mm("raised depth", "703.2.1", "height of raised characters over their ground", [1 / 32, null]),
  share("raised width to height", "703.2.4", "width of the O over height of the I", [0.55, 1.1]),
  mm("raised height", "703.2.5", "height of the raised I", [0.625, 2]),
  share("raised stroke", "703.2.6", "stroke over height of the raised I", [null, 0.15]),
  mm("raised gap", "703.2.7", "gap between raised characters with upright sides", [0.125, null]),
  mm("raised gap at base", "703.2.7", "gap at the base of raised characters with sloped sides", [0.0625, null]),
  mm("raised to border", "703.2.7", "raised characters to raised borders and decoration", [0.375, null]),
  share("raised line spacing", "703.2.8", "baseline to baseline over height, raised", [1.35, 1.7]),
  mm("braille dot base", "703.3.1", "diameter of a dot at its base", [0.059, 0.063]),
  mm("braille dot spacing", "703.3.1", "between two dots of a cell", [0.09, 0.1]),
  mm("braille cell spacing", "703.3.1", "between like dots of neighbouring cells", [0.241, 0.3]),
  mm("braille dot height", "703.3.1", "height of a dot", [0.025, 0.037]),
  mm("braille line spacing", "703.3.1", "between like dots of cells one below the other", [0.395, 0.4]),
  mm("braille to text", "703.3.2", "braille to raised characters and borders (from memory)", [0.375, null]),
  mm("tactile lowest baseline", "703.4.1", "lowest raised baseline over the floor", [48, null]),
  mm("tactile highest baseline", "703.4.1", "highest raised baseline over the floor", [null, 60]),
  share("visual width to height", "703.5.4", "width of the O over height of the I", [0.55, 1.1]),
  mm("visual height above floor", "703.5.6", "visual characters over the floor", [40, null]),
  share("visual stroke", "703.5.7", "stroke over height of the I", [0.1, 0.3]),
  share("visual gap", "703.5.8", "gap between characters over height", [0.1, 0.35]),
  share("visual line spacing", "703.5.9", "baseline to baseline over height", [1.35, 1.7]),
  mm("pictogram field", "703.6.1", "height of a pictogram's field", [6, null]),
];
