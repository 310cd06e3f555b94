import type { Box } from "../geometry/path.ts";
import { base64OfBytes } from "./base64.ts";
import type { Colour, Item } from "./display-list.ts";
import { grainColours } from "./grain-colours.ts";
import { noise } from "./noise.ts";
import { palettePng } from "./png.ts";

/**
 * How dark the grain is at a place in mm, 0 to 1, with the grain along x: growth rings of a flat-sawn board (slowly wandering lines that
 * close up towards the edges), over them long fibres.
 */
function grainAt(x: number, y: number, heightMm: number, seed: number): number {
  const heart = heightMm * (0.35 + 0.3 * noise(seed, 0, 11));
  const wander = 26 * noise(x / 420, y / 170, seed) + 7 * noise(x / 120, y / 34, seed + 1);
  const fromHeart = Math.hypot((y - heart) * 0.92, 34 * noise(x / 600, 0.5, seed + 2)) + wander;
  const ring = fromHeart / 9.5;
  const phase = ring - Math.floor(ring);
  // Late wood ends sharply where the next year's early wood starts.
  const late = phase ** 3 * (0.55 + 0.45 * noise(Math.floor(ring), x / 260, seed + 3));
  const fibre = noise(x / 46, y / 0.9, seed + 4) * 0.6 + noise(x / 17, y / 0.55, seed + 5) * 0.4;
  const cloud = noise(x / 240, y / 60, seed + 6);
  return Math.min(1, Math.max(0, 0.1 + 0.5 * late + 0.26 * fibre + 0.2 * cloud));
}

const shades = 20;
const mostCells = 160_000;

type GrainImage = Extract<Item, { kind: "image" }>;

/** The last grain made. A mockup is drawn again at every step, nearly always on the same board. */
let last: { readonly name: string; readonly image: GrainImage } | null = null;

/**
 * Grain for a board as an image: pale, the wood's own colour in the middle, grain along x, or along y from 45 to 135 degrees. Pixels are longer along the
 * grain, where nothing changes fast. Same box, colour and seed, same bytes.
 */
export function woodGrain(box: Box, colour: Colour, seed: number, grainTurn: number): GrainImage {
  const name = [box.x, box.y, box.width, box.height, colour, seed, grainTurn].join(" ");
  const image = last?.name === name ? last.image : makeGrain(box, colour, seed, grainTurn);
  last = { name, image };
  return image;
}

function makeGrain(box: Box, colour: Colour, seed: number, grainTurn: number): GrainImage {
  // A plain board is sawn along its grain; what lies aslant is drawn the nearer way.
  const upright = grainTurn > 45 && grainTurn < 135;
  const along = upright ? box.height : box.width;
  const across = upright ? box.width : box.height;
  const acrossMm = Math.max(0.6, Math.sqrt((along * across) / (4 * mostCells)));
  const lengthCells = Math.max(2, Math.round(along / (acrossMm * 4)));
  const widthCells = Math.max(2, Math.round(across / acrossMm));
  const width = upright ? widthCells : lengthCells;
  const height = upright ? lengthCells : widthCells;
  const pixels = new Uint8Array(width * height);
  for (let row = 0; row < height; row += 1) {
    for (let column = 0; column < width; column += 1) {
      const alongAt = (upright ? row : column) * (along / lengthCells);
      const acrossAt = (upright ? column : row) * (across / widthCells);
      pixels[row * width + column] = Math.round(grainAt(alongAt, acrossAt, across, seed) * (shades - 1));
    }
  }
  const colours = grainColours(colour, shades);
  return { kind: "image", box, pngBase64: base64OfBytes(palettePng({ width, height, pixels }, colours)) };
}
