import type { Path, Point } from "#shared/geometry/path.ts";
import { circlePath, polygonRing, rectanglePath } from "#shared/geometry/shapes.ts";
import type { AllowedTurns, NestingRequest, SheetPiece, StockSheet } from "#shared/sheets/nesting.ts";
import { seededRandom } from "./seeded-random.ts";

type Maker = (width: number, height: number, share: number) => Path;

const ring = (...points: readonly (readonly [number, number])[]): Path => [
  polygonRing(points.map(([x, y]): Point => ({ x, y }))),
];

const ell: Maker = (w, h, s) => {
  const t = 0.25 + 0.15 * s;
  return ring([0, 0], [w, 0], [w, h * t], [w * t, h * t], [w * t, h], [0, h]);
};
const bridge: Maker = (w, h, s) => {
  const t = 0.25 + 0.1 * s;
  return ring([0, 0], [w, 0], [w, h], [w * (1 - t), h], [w * (1 - t), h * t], [w * t, h * t], [w * t, h], [0, h]);
};
const tee: Maker = (w, h, s) => {
  const t = 0.3 + 0.1 * s;
  const [left, right] = [w * (0.5 - t / 2), w * (0.5 + t / 2)];
  return ring([0, 0], [w, 0], [w, h * t], [right, h * t], [right, h], [left, h], [left, h * t], [0, h * t]);
};
const star: Maker = (w) =>
  ring(
    ...Array.from({ length: 10 }, (_, k): [number, number] => {
      const radius = ((k % 2 === 0 ? 1 : 0.42) * w) / 2;
      return [radius * Math.sin((k * Math.PI) / 5), -radius * Math.cos((k * Math.PI) / 5)];
    }),
  );
const horseshoe: Maker = (w, _, s) => {
  const angles = Array.from({ length: 25 }, (_unused, k) => Math.PI * (0.2 + (1.6 * k) / 24));
  const arc = (radius: number) => angles.map((a): [number, number] => [radius * Math.cos(a), radius * Math.sin(a)]);
  return ring(...arc(w / 2), ...arc((w / 2) * (0.6 + 0.15 * s)).toReversed());
};
const chevron: Maker = (w, h) =>
  ring([0, 0], [w / 2, h * 0.3], [w, 0], [w, h * 0.35], [w / 2, h * 0.65], [0, h * 0.35]);

const makers = [ell, bridge, tee, star, horseshoe, chevron];

/** Concave outlines such as letters and emblems have, 40 to 110 mm, the same for the same seed. */
export function concavePaths(count: number, seed: number): Path[] {
  const random = seededRandom(seed);
  return Array.from({ length: count }, (_, index) => {
    const [w, h, share] = [40 + 70 * random(), 40 + 70 * random(), random()];
    return (makers[index % makers.length] ?? ell)(w, h, share);
  });
}

export const freely: AllowedTurns = { kind: "free" };

/** A piece to be cut once and turned freely, unless said otherwise. */
export function buildPiece(id: string, path: Path, overrides: Partial<SheetPiece> = {}): SheetPiece {
  return { id, name: `Piece ${id}`, path, quantity: 1, turns: freely, mayMirror: false, ...overrides };
}

/** A full sheet of that size, as many as wanted. */
export function buildSheet(width: number, height: number, overrides: Partial<StockSheet> = {}): StockSheet {
  return {
    id: "sheet",
    name: "Sheet",
    path: rectanglePath({ x: 0, y: 0, width, height }),
    quantity: null,
    grainTurn: 0,
    isOffcut: false,
    ...overrides,
  };
}

type Wanted = Partial<Omit<NestingRequest, "rules">> & { readonly rules?: Partial<NestingRequest["rules"]> };

/** A request with margin and kerf of 3 mm on one kind of sheet, without a search, unless said otherwise. */
export function buildRequest(
  pieces: readonly SheetPiece[],
  stock: readonly StockSheet[],
  wanted: Wanted = {},
): NestingRequest {
  const rules = { marginMm: 3, kerfMm: 3, spacingMm: 0, bed: null, leastOffcutMm: 100, ...wanted.rules };
  return { seed: 1, effort: 0, ...wanted, pieces, stock, rules };
}

/** A ring of two circles, its opening wide enough for smaller pieces. */
export function annulus(outer: number, inner: number): Path {
  return [...circlePath({ x: 0, y: 0 }, outer), ...circlePath({ x: 0, y: 0 }, inner)];
}
