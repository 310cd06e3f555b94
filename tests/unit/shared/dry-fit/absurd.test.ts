import fc from "fast-check";
import { beforeAll, describe, expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { listMends } from "#shared/dry-fit/list-mends.ts";
import { runDryFit } from "#shared/dry-fit/run-dry-fit.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { Path, Segment } from "#shared/geometry/path.ts";
import { standardHardware } from "#shared/materials/standard-stock.ts";
import { documentSchema, type Hold, type Layer, type MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { bondHold, buildLayer, buildPiece, buildSign, hole, plate, pocketHold } from "../../../support/build-sign.ts";

let kernel: Kernel;
beforeAll(async () => {
  kernel = await loadKernel();
});

const numbersIn = (value: unknown): number[] => {
  if (typeof value === "number") return [value];
  if (typeof value !== "object" || value === null) return [];
  return Object.values(value).flatMap(numbersIn);
};

/** Figures, findings and mends of a sign; fails on a figure that is no number or a text that shows one. */
function checkAll(document: MockupDocument) {
  const figures = computeFigures(document, kernel);
  const input = { document, figures, limits: defaultLimits, context: { ...usualContext, words: "A SIGN" }, kernel };
  const findings = runDryFit(input);
  expect(numbersIn(figures).every(Number.isFinite)).toBe(true);
  expect(numbersIn(findings).every(Number.isFinite)).toBe(true);
  for (const finding of findings) {
    expect(finding.text).not.toMatch(/NaN|undefined|Infinity|null/);
    for (const { steps } of listMends(finding, input)) expect(numbersIn(steps).every(Number.isFinite)).toBe(true);
  }
  return { figures, findings };
}

describe("more than a document holds is refused before anything is computed", () => {
  it("a thousand layers", () => {
    const one = buildLayer("B", []);
    const refused = documentSchema.safeParse({
      ...buildSign([]),
      layers: Array.from({ length: 1000 }, () => one),
    });
    expect(refused.success).toBe(false);
  });

  it("a million nodes in one outline", () => {
    const to = { x: 1, y: 1 };
    const segments = Array.from({ length: 1_000_000 }, (): Segment => ({ kind: "line", to }));
    const piece = { ...plate("p", 1, 1, [1, 1]), path: [{ start: to, segments }] };
    const refused = documentSchema.safeParse({
      ...buildSign([]),
      layers: [{ ...buildLayer("B", []), pieces: [piece] }],
    });
    expect(refused.success).toBe(false);
  });

  it.each([Number.NaN, Number.POSITIVE_INFINITY, -1, 0, 1e300])("a board of %d", (width) => {
    const sign = buildSign([]);
    expect(documentSchema.safeParse({ ...sign, board: { ...sign.board, width } }).success).toBe(false);
  });
});

it("the most layers there may be, a piece on a piece, come to the sum of their sheets", () => {
  const keys = [..."BCDEFGHIJKLMNOPQRSTUVWXYZ", ...[..."BCDEFGHIJKLMNOPQRSTUVWXYZABCDEFGHIJ"].map((k) => `B${k}`)];
  const layers = [...new Set(keys)]
    .slice(0, 50)
    .map((key, index) => buildLayer(key, [plate(`p${index}`, 200, 100, [300, 200])]));
  const { figures } = checkAll(buildSign(layers));
  expect(figures.depth.nominal).toBeCloseTo(18 + layers.length * 3, 6);
});

it("an outline of as many nodes as a document takes has its exact area", () => {
  const nodes = 100_000;
  const radius = 180;
  const at = (index: number) => {
    const angle = ((index % nodes) / nodes) * 2 * Math.PI;
    return { x: radius * Math.cos(angle), y: radius * Math.sin(angle) };
  };
  const ring: Path = [
    {
      start: at(0),
      segments: Array.from({ length: nodes }, (_, index): Segment => ({ kind: "line", to: at(index + 1) })),
    },
  ];
  const sign = buildSign([buildLayer("B", [buildPiece("round", ring, { at: [300, 200] })])]);
  const [piece] = computeFigures(sign, kernel).pieces;
  // A regular polygon: n/2 · r² · sin(2π/n). The kernel's grid of 0.001 mm may take its thickness off all round.
  const exact = (nodes / 2) * radius ** 2 * Math.sin((2 * Math.PI) / nodes);
  expect(Math.abs((piece?.areaMm2 ?? 0) - exact)).toBeLessThan(0.001 * 2 * Math.PI * radius);
  expect(piece?.nodes).toBe(nodes);
});

it("outlines that no drawing should have give figures and findings, never a fault", () => {
  const size = fc.oneof(
    fc.double({ min: -400, max: 400, noNaN: true }),
    fc.constantFrom(0, 1e-9, -1e-9, 0.0005, 9999, -9999),
  );
  const point = fc.record({ x: size, y: size });
  const segment: fc.Arbitrary<Segment> = fc.oneof(
    point.map((to): Segment => ({ kind: "line", to })),
    fc.record({ c1: point, c2: point, to: point }).map((curve): Segment => ({ kind: "cubic", ...curve })),
  );
  const path = fc.array(fc.record({ start: point, segments: fc.array(segment, { minLength: 1, maxLength: 7 }) }), {
    maxLength: 3,
  });
  const hold: fc.Arbitrary<Hold> = fc.oneof(
    fc.constantFrom<Hold>(bondHold, pocketHold(0.1), pocketHold(100, 5)),
    fc
      .record({
        hardware: fc.constantFrom(...standardHardware),
        x: size,
        y: size,
        offset: fc.constantFrom(0, 12, 1000),
      })
      .map(
        ({ hardware, x, y, offset }): Hold => ({
          kind: "standoff",
          hardware,
          offset,
          holes: [hole("h", x, y, { diameter: 100 })],
        }),
      ),
  );
  const layers = fc.array(fc.record({ paths: fc.array(path, { maxLength: 3 }), hold }), { minLength: 1, maxLength: 3 });
  fc.assert(
    fc.property(layers, (drawn) => {
      const document = buildSign(
        drawn.map(({ paths, hold: held }, level): Layer => {
          const pieces = paths.map((one, index) =>
            buildPiece(`p${level}-${index}`, one, { at: [300, 200], reads: index === 0 ? "A" : "" }),
          );
          const renamed =
            held.kind === "standoff"
              ? { ...held, holes: held.holes.map((one) => ({ ...one, id: `h${level}` })) }
              : held;
          return buildLayer(String.fromCharCode(66 + level), pieces, { hold: renamed });
        }),
      );
      checkAll(document);
    }),
    { numRuns: 25 },
  );
});
