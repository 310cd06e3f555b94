import type { ImportedArtwork } from "../artwork/imported-artwork.ts";
import type { TraceChoices } from "./trace-choices.ts";

/** A colour that was found: its share of the picture, and what became of it. */
export type FoundColour = {
  readonly colour: string;
  /** From 0 to 1. */
  readonly share: number;
  /** Whether it fills the rim, as paper does. */
  readonly fillsRim: boolean;
  readonly became: "pieces" | "joined" | "dropped";
};

/** How an artwork came from a picture. Kept beside its pieces. */
export type TraceRecord = {
  readonly choices: TraceChoices;
  /** Size of the picture, and of what was traced, which is smaller when the picture is larger than `longestTracedPx`. */
  readonly widthPx: number;
  readonly heightPx: number;
  readonly tracedWidthPx: number;
  readonly tracedHeightPx: number;
  readonly found: readonly FoundColour[];
  readonly nodes: number;
  readonly smallestMm2: number;
};

export type TracedPicture = { readonly artwork: ImportedArtwork; readonly record: TraceRecord };
