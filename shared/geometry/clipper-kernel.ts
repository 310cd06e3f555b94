import type { JoinType, MainModule, Paths64 } from "clipper2-wasm/dist/clipper2z";
import type { FillRule, Join, Kernel } from "./kernel.ts";
import type { Polygon, Region } from "./path.ts";
import { strokeParts, withoutPinholes } from "./stroke-parts.ts";

/** Steps of the kernel's grid in a mm. The module's own calls for decimals round to 1/1024 instead, so we scale ourselves. */
const stepsPerMm = 1000;
const arcToleranceMm = 0.01;
const mitreLimit = 4;
/** Far beyond any sign, and well inside what the 64-bit grid and its products can hold. */
const largestCoordinateMm = 1_000_000;

/**
 * The kernel on a loaded clipper2-wasm module. Everything allocated in the module's memory is freed before a call
 * returns or throws. Throws a RangeError for coordinates that are not finite or lie beyond 1,000,000 mm.
 */
export function clipperKernel(clipper: MainModule): Kernel {
  const fillRules: Record<FillRule, MainModule["FillRule"]["EvenOdd" | "NonZero"]> = {
    evenodd: clipper.FillRule.EvenOdd,
    nonzero: clipper.FillRule.NonZero,
  };
  const joins: Record<Join, JoinType> = { round: clipper.JoinType.Round, mitre: clipper.JoinType.Miter };

  const combine = (
    type: MainModule["ClipType"]["Union" | "Intersection" | "Difference"],
    rule: FillRule,
    subject: Region,
    clip: Region,
  ): Region => {
    const a = toGrid(clipper, subject);
    try {
      const b = toGrid(clipper, clip);
      try {
        return takeRegion(clipper, clipper.BooleanOp64(type, fillRules[rule], a, b));
      } finally {
        b.delete();
      }
    } finally {
      a.delete();
    }
  };
  const union = (region: Region, rule: FillRule): Region =>
    region.length === 0 ? [] : combine(clipper.ClipType.Union, rule, region, []);

  return {
    union,
    intersect: (a, b) =>
      a.length === 0 || b.length === 0 ? [] : combine(clipper.ClipType.Intersection, "evenodd", a, b),
    difference: (a, b) => (a.length === 0 ? [] : combine(clipper.ClipType.Difference, "evenodd", a, b)),
    offset: (region, distanceMm, join) => {
      // An offset of rings whose direction does not say which is a hole is wrong without a sound, so they are oriented first.
      const oriented = union(region, "evenodd");
      if (oriented.length === 0 || distanceMm === 0) return oriented;
      const paths = toGrid(clipper, oriented);
      try {
        const { EndType } = clipper;
        const steps = distanceMm * stepsPerMm;
        const arcs = arcToleranceMm * stepsPerMm;
        return takeRegion(
          clipper,
          clipper.InflatePaths64(paths, steps, joins[join], EndType.Polygon, mitreLimit, arcs),
        );
      } finally {
        paths.delete();
      }
    },
    strokeOutline: (line, options) => withoutPinholes(union(strokeParts(line, options), "nonzero")),
  };
}

/** A shape reaches farther than the kernel's grid. */
export class OutOfReach extends RangeError {
  override readonly name = "OutOfReach";
}

function toGrid(clipper: MainModule, region: Region): Paths64 {
  const paths = new clipper.PathsD();
  try {
    for (const polygon of region) {
      if (polygon.length < 3) continue;
      // The module holds a point as x, y and a label.
      const numbers = new Float64Array(polygon.length * 3);
      for (const [index, { x, y }] of polygon.entries()) {
        if (!(Math.abs(x) <= largestCoordinateMm && Math.abs(y) <= largestCoordinateMm))
          throw new OutOfReach(`A point at ${x}, ${y} lies outside what the geometry kernel takes.`);
        numbers[index * 3] = Math.round(x * stepsPerMm);
        numbers[index * 3 + 1] = Math.round(y * stepsPerMm);
      }
      const path = new clipper.PathD();
      path.assign(numbers);
      paths.push_back(path);
      path.delete();
    }
    return clipper.PathsDToPaths64(paths);
  } finally {
    paths.delete();
  }
}

/** Copies the rings out of the module's memory, in mm, and frees them. */
function takeRegion(clipper: MainModule, onGrid: Paths64): Region {
  const paths = clipper.Paths64ToPathsD(onGrid);
  onGrid.delete();
  const region: Polygon[] = [];
  const count = paths.size();
  for (let index = 0; index < count; index++) {
    const path = paths.get(index);
    const numbers = path.view();
    const polygon = Array.from({ length: numbers.length / 3 }, (_, point) => ({
      x: (numbers[point * 3] ?? 0) / stepsPerMm,
      y: (numbers[point * 3 + 1] ?? 0) / stepsPerMm,
    }));
    path.delete();
    if (polygon.length >= 3) region.push(polygon);
  }
  paths.delete();
  return region;
}
