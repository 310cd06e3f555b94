import fc from "fast-check";
import { expect, it } from "vitest";
import { loadKernel } from "#server/artwork/load-kernel.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { listMends } from "#shared/dry-fit/list-mends.ts";
import { runDryFit } from "#shared/dry-fit/run-dry-fit.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";
import { buildLayer, buildSign, hole, plate, standoffHold } from "../../../support/build-sign.ts";
import { buildFrame, buildSlats } from "../../../support/slat-sign.ts";

const lengths = (...usual: number[]) =>
  fc.oneof(
    fc.constantFrom(...usual),
    fc.double({ min: 0.01, max: 80, noNaN: true }),
    fc.constantFrom(0.001, 1, 999.99, 10_000),
  );
const slats = fc
  .record({
    thickness: fc.constantFrom(0.01, 0.2, 6, 9, 100),
    pattern: fc.constantFrom("spine" as const, "mitred" as const, "single" as const),
    angle: fc.oneof(fc.constantFrom(15, 45, 90), fc.double({ min: 15, max: 90, noNaN: true })),
    slatWidth: lengths(20, 38.1, 60),
    gap: fc.oneof(fc.constantFrom(0, 3), lengths(2)),
    spineWidth: lengths(20, 40),
    spineOffset: fc.constantFrom(0, -30, 55.5, 9_000),
    start: fc.constantFrom({ kind: "corner" as const }, { kind: "height" as const, height: 17 }),
    direction: fc.constantFrom("up" as const, "down" as const),
    overhang: fc.constantFrom(0, 25, 1000),
  })
  .map(buildSlats);
const frame = fc
  .record({
    width: lengths(20).map((width) => Math.min(width, 500)),
    depth: lengths(20.7).map((depth) => Math.min(depth, 500)),
    mitred: fc.boolean(),
  })
  .map(buildFrame);
const sign = fc
  .record({
    kind: fc.constantFrom("rectangle" as const, "ellipse" as const),
    width: fc.constantFrom(20, 260, 600),
    height: fc.constantFrom(20, 400),
    thickness: fc.constantFrom(0.5, 12, 200),
    slats,
    frame: fc.option(frame),
  })
  .map(({ kind, width, height, thickness, slats: laid, frame: round }): MockupDocument => {
    const layers = [
      buildLayer("B", [plate("p", 100, 60, [80, 60])]),
      buildLayer("C", [plate("q", 120, 80, [160, 200])], {
        hold: standoffHold([hole("h", 130, 200), hole("i", 190, 200)]),
      }),
    ];
    const plain = buildSign(layers);
    return documentSchema.parse({
      ...plain,
      board: { ...plain.board, outline: { kind }, width, height },
      backer: { ...plain.backer, thickness, slats: laid },
      frame: round,
    });
  });

it("whatever slats and frame a document takes, the dry fit says it in figures and words", async () => {
  const kernel = await loadKernel();
  const seen = new Set<number>();
  fc.assert(
    fc.property(sign, (document) => {
      const figures = computeFigures(document, kernel);
      const input = { document, figures, limits: defaultLimits, context: usualContext, kernel };
      for (const finding of runDryFit(input)) {
        const { rule, text, value, limit, where } = finding;
        seen.add(rule);
        expect(text).not.toMatch(/NaN|undefined|Infinity|null|e-\d/);
        expect(text).toMatch(/[.]$/);
        for (const number of [value, limit, where?.x, where?.y]) {
          if (number !== null && number !== undefined) expect(Number.isFinite(number)).toBe(true);
        }
        for (const { label } of rule >= 31 && rule <= 35 ? listMends(finding, input) : []) {
          expect(label).not.toMatch(/NaN|undefined/);
        }
      }
    }),
    { numRuns: 40, seed: 7 },
  );
  for (const rule of [11, 31, 32, 33, 34, 35]) expect(seen).toContain(rule);
});
