import { beforeAll, expect, it } from "vitest";
import { z } from "zod";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import { expectSoundLayout } from "../support/check-layout.ts";
import { checkReference } from "../support/check-reference.ts";
import { buildPiece, buildRequest, buildSheet } from "../support/concave-pieces.ts";
import { referenceJson } from "../support/reference-data.ts";

// J. O. Berkey, P. Y. Wang, JORS 38(5), 423-429, 1987; instances of S. Martello, D. Vigo, Management Science 44(3), 1998.
const bins = z
  .object({
    source: z.string(),
    bin_w: z.number(),
    bin_h: z.number(),
    sum_of_optima: z.number(),
    instances: z.array(
      z.object({ name: z.string(), optimum_bins: z.number(), items_w_h: z.array(z.tuple([z.number(), z.number()])) }),
    ),
  })
  .parse(referenceJson("bpp2d-class01-n20.json"));

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

it("ten sets of 20 rectangles, not to be turned, take at most three sheets more than the 71 of the optimum", () => {
  const counts = bins.instances.map(({ name, optimum_bins, items_w_h }) => {
    const pieces = items_w_h.map(([width, height], index) =>
      buildPiece(String(index), rectanglePath({ x: 0, y: 0, width, height }), {
        turns: { kind: "steps", from: 0, every: 360 },
      }),
    );
    const request = buildRequest(pieces, [buildSheet(bins.bin_w, bins.bin_h)], {
      rules: { marginMm: 0, kerfMm: 0, spacingMm: 0 },
      effort: 0.5,
    });
    const outcome = nestSheets(request, {}, kernel);
    if (!outcome.ok) throw new Error(outcome.problems.map(({ words }) => words).join(" "));
    expectSoundLayout(request, outcome.value, kernel);
    expect(outcome.value.unplaced).toEqual([]);
    expect(outcome.value.sheets.length, name).toBeGreaterThanOrEqual(optimum_bins);
    return outcome.value.sheets.length;
  });
  checkReference({
    what: "sheets for ten sets of 20 rectangles",
    source: bins.source,
    expected: bins.sum_of_optima,
    got: counts.reduce((sum, count) => sum + count, 0),
    within: 3,
  });
});
