import { describe, expect, it } from "vitest";
import { cornerPhase, stripLengthMm, stripsOfHalf } from "#shared/slats/half-board.ts";
import { checkReference } from "../support/check-reference.ts";

// Source: plane geometry; the rows were measured by clipping each slat out of its strip with a polygon kernel. Measures arbitrary.
const board = { width: 457.2, height: 482.6, slatWidth: 38.1 };
const source = "calculated by clipping each slat";
type Start = "corner" | "spine";
const row = (spine: number, angle: number, start: Start, overhang: number, figures: readonly number[]) => {
  const [count = 0, whole = 0, shortest = 0, longest = 0, sum = 0] = figures;
  return { spine, angle, start, overhang, count, whole, shortest, longest, sum };
};

const rows = [
  row(38.1, 45, "corner", 0, [13, 4, 64.45, 334.45, 3143.4]),
  row(38.1, 45, "corner", 6, [14, 4, 13.7, 342.93, 3300.3]),
  row(38.1, 45, "spine", 0, [13, 5, 67.75, 334.45, 3146.7]),
  row(38.1, 45, "spine", 6, [15, 5, 5.18, 342.93, 3300.4]),
  row(25.4, 45, "corner", 0, [13, 3, 73.43, 343.43, 3228.1]),
  row(0, 45, "corner", 0, [14, 3, 15.19, 361.39, 3396]),
  row(38.1, 30, "corner", 0, [12, 1, 8.49, 485.09, 3163.1]),
  row(38.1, 60, "corner", 0, [14, 7, 63.32, 263.96, 3076.4]),
  row(38.1, 22.5, "corner", 0, [10, 0, 100.08, 524.77, 3172.9]),
  row(38.1, 75, "corner", 0, [14, 10, 100.37, 227.15, 2966.4]),
  row(38.1, 90, "corner", 0, [13, 13, 209.55, 209.55, 2724.2]),
];

function halfOf({ spine, angle, start, overhang }: (typeof rows)[number]) {
  const reach = (board.width - spine) / 2 + overhang;
  const size = { reach, height: board.height + 2 * overhang, angle, slatWidth: board.slatWidth, gap: 0 };
  return { ...size, phase: start === "corner" ? cornerPhase(size) : overhang };
}

describe.each(rows)("spine $spine, $angle degrees from the $start, overhang $overhang", (expected) => {
  const half = halfOf(expected);
  const strips = stripsOfHalf(half);
  const lengths = strips.map(stripLengthMm);
  const radians = (half.angle * Math.PI) / 180;
  const full = half.reach / Math.sin(radians) + (half.slatWidth * Math.cos(radians)) / Math.sin(radians);
  const name = `slats, spine ${expected.spine}, ${expected.angle}°, ${expected.start}, overhang ${expected.overhang}`;

  it("has the count and the lengths of the clipped slats", () => {
    const check = (what: string, value: number, got: number, within: number) =>
      checkReference({ what: `${name}: ${what}`, source, expected: value, got, within });
    check("a side", expected.count, strips.length, 0);
    check("shortest", expected.shortest, Math.min(...lengths), 0.005);
    check("longest", expected.longest, Math.max(...lengths), 0.005);
    check(
      "in all",
      expected.sum,
      lengths.reduce((sum, length) => sum + length, 0),
      0.051,
    );
    check("whole ones", expected.whole, lengths.filter((length) => Math.abs(length - full) < 1e-6).length, 0);
  });
});

it("45 degrees from the corner come out in their order", () => {
  const expected = [76.2, 152.4, 228.6, 300.57, 334.45, 334.45, 334.45, 334.45, 332.8, 293.05, 216.85, 140.65, 64.45];
  const got = stripsOfHalf(halfOf(row(38.1, 45, "corner", 0, []))).map((strip) =>
    Number(stripLengthMm(strip).toFixed(2)),
  );
  expect(got).toEqual(expected);
});
