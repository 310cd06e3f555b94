import { beforeAll, describe, expect, it } from "vitest";
import { z } from "zod";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { rectanglePath } from "#shared/geometry/shapes.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import type { AllowedTurns } from "#shared/sheets/nesting.ts";
import { expectSoundLayout } from "../support/check-layout.ts";
import { checkReference } from "../support/check-reference.ts";
import { buildPiece, buildRequest, buildSheet } from "../support/concave-pieces.ts";
import { referenceJson } from "../support/reference-data.ts";
import { usedLengthMm } from "../support/used-length.ts";

// E. Hopper, B. C. H. Turton, European Journal of Operational Research 128(1), 34-57, 2001 (C); E. K. Burke, G. Kendall,
// G. Whitwell, Operations Research 52(4), 655-671, 2004 (N). Every instance fills strip width times optimum height exactly.
const strip = z.object({
  source: z.string(),
  strip_width: z.number(),
  optimum_height: z.number(),
  items_w_h: z.array(z.tuple([z.number(), z.number()])),
});

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

/** One unit of an instance in mm: nothing there is cut, so no kerf and no margin. */
const rules = { marginMm: 0, kerfMm: 0, spacingMm: 0 };
const straight: AllowedTurns = { kind: "steps", from: 0, every: 360 };
const square: AllowedTurns = { kind: "steps", from: 0, every: 90 };
const long = 1000;

describe.each(["C1P1", "C1P2", "C1P3", "C2P1", "N1", "N2"])("%s", (name) => {
  const instance = strip.parse(referenceJson(`strip-packing-${name}.json`));
  const { strip_width: width, optimum_height: optimum, items_w_h: items } = instance;

  it.each([
    { how: "turned by right angles", turns: square },
    { how: "as they are", turns: straight },
  ])("packs its rectangles, $how, within 5 % of the optimum height", ({ how, turns }) => {
    const pieces = items.map(([w, h], index) =>
      buildPiece(String(index), rectanglePath({ x: 0, y: 0, width: w, height: h }), { turns }),
    );
    const request = buildRequest(pieces, [buildSheet(width, long, { quantity: 1 })], { rules, effort: 3 });
    const outcome = nestSheets(request, {}, kernel);
    if (!outcome.ok) throw new Error(outcome.problems.map(({ words }) => words).join(" "));
    expectSoundLayout(request, outcome.value, kernel);
    expect(outcome.value.unplaced).toEqual([]);
    checkReference({
      what: `height of ${name}, ${how}`,
      source: instance.source,
      expected: optimum,
      got: usedLengthMm(outcome.value, 0),
      within: 0.05 * optimum,
    });
  });
});
