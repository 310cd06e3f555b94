import { deltaE00, labOf } from "#shared/colour/lab.ts";
import { type ColourMatch, colourMatch } from "#shared/colour/nearest-stock.ts";
import type { Acrylic, MockupDocument } from "#shared/mockup/document.ts";
import type { ArtworkPart } from "./artwork-parts.ts";
import type { StockChoices } from "./stock-choices.ts";

/** The sheet that a part of an artwork will be cut from, wherever it goes; null when it is left out. */
export function sheetOfPart(
  part: ArtworkPart,
  { parts, document, stock }: { parts: readonly ArtworkPart[]; document: MockupDocument; stock: StockChoices },
): Acrylic | null {
  const { to } = part;
  switch (to.kind) {
    case "new":
      return stock.acrylics[part.sheet]?.acrylic ?? null;
    case "with": {
      const host = parts.find(({ id }) => id === to.part);
      return host ? (stock.acrylics[host.sheet]?.acrylic ?? null) : null;
    }
    case "layer":
      return document.layers.find(({ key }) => key === to.key)?.stock ?? null;
    case "out":
      return null;
  }
}

const matchWords: Record<ColourMatch, string> = {
  same: "the same to the eye",
  close: "close",
  visible: "off, seen side by side",
  "another colour": "clearly different",
};

/** How far a sheet's colour is from the artwork's, in words with the ΔE00. */
export function differenceWords(artwork: string, sheet: string): string {
  const deltaE = deltaE00(labOf(artwork), labOf(sheet));
  return `${matchWords[colourMatch(deltaE)]}, ΔE ${deltaE.toFixed(1)}`;
}
