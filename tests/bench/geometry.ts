import { loadKernel } from "#server/artwork/load-kernel.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import { circlePath } from "#shared/geometry/shapes.ts";
import { type Measure, timed } from "../support/benchmark.ts";

const discs = Array.from({ length: 200 }, (_, index) =>
  circlePath({ x: (index % 20) * 25, y: Math.floor(index / 20) * 25 }, 8 + (index % 5) * 2),
);

/** The pieces of work behind every figure and finding, on a sign of 200 overlapping discs. */
export const measure: Measure = async () => {
  const kernel = await loadKernel();
  const rings = discs.flatMap((disc) => flattenPath(disc));
  const region = kernel.union(rings, "nonzero");
  return [
    await timed("flatten 200 discs", () => discs.map((disc) => flattenPath(disc))),
    await timed("union of 200 discs", () => kernel.union(rings, "nonzero")),
    await timed("offset of 200 discs by 3 mm, round", () => kernel.offset(region, 3, "round")),
  ];
};
