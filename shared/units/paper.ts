import type { LengthUnit } from "./length.ts";

/** A sheet of paper standing upright. */
export type PaperSize = {
  readonly name: string;
  readonly standard: string;
  readonly widthMm: number;
  readonly heightMm: number;
};

/** Trimmed sheets: ISO 216 and ANSI/ASME Y14.1 (1 in = 25.4 mm exactly). */
export const paperSizes: readonly PaperSize[] = [
  { name: "A4", standard: "ISO 216", widthMm: 210, heightMm: 297 },
  { name: "A3", standard: "ISO 216", widthMm: 297, heightMm: 420 },
  { name: "A2", standard: "ISO 216", widthMm: 420, heightMm: 594 },
  { name: "A1", standard: "ISO 216", widthMm: 594, heightMm: 841 },
  { name: "A0", standard: "ISO 216", widthMm: 841, heightMm: 1189 },
  { name: "Letter", standard: "ANSI/ASME Y14.1", widthMm: 215.9, heightMm: 279.4 },
  { name: "Tabloid", standard: "ANSI/ASME Y14.1", widthMm: 279.4, heightMm: 431.8 },
  { name: "C", standard: "ANSI/ASME Y14.1", widthMm: 431.8, heightMm: 558.8 },
  { name: "D", standard: "ANSI/ASME Y14.1", widthMm: 558.8, heightMm: 863.6 },
  { name: "E", standard: "ANSI/ASME Y14.1", widthMm: 863.6, heightMm: 1117.6 },
];

/** The size of that name; null for one that we don't know. */
export function paperOf(name: string): PaperSize | null {
  return paperSizes.find((size) => size.name === name) ?? null;
}

/** The sheet a shop's proofs are drawn on unless it says otherwise: A3 or Tabloid, lying. */
export function usualPaper(unit: LengthUnit): PaperSize {
  const name = unit === "mm" ? "A3" : "Tabloid";
  const size = paperOf(name);
  if (!size) throw new Error(`The list of papers has no ${name}.`);
  return { ...size, widthMm: size.heightMm, heightMm: size.widthMm };
}
