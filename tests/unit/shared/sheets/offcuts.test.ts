import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { boxOfRegion } from "#shared/geometry/box.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Box, Region } from "#shared/geometry/path.ts";
import { offcutsOf } from "#shared/sheets/offcuts.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const sheet: Region = [
  [
    { x: 0, y: 0 },
    { x: 600, y: 0 },
    { x: 600, y: 400 },
    { x: 0, y: 400 },
  ],
];
const sheetBox = { x: 0, y: 0, width: 600, height: 400 };
const sizes = (region: Region, box: Box, used: Box | null, leastMm = 100) =>
  offcutsOf(region, box, used, { kerfMm: 4, leastMm }, kernel)
    .map((part) => boxOfRegion(part))
    .map((part) => (part ? [part.x, part.y, part.width, part.height] : []));

describe("what is left for another job", () => {
  it("all of a sheet that nothing lies on", () => {
    expect(sizes(sheet, sheetBox, null)).toEqual([[0, 0, 600, 400]]);
  });

  it("the end of the sheet in its full width, and what lies beside the pieces, a kerf off each", () => {
    expect(sizes(sheet, sheetBox, { x: 5, y: 5, width: 291, height: 241 })).toEqual([
      [300, 0, 300, 400],
      [0, 250, 296, 150],
    ]);
  });

  it("the sheet is cut along first where that leaves the larger offcut", () => {
    expect(sizes(sheet, sheetBox, { x: 5, y: 5, width: 491, height: 91 })).toEqual([[0, 100, 600, 300]]);
  });

  it("strips that are too narrow to be kept are no offcuts", () => {
    const used = { x: 5, y: 5, width: 491, height: 391 };
    expect(sizes(sheet, sheetBox, used)).toEqual([[500, 0, 100, 400]]);
    expect(sizes(sheet, sheetBox, used, 101)).toEqual([]);
  });

  it("of a sheet with a slanting edge only what there is", () => {
    const wedge: Region = [
      [
        { x: 0, y: 0 },
        { x: 600, y: 0 },
        { x: 0, y: 400 },
      ],
    ];
    const [first] = offcutsOf(
      wedge,
      sheetBox,
      { x: 5, y: 5, width: 191, height: 200 },
      { kerfMm: 4, leastMm: 100 },
      kernel,
    );
    // Cut at 200: the triangle from there to 600, as high as 400 · (1 − 200/600).
    expect(boxOfRegion(first ?? [])).toEqual({ x: 200, y: 0, width: 400, height: expect.closeTo(266.667, 2) });
  });
});
