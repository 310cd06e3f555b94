import type { Hold, Locate } from "../mockup/document.ts";

/** What a way of finding a piece's place depends on. */
export type Located = {
  readonly hold: Hold["kind"];
  /** Pieces of the layer, and holes of its hardware. */
  readonly pieces: number;
  readonly holes: number;
  /** Whether the piece hides a line scored under it. */
  readonly opaque: boolean;
};

export type LocatingFit = { readonly method: Locate; readonly finds: boolean; readonly why: string };

/** Two holes hold a panel's place and its turn. */
const holesThatHold = 2;

/** Whether a way of locating finds the place of a layer's pieces, and why. Common practice. */
export function locatingFit(method: Locate, { hold, pieces, holes, opaque }: Located): LocatingFit {
  const judged = (finds: boolean, why: string): LocatingFit => ({ method, finds, why });
  switch (method) {
    case "pocket":
      return hold === "pocket"
        ? judged(true, "The pocket holds the piece where it was cut.")
        : judged(false, "There is no pocket: the layer is held otherwise.");
    case "hole pattern":
      if (hold !== "standoff") return judged(false, "There are no holes: the layer is held otherwise.");
      return holes >= holesThatHold
        ? judged(true, "The holes are drilled through the panel as their own template.")
        : judged(false, "One hole leaves the panel free to turn.");
    case "scored line":
      if (hold === "standoff") return judged(false, "The panel stands off the face that a line could be scored on.");
      return opaque
        ? judged(true, "A fine line just inside the outline, hidden under the piece.")
        : judged(false, "The line would be seen through the piece.");
    case "template":
      return judged(
        true,
        pieces > 1 ? "One cut-out sheet places all pieces at once." : "A sheet cut out to the piece's outline.",
      );
    case "none":
      return judged(false, "Nothing tells the hand where the piece goes.");
  }
}

const bestFirst: readonly Locate[] = ["pocket", "hole pattern", "template", "scored line"];

/** The first way that finds the place: what holds the piece anyway, then a template, then a line. */
export function proposedLocating(layer: Located): Locate {
  return bestFirst.find((method) => locatingFit(method, layer).finds) ?? "none";
}
