import type { Acrylic, Adhesive, Hardware, Screw, Wood } from "../mockup/document.ts";

/** Whole sheets of one thickness and size on hand; null until somebody has counted. */
export type SheetsOnHand = {
  readonly thicknessMm: number;
  readonly widthMm: number;
  readonly heightMm: number;
  readonly quantity: number | null;
};

export type AcrylicStock = {
  readonly acrylic: Acrylic;
  readonly thicknessesMm: readonly number[];
  readonly sheets: readonly SheetsOnHand[];
};
export type WoodStock = { readonly wood: Wood; readonly thicknessesMm: readonly number[] };
export type HardwareStock = { readonly hardware: Hardware; readonly quantity: number | null };

/** What a shop has on hand. Names are the shop's own. */
export type Stock = {
  readonly acrylics: readonly AcrylicStock[];
  readonly woods: readonly WoodStock[];
  readonly hardware: readonly HardwareStock[];
  readonly screws: readonly Screw[];
  readonly adhesives: readonly Adhesive[];
};
