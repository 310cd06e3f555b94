import { signedRingArea } from "../geometry/area.ts";
import type { Point, Region } from "../geometry/path.ts";
import { ringDepths } from "../geometry/ring-depths.ts";

/** Nodes and weights of the five-point Gauss-Legendre rule on 0 to 1: exact for polynomials up to the ninth degree. */
const gauss: readonly (readonly [at: number, weight: number])[] = [
  [0.046910077030668, 0.118463442528095],
  [0.230765344947158, 0.239314335249683],
  [0.5, 0.284444444444444],
  [0.769234655052842, 0.239314335249683],
  [0.953089922969332, 0.118463442528095],
];

/** A complex number. */
export type Complex = { readonly re: number; readonly im: number };

/**
 * The moment ∫ zᵖ dA of a region without crossings about `about`, with z = x + i y in mm, for p from 0 to 8, by Green's
 * theorem: 2 i ∫ zᵖ dA = ∮ z̄ zᵖ dz. The rings may run either way.
 */
export function areaMoment(region: Region, about: Point, power: number): Complex {
  const depths = region.length < 2 ? region.map(() => 0) : ringDepths(region);
  let re = 0;
  let im = 0;
  for (const [index, ring] of region.entries()) {
    const bounds = (depths[index] ?? 0) % 2 === 0 ? 1 : -1;
    const sign = bounds * (signedRingArea(ring) < 0 ? -1 : 1);
    let previous = ring.at(-1);
    for (const point of ring) {
      if (previous) {
        const part = edgeIntegral(previous, point, about, power);
        re += sign * part.re;
        im += sign * part.im;
      }
      previous = point;
    }
  }
  // Divided by 2 i.
  return { re: im / 2, im: -re / 2 };
}

/** ∫ z̄ zᵖ dz along a straight edge. */
function edgeIntegral(from: Point, to: Point, about: Point, power: number): Complex {
  const step = { re: to.x - from.x, im: to.y - from.y };
  let re = 0;
  let im = 0;
  for (const [at, weight] of gauss) {
    const z = { re: from.x - about.x + step.re * at, im: from.y - about.y + step.im * at };
    let value: Complex = { re: z.re, im: -z.im };
    for (let times = 0; times < power; times++) value = multiply(value, z);
    re += weight * value.re;
    im += weight * value.im;
  }
  return multiply({ re, im }, step);
}

const multiply = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
});
