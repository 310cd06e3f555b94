import fc from "fast-check";
import { beforeAll, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import { expectSoundLayout } from "../../../support/check-layout.ts";
import { outlines, rectangles, requestsOf } from "../../../support/nesting-requests.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

it.each([
  { what: "shapes of every kind", path: outlines, runs: 60 },
  { what: "rectangles", path: rectangles, runs: 60 },
])("$what never overlap, never leave their sheet and are all accounted for", { timeout: 60_000 }, ({ path, runs }) => {
  fc.assert(
    fc.property(requestsOf(path), (request) => {
      const outcome = nestSheets(request, {}, kernel);
      if (outcome.ok) expectSoundLayout(request, outcome.value, kernel);
      else expect(outcome.problems.map(({ field }) => field)).toEqual(["stock"]);
      // What was laid needs no taking out again.
      if (outcome.ok) expect(outcome.value.unplaced.map(({ reason }) => reason)).not.toContain("no safe place");
    }),
    { numRuns: runs },
  );
});
