import type { Coat } from "../mockup/document.ts";
import { finishedWood, type Coat as WoodCoat } from "./finished-wood.ts";
import { colourOf, labOf } from "./lab.ts";

/** Those coats of a finish that change the wood's colour; sanding, conditioner and whatever else is used do nothing that we know of. */
export function colouringCoats(finish: readonly Coat[]): WoodCoat[] {
  return finish.flatMap((coat): WoodCoat[] => {
    if (coat.kind === "stain") return [{ kind: "stain", colour: labOf(coat.colour), strength: coat.strength }];
    if (coat.kind !== "clear coat") return [];
    return [{ kind: coat.base === "water-borne" ? "clear, water-borne" : "clear, oil or shellac" }];
  });
}

/** Wood of a colour, #RRGGBB, as it is estimated to look under its finish; the colour as it came when no coat changes it. */
export function finishColour(colour: string, finish: readonly Coat[]): string {
  const coats = colouringCoats(finish);
  if (coats.length === 0) return colour;
  const finished = finishedWood(labOf(colour), coats);
  return finished.ok ? colourOf(finished.value) : colour;
}
