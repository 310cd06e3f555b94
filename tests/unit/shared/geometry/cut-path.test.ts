import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { regionAreaMm2 } from "#shared/geometry/area.ts";
import { cubicRootsOnLine, cubicSplit } from "#shared/geometry/cut-cubic.ts";
import { cutPath } from "#shared/geometry/cut-path.ts";
import { cubicPoint, flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Path, Point, Polygon } from "#shared/geometry/path.ts";
import { circlePath, ellipsePath, polygonRing, rectanglePath, roundedRectanglePath } from "#shared/geometry/shapes.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const upright = (x: number) => ({ through: { x, y: 0 }, along: { x: 0, y: 1 } });
const areaOf = (path: Path) => regionAreaMm2(kernel.union(flattenPath(path), "evenodd"));
const cubics = (path: Path) => path.flatMap(({ segments }) => segments).filter(({ kind }) => kind === "cubic").length;
const cut = (path: Path, line: Parameters<typeof cutPath>[1]) => {
  const parts = cutPath(path, line);
  if (!parts) throw new Error("A node lies on the line.");
  return parts;
};

describe("a straight cut", () => {
  it("through a rectangle leaves two", () => {
    // Down the sheet: its left is the greater x.
    const { left, right } = cut(rectanglePath({ x: 0, y: 0, width: 100, height: 40 }), upright(30));
    expect([areaOf(left), areaOf(right)]).toEqual([expect.closeTo(70 * 40, 6), expect.closeTo(30 * 40, 6)]);
  });

  it("through a circle keeps its curves, two quarters and two parts of one a side", () => {
    const { left, right } = cut(circlePath({ x: 0, y: 0 }, 50), upright(0.001));
    // The circle of four cubics is at most 0.028 % too large.
    for (const half of [left, right]) {
      expect(Math.abs(areaOf(half) / ((Math.PI * 50 * 50) / 2) - 1)).toBeLessThan(5e-4);
      expect(half).toHaveLength(1);
    }
    expect([cubics(left), cubics(right)].toSorted()).toEqual([2, 4]);
  });

  it("through a ring leaves two halves without a web between outside and hole", () => {
    const ring = [...circlePath({ x: 0, y: 0 }, 50), ...circlePath({ x: 0, y: 0 }, 20)];
    const { left, right } = cut(ring, upright(0.01));
    for (const half of [left, right]) {
      expect(half).toHaveLength(1);
      expect(Math.abs(areaOf(half) / ((Math.PI * (2500 - 400)) / 2) - 1)).toBeLessThan(2e-3);
    }
  });

  it("leaves what lies on one side as it is", () => {
    const path = rectanglePath({ x: 0, y: 0, width: 10, height: 10 });
    expect(cut(path, upright(20))).toEqual({ left: [], right: path });
  });

  it("is none where a node lies on it", () => {
    expect(cutPath(rectanglePath({ x: 0, y: 0, width: 10, height: 10 }), upright(10))).toBeNull();
  });
});

/** What a half plane takes of a path, by the kernel's booleans alone. */
function clipped(path: Path, { through, along }: Parameters<typeof cutPath>[1], side: 1 | -1) {
  const far = 5000;
  const normal = { x: -along.y * side, y: along.x * side };
  const at = (u: number, v: number): Point => ({
    x: through.x + u * along.x + v * normal.x,
    y: through.y + u * along.y + v * normal.y,
  });
  const half: Polygon = [at(-far, 0), at(far, 0), at(far, far), at(-far, far)];
  return kernel.intersect(kernel.union(flattenPath(path), "evenodd"), [half]);
}

it("gives what clipping with a half plane gives, for any shapes over each other and any line", () => {
  const place = fc.double({ min: -80, max: 80, noNaN: true });
  const size = fc.double({ min: 5, max: 90, noNaN: true });
  const point = fc.record({ x: place, y: place });
  const shape = fc.oneof(
    fc.tuple(point, size, size).map(([at, a, b]) => ellipsePath(at, a, b)),
    fc.tuple(point, size, size).map(([{ x, y }, width, height]) => rectanglePath({ x, y, width, height })),
    fc.tuple(point, size, size).map(([{ x, y }, width, height]) => roundedRectanglePath({ x, y, width, height }, 12)),
    fc.array(point, { minLength: 3, maxLength: 7 }).map((points) => [polygonRing(points)]),
    // Loops and bends that a line may cross three times.
    fc.array(fc.tuple(point, point, point), { minLength: 1, maxLength: 3 }).map((curves) => [
      {
        start: curves.at(-1)?.[2] ?? { x: 0, y: 0 },
        segments: curves.map(([c1, c2, to]) => ({ kind: "cubic" as const, c1, c2, to })),
      },
    ]),
  );
  fc.assert(
    fc.property(
      fc.array(shape, { minLength: 1, maxLength: 3 }),
      point,
      fc.double({ min: 0, max: 360, noNaN: true }),
      (shapes, through, turn) => {
        const path = shapes.flat();
        const radians = (turn * Math.PI) / 180;
        const line = { through, along: { x: Math.cos(radians), y: Math.sin(radians) } };
        const parts = cutPath(path, line);
        if (!parts) return;
        for (const [part, side] of [
          [parts.right, 1],
          [parts.left, -1],
        ] as const) {
          const wanted = clipped(path, line, side);
          const got = kernel.union(flattenPath(part), "evenodd");
          const apart = [...kernel.difference(wanted, got), ...kernel.difference(got, wanted)];
          // Both flatten to 0.02 mm, but divide the curves otherwise.
          expect(kernel.offset(kernel.union(apart, "nonzero"), -0.03, "mitre")).toEqual([]);
        }
      },
    ),
    { numRuns: 150 },
  );
});

it("a cubic in parts is the cubic: each part ends where it is divided, and its middle lies on it", () => {
  const from = { x: 0, y: 0 };
  const cubic = { kind: "cubic" as const, c1: { x: 40, y: 90 }, c2: { x: 70, y: -80 }, to: { x: 100, y: 10 } };
  const at = (t: number) => cubicPoint(from, cubic.c1, cubic.c2, cubic.to, t);
  const places = [0.2, 0.5, 0.9];
  const parts = cubicSplit(from, cubic, places);
  expect(parts).toHaveLength(4);
  let start: Point = from;
  for (const [index, { c1, c2, to }] of parts.entries()) {
    const [begin, end] = [places[index - 1] ?? 0, places[index] ?? 1];
    for (const [got, wanted] of [
      [to, at(end)],
      [cubicPoint(start, c1, c2, to, 0.5), at((begin + end) / 2)],
    ] as const) {
      expect(got.x).toBeCloseTo(wanted.x, 9);
      expect(got.y).toBeCloseTo(wanted.y, 9);
    }
    start = to;
  }
});

describe("where a cubic changes its sign", () => {
  it.each([
    { coefficients: [-1, -1, 1, 1], roots: [0.5] },
    { coefficients: [1, 1, 1, 1], roots: [] },
    // (t − 0.25)(t − 0.75) with a raised degree.
    { coefficients: [0.1875, -0.1458333, -0.1458333, 0.1875], roots: [0.25, 0.75] },
    // Comes near at a half, 0.025 above, and does not cross.
    { coefficients: [1, -0.3, -0.3, 1], roots: [] },
  ])("$coefficients: $roots", ({ coefficients, roots }) => {
    const found = cubicRootsOnLine(coefficients);
    expect(found).toHaveLength(roots.length);
    for (const [index, root] of roots.entries()) expect(found[index]).toBeCloseTo(root, 5);
  });
});
