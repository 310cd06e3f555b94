import { beforeAll, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Region } from "#shared/geometry/path.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { thinnestGap } from "#shared/pieces/thinnest-gap.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});
const box = (x: number, y: number, width: number, height: number): Region =>
  flattenPath(rectanglePath({ x, y, width, height }));

it.each([0.4, 1, 1.49])("a slot of %f mm is the thinnest gap, and lies where it was cut", (width) => {
  const comb = kernel.difference(box(0, 0, 60, 40), [...box(20, 10, width, 20), ...box(40, 10, 1.9, 20)]);
  const gap = thinnestGap(comb, 1.5, kernel);
  expect(Math.abs((gap?.widthMm ?? 0) - width)).toBeLessThan(0.03);
  expect(gap?.where.x).toBeCloseTo(20 + width / 2, 1);
  expect(gap?.where.y).toBeCloseTo(20, 1);
});

it("gaps between parts count too, wide ones and the space around do not", () => {
  expect(thinnestGap([...box(0, 0, 20, 20), ...box(20.8, 0, 20, 20)], 1.5, kernel)?.widthMm).toBeCloseTo(0.8, 1);
  expect(thinnestGap([...box(0, 0, 20, 20), ...box(23, 0, 20, 20)], 1.5, kernel)).toBeNull();
  expect(thinnestGap(box(0, 0, 20, 20), 1.5, kernel)).toBeNull();
});

it.each([0, -1, Number.NaN, Number.POSITIVE_INFINITY])("a limit of %d finds nothing", (limit) => {
  expect(thinnestGap(box(0, 0, 20, 20), limit, kernel)).toBeNull();
  expect(thinnestGap([], 1.5, kernel)).toBeNull();
});
