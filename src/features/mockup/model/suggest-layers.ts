import { type ColourMatch, nearestStock } from "#shared/colour/nearest-stock.ts";
import type { Artwork } from "#shared/contracts/artworks.ts";
import type { Adhesive } from "#shared/mockup/document.ts";
import { optionsOfHold, type StockChoices } from "./stock-choices.ts";

/** What is proposed for one colour of an artwork: the nearest sheet, by its place in the stock list. */
export type SuggestedLayer = {
  readonly colour: string;
  readonly pieces: number;
  readonly areaMm2: number;
  readonly sheet: number;
  readonly thickness: number;
  readonly deltaE: number;
  readonly match: ColourMatch;
};

/** The thickness proposed when a sheet comes in it; thinner ones are for small parts, thicker ones for a plate (common practice). */
const usualMm = 3;

/** A layer for each colour, largest first, from the opaque sheet with the nearest colour by ΔE00. Empty when no sheet is in stock. */
export function suggestLayers(colours: Artwork["colours"], acrylics: StockChoices["acrylics"]): SuggestedLayer[] {
  const sheets = acrylics.map(({ acrylic }, index) => ({ index, colour: acrylic.colour, look: acrylic.look }));
  const opaque = sheets.filter(({ look }) => look === "opaque");
  return colours
    .toSorted((a, b) => b.areaMm2 - a.areaMm2 || (a.colour < b.colour ? -1 : 1))
    .flatMap(({ colour, pieces, areaMm2 }) => {
      const nearest = nearestStock(colour, opaque.length > 0 ? opaque : sheets);
      if (nearest === null) return [];
      const thicknesses = acrylics[nearest.stock.index]?.thicknessesMm ?? [];
      const thickness = thicknesses.find((mm) => mm >= usualMm) ?? thicknesses.at(-1) ?? usualMm;
      return [
        {
          colour,
          pieces,
          areaMm2,
          sheet: nearest.stock.index,
          thickness,
          deltaE: nearest.deltaE,
          match: nearest.match,
        },
      ];
    });
}

/** Families in the order in which they are proposed: for acrylic on wood and for acrylic on acrylic (common practice). */
const familiesFor = {
  wood: ["epoxy", "neutral silicone", "cyanoacrylate", "high-bond tape"],
  acrylic: ["bodied cement", "solvent cement", "cyanoacrylate"],
} as const satisfies Record<string, readonly Adhesive["family"][]>;

/** The place in `optionsOfHold` of the adhesive proposed for a layer bonded on wood or on acrylic; the first hold when none suits. */
export function suggestHold(stock: StockChoices, on: keyof typeof familiesFor): number {
  const options = optionsOfHold(stock);
  for (const family of familiesFor[on]) {
    const index = options.findIndex((option) => option.kind === "bond" && option.adhesive.family === family);
    if (index >= 0) return index;
  }
  return 0;
}
