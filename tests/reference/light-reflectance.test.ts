import { expect, it } from "vitest";
import { z } from "zod";
import { relativeLuminance } from "#shared/colour/contrast.ts";
import { labOf } from "#shared/colour/lab.ts";
import { lrvOfLightness, luminanceContrast } from "#shared/colour/lrv.ts";
import { checkReference } from "../support/check-reference.ts";
import { referenceJson, resultOf } from "../support/reference-data.ts";

const { L_to_LRV, contrast } = z
  .object({
    L_to_LRV: z.array(z.object({ L: z.number(), LRV: z.number() })),
    contrast: z.array(
      z.object({
        LRV1: z.number(),
        LRV2: z.number(),
        weber_percent: z.number(),
        michelson: z.number(),
        points: z.number(),
      }),
    ),
  })
  .parse(referenceJson("lrv-contrast.json"));

it.each(L_to_LRV)("L* $L reflects $LRV %", ({ L, LRV }) => {
  checkReference({
    what: `LRV of L* ${L}`,
    source: "CIE 15",
    expected: LRV,
    got: resultOf(lrvOfLightness(L)),
    within: 5.1e-5,
  });
});

it.each(contrast)("$LRV1 against $LRV2: $weber_percent %, $points points", (row) => {
  for (const got of [luminanceContrast(row.LRV1, row.LRV2), luminanceContrast(row.LRV2, row.LRV1)].map(resultOf)) {
    checkReference({
      what: `contrast ${row.LRV1}/${row.LRV2}, %`,
      source: "ADAAG 1991, A4.30.5",
      expected: row.weber_percent,
      got: got.percent,
      within: 5.1e-5,
    });
    expect(got.michelson).toBeCloseTo(row.michelson, 4);
    expect(got.points).toBeCloseTo(row.points, 9);
  }
});

// Luminance has two ways to it, sRGB's (IEC 61966-2-1) and by way of L* (CIE 15): they must meet.
it.each(["#27314F", "#C8992F", "#F4EFE4", "#6B4A33", "#000000", "#FFFFFF", "#030303"])(
  "%s reflects the same by both ways",
  (colour) => {
    expect(resultOf(lrvOfLightness(Math.min(100, labOf(colour).L)))).toBeCloseTo(100 * relativeLuminance(colour), 1);
  },
);
