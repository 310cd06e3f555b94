import { colourOf, labOf } from "../colour/lab.ts";
import type { Colour } from "./display-list.ts";
import { colourChannels, mixColours } from "./palette.ts";

/** From the palest early wood to the darkest late wood of a wood of this colour, the colour itself between them. */
export function grainColours(colour: Colour, shades: number): Colour[] {
  // Pale wood is told by its dark lines, dark wood by light ones that must not turn it grey.
  const [red, green, blue] = colourChannels(colour);
  const brightness = (0.3 * red + 0.59 * green + 0.11 * blue) / 255;
  const light = mixColours(colour, mixColours(colour, "#FFF4E0", 0.9), 0.04 + 0.7 * brightness ** 2);
  const dark = mixColours(colour, mixColours(colour, "#3A2408", 0.65), 0.22 + 0.1 * brightness);
  return Array.from({ length: shades }, (_, index) => mixColours(light, dark, index / (shades - 1)));
}

/** The same wood from another plank: so much lighter in CIELAB L*, and a little less warm for it. */
export function tonedWood(colour: Colour, lighter: number): Colour {
  const { L, a, b } = labOf(colour);
  return colourOf({ L: Math.min(98, Math.max(2, L + lighter)), a: a - 0.16 * lighter, b: b - 0.45 * lighter });
}
