import { beforeAll, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { boxOfRegion } from "#shared/geometry/box.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { smallestBox } from "#shared/geometry/smallest-box.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import { boxPackedLengthMm } from "../support/box-packing.ts";
import { expectSoundLayout } from "../support/check-layout.ts";
import { buildPiece, buildRequest, buildSheet, concavePaths } from "../support/concave-pieces.ts";
import { usedLengthMm } from "../support/used-length.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

// The yardstick packs bounding boxes, as drawn or the smallest ones, with the same kerf and margin on the same strip.
it.each([{ seed: 1 }, { seed: 2 }, { seed: 3 }])(
  "60 concave pieces (set $seed) take at least 15 % less sheet than their boxes",
  ({ seed }) => {
    const paths = concavePaths(60, seed);
    const strip = { widthMm: 600, gapMm: 3 };
    const drawn = paths.map((path) => boxOfRegion(flattenPath(path)) ?? { width: 0, height: 0 });
    const smallest = paths.map((path) => {
      const box = smallestBox(flattenPath(path));
      return { width: box?.length ?? 0, height: box?.width ?? 0 };
    });
    const boxes = Math.min(boxPackedLengthMm(drawn, strip), boxPackedLengthMm(smallest, strip));
    const request = buildRequest(
      paths.map((path, index) => buildPiece(String(index), path)),
      [buildSheet(2000, strip.widthMm, { quantity: 1 })],
      { effort: 1 },
    );
    const outcome = nestSheets(request, {}, kernel);
    if (!outcome.ok) throw new Error(outcome.problems.map(({ words }) => words).join(" "));
    expectSoundLayout(request, outcome.value, kernel);
    expect(outcome.value.unplaced).toEqual([]);
    expect(usedLengthMm(outcome.value, strip.gapMm)).toBeLessThan(0.85 * boxes);
  },
);
