import fc from "fast-check";
import { expect, it } from "vitest";
import { rules } from "#shared/dry-fit/index.ts";
import { defaultLimits, limitsSchema } from "#shared/dry-fit/limits.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import {
  bondHold,
  buildCapStud,
  buildLayer,
  buildSign,
  disc,
  hole,
  plate,
  pocketHold,
  standoffHold,
} from "../../../support/build-sign.ts";
import { dryFitOf } from "../../../support/dry-fit.ts";

it("the rules stand in the order of their numbers, each once", () => {
  const numbers = rules.map((rule) => rule.number);
  expect(numbers).toEqual([...new Set(numbers)].toSorted((a, b) => a - b));
});

it("the default limits are those that the shop starts with", () => {
  expect(defaultLimits).toMatchObject({
    unsupportedCaution: 0.1,
    unsupportedStop: 0.3,
    reachMm: 10,
    freeStrokeMm: 2,
    bondedStrokeMm: 1.5,
    placingErrorMm: 0.5,
    coverMm: 1,
    expansionPerK: 7e-5,
    moisturePoints: 4,
    edgeDiameters: 2,
    webThicknesses: 1,
    colourRemark: 2,
    colourCaution: 5,
  });
  expect(limitsSchema.safeParse({ coverMm: -1 }).success).toBe(false);
  expect(limitsSchema.safeParse({ unheardOf: 1 }).success).toBe(false);
});

const good = () =>
  buildSign([
    buildLayer("B", [plate("panel", 104, 104, [300, 150])], {
      thickness: 4.5,
      hold: standoffHold(
        // 70 mm apart, so that a push in the middle bends it by less than 1 mm.
        [
          hole("h1", 265, 115, { fixed: true, diameter: 7.5 }),
          hole("h2", 335, 115, { diameter: 7.5 }),
          hole("h3", 265, 185, { diameter: 7.5 }),
          hole("h4", 335, 185, { diameter: 7.5 }),
        ],
        buildCapStud(),
      ),
    }),
    buildLayer("C", [disc("sun", 20, [300, 150])], { marked: "back" }),
  ]);
const hung = (sign: MockupDocument): MockupDocument => ({
  ...sign,
  hanging: { ...sign.hanging, kind: "cleat", carriesKg: 10 },
});

it("a sound sign has only remarks, and an empty one nothing", async () => {
  expect((await dryFitOf(hung(good()))).filter(({ severity }) => severity !== "remark")).toEqual([]);
  expect(await dryFitOf(hung(buildSign([])))).toEqual([]);
});

it("findings come stops first, then by rule, then from the top down and from left to right", async () => {
  const sign = buildSign([
    buildLayer(
      "B",
      [plate("low", 20, 20, [595, 300]), plate("right", 20, 20, [598, 100]), plate("left", 20, 20, [3, 100])],
      {
        locate: "none",
      },
    ),
    buildLayer("C", [disc("free", 30, [300, 200])], { hold: standoffHold([]), thickness: 4.5 }),
  ]);
  const findings = await dryFitOf(sign);
  expect(findings.map(({ severity, rule, pieceIds }) => `${severity} ${rule} ${pieceIds.join(" ")}`)).toEqual([
    "stop 1 left",
    "stop 1 right",
    "stop 8 free",
    "caution 1 low",
    "caution 20 low right left",
    "caution 27 left",
    "caution 27 right",
    "caution 27 low",
    "caution 36 ",
    "remark 18 ",
  ]);
});

it("the same sign gives the same findings, and layers that are moved as one give the same texts", async () => {
  const at = fc.integer({ min: 30, max: 570 });
  const shape = fc.record({ x: at, y: fc.integer({ min: 30, max: 370 }), width: fc.integer({ min: 1, max: 90 }) });
  const hold = fc.constantFrom(bondHold, pocketHold(1.5, 0.1), standoffHold([]));
  const layers = fc.array(fc.record({ shapes: fc.array(shape, { maxLength: 3 }), hold }), { maxLength: 3 });
  const signOf = (
    drawn: { shapes: { x: number; y: number; width: number }[]; hold: typeof bondHold }[],
    shift: number,
  ): MockupDocument =>
    buildSign(
      drawn.map(({ shapes, hold: held }, level) =>
        buildLayer(
          String.fromCharCode(66 + level),
          shapes.map(({ x, y, width }, index) => plate(`p${level}-${index}`, width, 30, [x + shift, y + shift])),
          { hold: held },
        ),
      ),
      { board: { outline: { kind: "rectangle" }, width: 3000, height: 3000, measures: "body" } },
    );
  await fc.assert(
    fc.asyncProperty(layers, fc.integer({ min: 0, max: 1000 }), async (drawn, shift) => {
      const findings = await dryFitOf(signOf(drawn, 500));
      expect(await dryFitOf(signOf(drawn, 500))).toEqual(findings);
      const kinds = (list: typeof findings) =>
        list.map(({ severity, rule, pieceIds }) => [severity, rule, ...pieceIds]);
      expect(kinds(await dryFitOf(signOf(drawn, 500 + shift)))).toEqual(kinds(findings));
      for (const { value, text, where } of findings) {
        expect(text).not.toMatch(/NaN|undefined|Infinity/);
        if (value !== null) expect(Number.isFinite(value)).toBe(true);
        if (where) expect(Number.isFinite(where.x + where.y)).toBe(true);
      }
    }),
    { numRuns: 40 },
  );
});
