import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2, regionCentroid, regionPerimeterMm, signedRingArea } from "#shared/geometry/area.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Polygon } from "#shared/geometry/path.ts";
import { circleKappa, circlePath, ellipsePath, rectanglePath, roundedRectanglePath } from "#shared/geometry/shapes.ts";
import { regionTransform, rotateMatrix } from "#shared/geometry/transform.ts";
import { checkReference } from "../support/check-reference.ts";

// Source: elementary plane geometry, the Steiner formula for parallel bodies, and the cubic approximation of the circle
// (T. Dokken et al., Computer Aided Geometric Design 7, 1990), collected in tests/fixtures/reference/geometry-cases.json.
const cases = JSON.parse(
  readFileSync(new URL("../fixtures/reference/geometry-cases.json", import.meta.url), "utf8"),
) as {
  regular_polygons_R1: { n: number; area: number; perimeter: number }[];
  four_cubic_circle: { kappa: number; area: number; perimeter: number };
  winding: { vertices: [number, number][]; area_nonzero: number; area_evenodd: number; abs_signed_shoelace: number };
  winding_squares: { case: string; nonzero: number; evenodd: number }[];
};

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const polygon = (...points: [number, number][]): Polygon => points.map(([x, y]) => ({ x, y }));
const square = (side: number, at = 0) => polygon([at, at], [at + side, at], [at + side, at + side], [at, at + side]);
const triangle345 = polygon([0, 0], [4, 0], [0, 3]);
const hexagon = Array.from({ length: 6 }, (_, k) => ({
  x: Math.cos((k * Math.PI) / 3),
  y: Math.sin((k * Math.PI) / 3),
}));
const ell = polygon([0, 0], [10, 0], [10, 5], [5, 5], [5, 10], [0, 10]);

describe("areas and lengths", () => {
  it.each(cases.regular_polygons_R1)("the regular polygon of $n corners has area $area", ({ n, area, perimeter }) => {
    const ring = Array.from({ length: n }, (_, k) => ({
      x: 50 + Math.cos((2 * Math.PI * k) / n),
      y: -20 + Math.sin((2 * Math.PI * k) / n),
    }));
    const row = { source: "plane geometry", within: 5e-10 };
    checkReference({ ...row, what: `area of ${n} corners`, expected: area, got: regionAreaMm2([ring]) });
    checkReference({ ...row, what: `edge of ${n} corners`, expected: perimeter, got: regionPerimeterMm([ring]) });
    expect(regionCentroid([ring])?.x).toBeCloseTo(50, 9);
  });

  it("the circle of four cubics has the area 3.14247233 and the length 6.28406679 of its closed forms", () => {
    expect(circleKappa).toBeCloseTo(0.5522847498307935, 15);
    const fine = flattenPath(circlePath({ x: 0, y: 0 }, 1), 1e-8);
    expect(regionAreaMm2(fine)).toBeCloseTo(3.1424723326565, 6);
    expect(regionPerimeterMm(fine)).toBeCloseTo(6.28406679, 6);
  });

  it("an annulus of radii 10 and 6 measures 201.06 mm² and 100.53 mm of edge", () => {
    const region = [
      ...flattenPath(circlePath({ x: 3, y: 4 }, 10), 1e-5),
      ...flattenPath(circlePath({ x: 3, y: 4 }, 6), 1e-5),
    ];
    // Four cubics are 0.028 % too large.
    expect(regionAreaMm2(region) / 201.06192982974676).toBeCloseTo(1.00028, 4);
    expect(regionPerimeterMm(region) / 100.53096491487338).toBeCloseTo(1.00014, 4);
    expect(regionCentroid(region)).toEqual({ x: expect.closeTo(3, 6), y: expect.closeTo(4, 6) });
  });

  it("a rounded rectangle 100 × 60 with radius 8 measures 5945.06 mm²", () => {
    const region = flattenPath(roundedRectanglePath({ x: 0, y: 0, width: 100, height: 60 }, 8), 1e-5);
    expect(Math.abs(regionAreaMm2(region) - 5945.061929829747)).toBeLessThan(0.06);
    expect(Math.abs(regionPerimeterMm(region) - 306.2654824574367)).toBeLessThan(0.01);
  });

  it("a stadium of 80 straight and radius 15 measures 3106.86 mm²", () => {
    const region = flattenPath(roundedRectanglePath({ x: 0, y: 0, width: 110, height: 30 }, 15), 1e-5);
    expect(Math.abs(regionAreaMm2(region) - 3106.858347057703)).toBeLessThan(0.21);
    expect(Math.abs(regionPerimeterMm(region) - 254.2477796076938)).toBeLessThan(0.02);
  });

  it("an ellipse of half axes 50 and 30 measures 4712.39 mm² and 255.27 mm", () => {
    const region = flattenPath(ellipsePath({ x: 0, y: 0 }, 50, 30), 1e-5);
    expect(regionAreaMm2(region) / 4712.38898038469).toBeCloseTo(1.00028, 5);
    expect(regionPerimeterMm(region) / 255.2699886339813).toBeCloseTo(1.0001, 3);
  });

  it("the L of 10 × 10 less 5 × 5 measures 75, 40 and has its centroid at 4.1667", () => {
    expect(regionAreaMm2([ell])).toBe(75);
    expect(regionPerimeterMm([ell])).toBe(40);
    expect(regionCentroid([ell])).toEqual({ x: expect.closeTo(25 / 6, 12), y: expect.closeTo(25 / 6, 12) });
  });

  it("the box of 100 × 40 turned by 30° is 106.6025 × 84.6410", () => {
    const turned = regionTransform(
      [square(1)].map(() => polygon([0, 0], [100, 0], [100, 40], [0, 40])),
      rotateMatrix(30),
    );
    const box = boxOfPath([
      {
        start: turned[0]?.[0] ?? { x: 0, y: 0 },
        segments: (turned[0] ?? []).map((to) => ({ kind: "line" as const, to })),
      },
    ]);
    expect(box?.width).toBeCloseTo(106.602540378444, 9);
    expect(box?.height).toBeCloseTo(84.641016151378, 9);
  });
});

