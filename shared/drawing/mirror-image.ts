import { base64OfBytes } from "./base64.ts";
import type { Colour } from "./display-list.ts";
import { mixColours } from "./palette.ts";
import { palettePng } from "./png.ts";

const side = 64;
const shades = 96;

/** Brightness of the room in the mirror along a slanting line, from its upper to its lower end, 0 to 1: lamp, ceiling, wall, floor. */
const room = [
  [0, 0.62],
  [0.14, 0.97],
  [0.26, 0.7],
  [0.46, 0.5],
  [0.52, 0.34],
  [0.6, 0.6],
  [0.74, 0.86],
  [0.84, 0.6],
  [1, 0.4],
] as const;

function brightnessAt(place: number): number {
  const next = Math.max(
    1,
    room.findIndex(([at]) => at >= place),
  );
  const [from, dim] = room[next - 1] ?? room[0];
  const [to, bright] = room[next] ?? room[0];
  const share = to === from ? 0 : (place - from) / (to - from);
  return dim + (bright - dim) * share * share * (3 - 2 * share);
}

/** What a mirror of this colour shows: a room out of focus, in soft grades on the slant. Small, to be stretched over a piece. Same colour, same bytes. */
export function mirrorImage(colour: Colour): string {
  const pixels = new Uint8Array(side * side);
  for (let row = 0; row < side; row += 1) {
    for (let column = 0; column < side; column += 1) {
      const place = (0.68 * row + 0.32 * column) / (side - 1);
      pixels[row * side + column] = Math.round(brightnessAt(place) * (shades - 1));
    }
  }
  const dark = mixColours(colour, "#1E2124", 0.6);
  const light = mixColours(colour, "#FFFFFF", 0.86);
  const colours = Array.from({ length: shades }, (_, index) => {
    const share = index / (shades - 1);
    return share < 0.5 ? mixColours(dark, colour, share * 2) : mixColours(colour, light, share * 2 - 1);
  });
  return base64OfBytes(palettePng({ width: side, height: side, pixels }, colours));
}
