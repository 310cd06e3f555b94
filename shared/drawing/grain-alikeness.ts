import { regionContains } from "../geometry/contains.ts";
import { directionOf, type GrainStrip, grainOf } from "./strip-grain.ts";

/** Grain of a strip at places in rows along its axis, from its near end; NaN where the strip does not reach. */
export type GrainSample = Float64Array;

const columns = 36;
const rows = 16;
/** Between places along the axis: a short slat still has a few. */
const alongMm = 6;

export function grainSample(strip: GrainStrip, widthMm: number): GrainSample {
  const grain = grainOf(strip, 1);
  const along = directionOf(strip);
  const { from } = strip.axis;
  const sample = new Float64Array(columns * rows).fill(Number.NaN);
  for (let column = 0; column < columns; column += 1) {
    for (let row = 0; row < rows; row += 1) {
      const u = (column + 0.5) * alongMm;
      const v = widthMm * ((row + 0.5) / rows - 0.5);
      const place = { x: from.x + u * along.x - v * along.y, y: from.y + u * along.y + v * along.x };
      if (regionContains(strip.region, place)) sample[column * rows + row] = grain(u, v);
    }
  }
  return sample;
}

/** How much two strips look like one stretch of wood: the correlation of their grain where both show it, -1 to 1; 0 where they have nothing in common. */
export function grainAlikeness(one: GrainSample, other: GrainSample): number {
  let [count, sumA, sumB, sumAA, sumBB, sumAB] = [0, 0, 0, 0, 0, 0];
  for (const [index, a] of one.entries()) {
    const b = other[index] ?? Number.NaN;
    if (Number.isNaN(a) || Number.isNaN(b)) continue;
    count += 1;
    sumA += a;
    sumB += b;
    sumAA += a * a;
    sumBB += b * b;
    sumAB += a * b;
  }
  const spread = Math.sqrt((count * sumAA - sumA * sumA) * (count * sumBB - sumB * sumB));
  return spread > 1e-9 ? (count * sumAB - sumA * sumB) / spread : 0;
}
