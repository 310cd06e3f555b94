import { it } from "vitest";
import { z } from "zod";
import type { Polygon } from "#shared/geometry/path.ts";
import { smallestBox } from "#shared/geometry/smallest-box.ts";
import { regionTransform, rotateMatrix } from "#shared/geometry/transform.ts";
import { checkReference } from "../support/check-reference.ts";
import { referenceJson } from "../support/reference-data.ts";

// Plane geometry; checked with an open-source geometry library when the table was made.
const cases = z
  .object({ minimum_area_rectangle: z.array(z.object({ shape: z.string(), min_area: z.number() })) })
  .parse(referenceJson("geometry-cases.json")).minimum_area_rectangle;

const polygon = (...points: [number, number][]): Polygon => points.map(([x, y]) => ({ x, y }));
const regular = (n: number): Polygon =>
  Array.from({ length: n }, (_, k) => ({ x: Math.cos((2 * Math.PI * k) / n), y: Math.sin((2 * Math.PI * k) / n) }));
const turned = (ring: Polygon, degrees: number): Polygon => regionTransform([ring], rotateMatrix(degrees))[0] ?? [];

const shapes: Readonly<Record<string, Polygon>> = {
  "100x40 turned 30 deg": turned(polygon([0, 0], [100, 0], [100, 40], [0, 40]), 30),
  "unit square turned 45 deg": turned(polygon([0, 0], [1, 0], [1, 1], [0, 1]), 45),
  "equilateral triangle side 2": polygon([0, 0], [2, 0], [1, Math.sqrt(3)]),
  "regular pentagon R1": regular(5),
  "regular hexagon R1": regular(6),
  "triangle 3-4-5": polygon([0, 0], [4, 0], [0, 3]),
};

it.each(cases)("$shape fits into $min_area", ({ shape, min_area }) => {
  const box = smallestBox([shapes[shape] ?? []]);
  checkReference({
    what: `smallest box of ${shape}`,
    source: "plane geometry",
    expected: min_area,
    got: (box?.length ?? NaN) * (box?.width ?? NaN),
    within: 1e-9 * min_area,
  });
});
