import fc from "fast-check";
import { beforeAll, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import type { NestingControl, NestingRequest, SheetLayout } from "#shared/sheets/nesting.ts";
import { expectSoundLayout } from "../support/check-layout.ts";
import { buildPiece, buildRequest, buildSheet, concavePaths } from "../support/concave-pieces.ts";
import { outlines, requestsOf } from "../support/nesting-requests.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

function nested(request: NestingRequest, control: NestingControl = {}): SheetLayout {
  const outcome = nestSheets(request, control, kernel);
  if (!outcome.ok) throw new Error(outcome.problems.map(({ words }) => words).join(" "));
  expectSoundLayout(request, outcome.value, kernel);
  return outcome.value;
}

const pieces = (count: number) => concavePaths(count, 11).map((path, index) => buildPiece(String(index), path));

it("2,000 requests by chance give layouts that can be cut, or say why not", () => {
  fc.assert(
    fc.property(requestsOf(outlines), (request) => {
      const outcome = nestSheets(request, {}, kernel);
      if (outcome.ok) expectSoundLayout(request, outcome.value, kernel);
      else expect(outcome.problems.map(({ field }) => field)).toEqual(["stock"]);
      if (outcome.ok) expect(outcome.value.unplaced.map(({ reason }) => reason)).not.toContain("no safe place");
    }),
    { numRuns: 2_000 },
  );
});

it("300 pieces on several sheets stay sound through a long search, and the same twice over", () => {
  const request = buildRequest(pieces(300), [buildSheet(1220, 610)], { effort: 5 });
  const first = nested(request);
  expect(first.unplaced).toEqual([]);
  expect(nested(request)).toEqual(first);
});

it("10,000 different pieces end soon after they are told to, every piece laid or listed", () => {
  let asked = 0;
  const request = buildRequest(pieces(10_000), [buildSheet(2440, 1220)], { effort: 1 });
  const layout = nested(request, { shouldStop: () => asked++ > 20_000 });
  expect(layout.stopped).toBe(true);
  expect(layout.sheets[0]?.placements.length).toBeGreaterThan(300);
});
