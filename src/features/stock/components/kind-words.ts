import type { StockKind } from "#shared/contracts/stock-entry.ts";

/** What each kind is called, as a heading and as one of it. */
export const kindWords: Readonly<Record<StockKind, { readonly title: string; readonly one: string }>> = {
  acrylic: { title: "Acrylic sheet", one: "an acrylic sheet" },
  wood: { title: "Wood", one: "a wood" },
  hardware: { title: "Standoffs", one: "a standoff" },
  screw: { title: "Screws", one: "a screw" },
  adhesive: { title: "Adhesives", one: "an adhesive" },
};

/** In the order of the page. */
export const stockKinds: readonly StockKind[] = ["acrylic", "wood", "hardware", "screw", "adhesive"];