describe("offsets", () => {
  it.each([
    { name: "square 10", ring: square(10), d: 2, round: 192.5663706143592, mitre: 196 },
    { name: "square 10", ring: square(10), d: 1, round: 143.14159265358978, mitre: 144 },
    { name: "triangle 3-4-5", ring: triangle345, d: 1, round: 21.141592653589793, mitre: 24 },
    { name: "hexagon R1", ring: hexagon, d: 1, round: 11.73966886494311, mitre: 12.06217782649107 },
    { name: "L", ring: ell, d: 1, round: 117.92699081698724, mitre: 119 },
    { name: "L", ring: ell, d: 2, round: 166.70796326794897, mitre: 171 },
  ])("$name grown by $d measures $round round and $mitre mitred", ({ name, ring, d, round, mitre }) => {
    // Chords of arcs within 0.01 mm lose at most 2/3 of that times the length of the arcs; the grid adds 0.0005 mm of edge.
    const arcs = 2 * Math.PI * d * 1.25;
    const grown = (join: "round" | "mitre") => regionAreaMm2(kernel.offset([ring], d, join));
    const source = "plane geometry, parallel bodies";
    const within = 0.01 * arcs + 0.02;
    checkReference({ what: `${name} grown by ${d}, round`, source, expected: round, got: grown("round"), within });
    checkReference({
      what: `${name} grown by ${d}, mitred`,
      source,
      expected: mitre,
      got: grown("mitre"),
      within: 0.02,
    });
  });

  it.each([
    { name: "square 10", ring: square(10), d: 0.5, area: 81 },
    { name: "L", ring: ell, d: 0.5, area: 56 },
    { name: "triangle 3-4-5", ring: triangle345, d: 0.5, area: 1.5 },
    { name: "triangle 3-4-5", ring: triangle345, d: 1, area: 0 },
  ])("$name shrunk by $d leaves $area", ({ ring, d, area }) => {
    expect(Math.abs(regionAreaMm2(kernel.offset([ring], -d, "mitre")) - area)).toBeLessThan(0.01);
  });

  it("a hole shrinks when its plate grows, whichever way its ring runs", () => {
    const plate = square(20);
    const hole = square(10, 5);
    for (const region of [
      [plate, hole],
      [plate, hole.toReversed()],
      [plate.toReversed(), hole],
    ]) {
      expect(regionAreaMm2(kernel.offset(region, 1, "mitre"))).toBeCloseTo(22 * 22 - 8 * 8, 6);
    }
  });
});

describe("fill rules", () => {
  it("a pentagram measures 1.12257 by non-zero and 0.77568 by even-odd", () => {
    const star = [cases.winding.vertices.map(([x, y]) => ({ x: x * 100, y: y * 100 }))];
    // Corners that move by up to 0.001 mm on the grid can cost that times the edge, 726 and 1089 mm here.
    expect(Math.abs(regionAreaMm2(kernel.union(star, "nonzero")) - 11225.699414489634)).toBeLessThan(0.72);
    expect(Math.abs(regionAreaMm2(kernel.union(star, "evenodd")) - 7756.767521667441)).toBeLessThan(1.08);
    expect(Math.abs(signedRingArea(star[0] ?? [])) / 1e4).toBeCloseTo(1.4694631307311832, 9);
  });

  it.each([
    { name: "the same way", inner: square(4, 3), nonzero: 100, evenodd: 84 },
    { name: "the other way", inner: square(4, 3).toReversed(), nonzero: 84, evenodd: 84 },
  ])("a square of 10 around one of 4 that runs $name", ({ inner, nonzero, evenodd }) => {
    expect(regionAreaMm2(kernel.union([square(10), inner], "nonzero"))).toBe(nonzero);
    expect(regionAreaMm2(kernel.union([square(10), inner], "evenodd"))).toBe(evenodd);
  });

  it("rectangles combine to the areas of arithmetic", () => {
    const a = flattenPath(rectanglePath({ x: 0, y: 0, width: 10, height: 10 }));
    const b = flattenPath(rectanglePath({ x: 6, y: 4, width: 10, height: 3 }));
    expect(regionAreaMm2(kernel.intersect(a, b))).toBe(12);
    expect(regionAreaMm2(kernel.difference(a, b))).toBe(88);
    expect(regionAreaMm2(kernel.union([...a, ...b], "nonzero"))).toBe(118);
  });
});
