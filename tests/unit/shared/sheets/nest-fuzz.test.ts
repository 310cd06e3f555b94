import fc from "fast-check";
import { beforeAll, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Path } from "#shared/geometry/path.ts";
import { circlePath, polygonRing, rectanglePath } from "#shared/geometry/shapes.ts";
import { nestSheets } from "#shared/sheets/nest-sheets.ts";
import type { AllowedTurns, StockSheet } from "#shared/sheets/nesting.ts";
import { expectSoundLayout } from "../../../support/check-layout.ts";
import { annulus, buildPiece, buildRequest, buildSheet, concavePaths } from "../../../support/concave-pieces.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

/** A star-shaped outline of any number of corners, convex or not. */
const blob = fc.array(fc.double({ min: 10, max: 60, noNaN: true }), { minLength: 3, maxLength: 9 }).map(
  (radii): Path => [
    polygonRing(
      radii.map((radius, index) => {
        const angle = (2 * Math.PI * index) / radii.length;
        return { x: radius * Math.cos(angle), y: radius * Math.sin(angle) };
      }),
    ),
  ],
);
const concave = fc.tuple(fc.nat(99), fc.nat(5)).map(([seed, at]): Path => concavePaths(6, seed)[at] ?? []);
const side = fc.double({ min: 5, max: 150, noNaN: true });
const rectangle = fc.tuple(side, side).map(([width, height]) => rectanglePath({ x: -3, y: 7, width, height }));
const ring = fc.integer({ min: 20, max: 70 }).map((outer) => annulus(outer, outer * 0.7));
const disc = fc.integer({ min: 5, max: 60 }).map((radius) => circlePath({ x: 9, y: -4 }, radius));
const turns: fc.Arbitrary<AllowedTurns> = fc.oneof(
  fc.constant<AllowedTurns>({ kind: "free" }),
  fc.record({
    kind: fc.constant("steps" as const),
    from: fc.constantFrom(0, 30, 90),
    every: fc.constantFrom(45, 90, 180, 360),
  }),
);
const sheetPath: fc.Arbitrary<Path> = fc.oneof(
  fc
    .tuple(fc.integer({ min: 60, max: 400 }), fc.integer({ min: 60, max: 300 }))
    .map(([width, height]) => rectanglePath({ x: 11, y: -20, width, height })),
  fc.integer({ min: 60, max: 200 }).map((radius) => circlePath({ x: 0, y: 0 }, radius)),
  fc.integer({ min: 80, max: 300 }).map(
    (size): Path => [
      polygonRing([
        { x: 0, y: 0 },
        { x: size, y: 0 },
        { x: size, y: size / 2 },
        { x: size / 2, y: size / 2 },
        { x: size / 2, y: size },
        { x: 0, y: size },
      ]),
    ],
  ),
);

const request = (path: fc.Arbitrary<Path>) => {
  const piece = fc.record({ path, quantity: fc.integer({ min: 1, max: 4 }), turns, mayMirror: fc.boolean() });
  const stock = fc.record({
    path: sheetPath,
    quantity: fc.constantFrom(null, 1, 2),
    grainTurn: fc.constantFrom(0, 90),
    isOffcut: fc.boolean(),
  });
  return fc
    .record({
      pieces: fc.array(piece, { minLength: 1, maxLength: 6 }),
      stock: fc.array(stock, { minLength: 1, maxLength: 3 }),
      marginMm: fc.constantFrom(0, 1, 5, 12),
      kerfMm: fc.constantFrom(0, 0.2, 3, 6),
      spacingMm: fc.constantFrom(0, 2),
      bed: fc.constantFrom(null, { widthMm: 200, heightMm: 150, larger: "split" as const }),
      seed: fc.nat(1000),
    })
    .map(({ pieces, stock: sheets, seed, ...rules }) =>
      buildRequest(
        pieces.map(({ path: outline, ...rest }, index) => buildPiece(String(index), outline, rest)),
        sheets.map((sheet, index): StockSheet => buildSheet(1, 1, { id: `sheet ${index}`, ...sheet })),
        { rules, seed, effort: 0.005 },
      ),
    );
};

it.each([
  { what: "shapes of every kind", path: fc.oneof(blob, concave, rectangle, ring, disc), runs: 120 },
  { what: "rectangles", path: rectangle, runs: 150 },
])("$what never overlap, never leave their sheet and are all accounted for", { timeout: 60_000 }, ({ path, runs }) => {
  fc.assert(
    fc.property(request(path), (wanted) => {
      const outcome = nestSheets(wanted, {}, kernel);
      if (outcome.ok) expectSoundLayout(wanted, outcome.value, kernel);
      else expect(outcome.problems.map(({ field }) => field)).toEqual(["stock"]);
      if (outcome.ok) expect(outcome.value.unplaced.map(({ reason }) => reason)).not.toContain("no safe place");
    }),
    { numRuns: runs },
  );
});
