import { z } from "zod";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { boxOfRegion } from "#shared/geometry/box.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { smallestBox } from "#shared/geometry/smallest-box.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import type { NestingRequest, SheetLayout } from "#shared/sheets/nesting.ts";
import { type Measure, type Measurement, quantile, summarise } from "../support/benchmark.ts";
import { boxPackedLengthMm } from "../support/box-packing.ts";
import { buildPiece, buildRequest, buildSheet, concavePaths } from "../support/concave-pieces.ts";
import { referenceJson } from "../support/reference-data.ts";
import { usedLengthMm } from "../support/used-length.ts";

/** Longest that a search may take, as in the product. */
const limitMs = 20_000;
const strip = { widthMm: 600, gapMm: 3 };
const instance = z.object({
  strip_width: z.number(),
  optimum_height: z.number(),
  items_w_h: z.array(z.tuple([z.number(), z.number()])),
});

function nested(request: NestingRequest, kernel: Kernel): { layout: SheetLayout; ms: number } {
  const began = performance.now();
  const outcome = nestSheets(request, { shouldStop: () => performance.now() - began > limitMs }, kernel);
  if (!outcome.ok) throw new Error(outcome.problems.map(({ words }) => words).join(" "));
  return { layout: outcome.value, ms: performance.now() - began };
}

const concaveRequest = (count: number, seed: number, effort: number): NestingRequest =>
  buildRequest(
    concavePaths(count, seed).map((path, index) => buildPiece(String(index), path)),
    [buildSheet(count * 60, strip.widthMm, { quantity: 1 })],
    { effort },
  );

/** How much less of a strip 60 concave pieces take than their boxes, and how long that took. */
function againstBoxes(kernel: Kernel): Measurement[] {
  const rows = [1, 2, 3].map((seed) => {
    const regions = concavePaths(60, seed).map((path) => flattenPath(path));
    const drawn = regions.map((region) => boxOfRegion(region) ?? { width: 0, height: 0 });
    const smallest = regions.map((region) => {
      const box = smallestBox(region);
      return { width: box?.length ?? 0, height: box?.width ?? 0 };
    });
    const boxes = Math.min(boxPackedLengthMm(drawn, strip), boxPackedLengthMm(smallest, strip));
    const { layout, ms } = nested(concaveRequest(60, seed, 10), kernel);
    return { less: 100 * (1 - usedLengthMm(layout, strip.gapMm) / boxes), use: 100 * layout.use, ms };
  });
  const of = (key: "less" | "use" | "ms") => rows.map((row) => row[key]);
  return [
    summarise("60 concave pieces, sheet saved against their boxes (higher is better)", "%", of("less")),
    summarise("60 concave pieces, use of sheet (higher is better)", "%", of("use")),
    summarise("60 concave pieces, search of effort 10", "ms", of("ms")),
  ];
}

/** How far over the optimum published strips come out. */
function againstOptima(kernel: Kernel): Measurement {
  const over = ["C1P1", "C1P2", "C1P3", "C2P1", "N1", "N2"].map((name) => {
    const { strip_width, optimum_height, items_w_h } = instance.parse(referenceJson(`strip-packing-${name}.json`));
    const pieces = items_w_h.map(([width, height], index) =>
      buildPiece(String(index), rectanglePath({ x: 0, y: 0, width, height }), {
        turns: { kind: "steps", from: 0, every: 90 },
      }),
    );
    const rules = { marginMm: 0, kerfMm: 0, spacingMm: 0 };
    const request = buildRequest(pieces, [buildSheet(strip_width, 1000, { quantity: 1 })], { rules, effort: 3 });
    return 100 * (usedLengthMm(nested(request, kernel).layout, 0) / optimum_height - 1);
  });
  return summarise("six published strips, height over the optimum", "%", over);
}

/** How the time for a first layout grows when ten times as many pieces are laid; 10 would be in proportion. */
function growth(kernel: Kernel): Measurement {
  const timeOf = (count: number): number =>
    quantile(
      [1, 2, 3].map((seed) => nested(concaveRequest(count, seed, 0), kernel).ms),
      0.5,
    );
  timeOf(30);
  return summarise("first layout, 300 pieces against 30", "times", [timeOf(300) / timeOf(30)]);
}

/** Sheets: what is saved against bounding boxes, how near published optima are, how the work grows. */
export const measure: Measure = async () => {
  const kernel = await loadKernel();
  return [...againstBoxes(kernel), againstOptima(kernel), growth(kernel)];
};
