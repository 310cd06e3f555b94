import { readFileSync } from "node:fs";
import fc from "fast-check";
import { expect, it } from "vitest";
import { z } from "zod";
import { deltaE00, labOf } from "#shared/colour/lab.ts";
import { checkReference } from "../support/check-reference.ts";

const read = (name: string): unknown =>
  JSON.parse(readFileSync(new URL(`../fixtures/reference/${name}`, import.meta.url), "utf8"));
const row = z.tuple([z.number(), z.number(), z.number(), z.number(), z.number(), z.number(), z.number()]);

// G. Sharma, W. Wu, E. N. Dalal, Color Research and Application 30(1), 2005, table I.
const { pairs } = z.object({ pairs: z.array(row) }).parse(read("ciede2000-sharma.json"));

it("the table has its 34 pairs", () => {
  expect(pairs).toHaveLength(34);
});

it.each(pairs)("ΔE00 of (%f %f %f) and (%f %f %f) is %f in both orders", (L1, a1, b1, L2, a2, b2, expected) => {
  const one = { L: L1, a: a1, b: b1 };
  const other = { L: L2, a: a2, b: b2 };
  const row = { source: "Sharma, Wu, Dalal 2005, table I", expected, within: 5e-5 };
  checkReference({ ...row, what: `ΔE00 of ${L1} ${a1} ${b1} and ${L2} ${a2} ${b2}`, got: deltaE00(one, other) });
  checkReference({ ...row, what: `ΔE00 of ${L2} ${a2} ${b2} and ${L1} ${a1} ${b1}`, got: deltaE00(other, one) });
});

// IEC 61966-2-1 and CIE 15, D65, 2 degrees; to 0.01.
const colours = z
  .object({ colours: z.array(z.object({ srgb: z.string(), Lab_D65: z.tuple([z.number(), z.number(), z.number()]) })) })
  .parse(read("srgb-cie.json")).colours;

it.each(colours)("$srgb is Lab $Lab_D65", ({ srgb, Lab_D65: [L, a, b] }) => {
  const lab = labOf(srgb);
  const row = { source: "IEC 61966-2-1, CIE 15", within: 0.01 };
  checkReference({ ...row, what: `L* of ${srgb}`, expected: L, got: lab.L });
  checkReference({ ...row, what: `a* of ${srgb}`, expected: a, got: lab.a });
  checkReference({ ...row, what: `b* of ${srgb}`, expected: b, got: lab.b });
});

it("a colour does not differ from itself, and differs the same both ways", () => {
  const colour = fc.integer({ min: 0, max: 0xffffff }).map((n) => `#${n.toString(16).padStart(6, "0")}`);
  fc.assert(
    fc.property(colour, colour, (one, other) => {
      expect(deltaE00(labOf(one), labOf(one))).toBe(0);
      expect(deltaE00(labOf(one), labOf(other))).toBeCloseTo(deltaE00(labOf(other), labOf(one)), 9);
    }),
  );
});

it.each(["", "red", "#fff", "#12345G", "rgb(0 0 0)"])("%j is refused as a colour", (text) => {
  expect(() => labOf(text)).toThrow(RangeError);
});
