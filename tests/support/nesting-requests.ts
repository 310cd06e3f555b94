import fc from "fast-check";
import type { Path } from "#shared/geometry/path.ts";
import { circlePath, polygonRing, rectanglePath } from "#shared/geometry/shapes.ts";
import type { AllowedTurns, NestingRequest, StockSheet } from "#shared/sheets/nesting.ts";
import { annulus, buildPiece, buildRequest, buildSheet, concavePaths } from "./concave-pieces.ts";

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
/** Rectangles off their origin. */
export const rectangles = fc.tuple(side, side).map(([width, height]) => rectanglePath({ x: -3, y: 7, width, height }));
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

/** Requests of up to six pieces, each up to four times, on up to three kinds of sheet. */
export const requestsOf = (path: fc.Arbitrary<Path>): fc.Arbitrary<NestingRequest> => {
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

/** Outlines of every kind. */
export const outlines: fc.Arbitrary<Path> = fc.oneof(blob, concave, rectangles, ring, disc);
