import fc from "fast-check";
import { expect, it } from "vitest";
import { applyMend } from "#shared/dry-fit/apply-mend.ts";
import { rules } from "#shared/dry-fit/index.ts";
import type { Path, Point, Segment } from "#shared/geometry/path.ts";
import { standardAcrylics, standardAdhesives, standardStandoffs } from "#shared/materials/standard-stock.ts";
import { documentSchema } from "#shared/mockup/document.ts";
import { buildLayer, buildPiece, buildSign, hole } from "../../../support/build-sign.ts";
import { inputOf } from "../../../support/dry-fit.ts";

/** Outlines that no drawing should have: crossed, doubled, of one point, of nothing, without an end, tiny and huge. */
const size = fc.constantFrom(0.001, 1, 40, 900);
const point: fc.Arbitrary<Point> = fc.record({
  x: fc.integer({ min: -10, max: 10 }).map((x) => x / 10),
  y: fc.integer({ min: -10, max: 10 }).map((y) => y / 10),
});
const segment: fc.Arbitrary<Segment> = fc.oneof(
  fc.record({ kind: fc.constant("line" as const), to: point }),
  fc.record({ kind: fc.constant("cubic" as const), c1: point, c2: point, to: point }),
);
const grown = ({ x, y }: Point, by: number): Point => ({ x: x * by, y: y * by });
const path: fc.Arbitrary<Path> = fc
  .tuple(
    size,
    fc.array(fc.record({ start: point, segments: fc.array(segment, { minLength: 1, maxLength: 7 }) }), {
      maxLength: 4,
    }),
  )
  .map(([by, rings]) =>
    rings.map(({ start, segments }) => ({
      start: grown(start, by),
      segments: segments.map((one) =>
        one.kind === "line"
          ? { ...one, to: grown(one.to, by) }
          : { ...one, c1: grown(one.c1, by), c2: grown(one.c2, by), to: grown(one.to, by) },
      ),
    })),
  );

const pick = <T>(list: readonly T[]) => fc.constantFrom(...list);
const at = fc.tuple(fc.integer({ min: -50, max: 650 }), fc.integer({ min: -50, max: 450 }));
const hold = fc.oneof(
  fc.record({
    kind: fc.constant("bond" as const),
    adhesive: pick(standardAdhesives),
    tack: fc.option(pick(standardAdhesives)),
  }),
  fc.record({
    kind: fc.constant("pocket" as const),
    depth: fc.constantFrom(0.1, 2, 30),
    clearance: fc.constantFrom(0, 0.1, 5),
    adhesive: pick(standardAdhesives),
    cut: fc.constantFrom("routed" as const, "engraved" as const),
    bitRadius: fc.constantFrom(0, 1.5, 25),
  }),
  fc.record({
    kind: fc.constant("standoff" as const),
    hardware: pick(standardStandoffs),
    offset: fc.constantFrom(0, 12, 19),
    holes: fc.constant([]),
  }),
);
const drawn = fc.record({
  pieces: fc.array(fc.tuple(path, at), { maxLength: 3 }),
  hold,
  rest: fc.record({
    locate: fc.constantFrom(
      "pocket" as const,
      "scored line" as const,
      "template" as const,
      "hole pattern" as const,
      "none" as const,
    ),
    marked: fc.constantFrom("front" as const, "back" as const, "not stated" as const),
    stock: pick(standardAcrylics.map(({ acrylic }) => acrylic)),
    thickness: fc.constantFrom(0.5, 3, 4.5, 20),
  }),
});

it("whatever the outlines, every rule answers with figures, and every mend leaves a sound document", async () => {
  await fc.assert(
    fc.asyncProperty(fc.array(drawn, { maxLength: 3 }), async (layers) => {
      const document = buildSign(
        layers.map(({ pieces, hold: held, rest }, level) => {
          const holes = pieces.map(([, [x, y]], index) => hole(`h${level}-${index}`, x, y));
          return buildLayer(
            String.fromCharCode(66 + level),
            pieces.map(([outline, place], index) => buildPiece(`p${level}-${index}`, outline, { at: place })),
            { ...rest, hold: held.kind === "standoff" ? { ...held, holes } : held },
          );
        }),
      );
      const input = await inputOf(document, {});
      for (const rule of rules) {
        for (const finding of rule.check(input)) {
          expect(finding.rule).toBe(rule.number);
          expect(finding.text).not.toMatch(/NaN|undefined|null|Infinity/);
          for (const figure of [finding.value, finding.limit])
            if (figure !== null) expect(figure).toSatisfy(Number.isFinite);
          if (finding.where) expect(finding.where.x + finding.where.y).toSatisfy(Number.isFinite);
          for (const mend of rule.mends?.(finding, input) ?? []) {
            expect(mend.label).not.toMatch(/NaN|undefined|null|Infinity/);
            expect(documentSchema.safeParse(applyMend(document, mend)).success, mend.label).toBe(true);
          }
        }
      }
    }),
    { numRuns: 40 },
  );
}, 60_000);
