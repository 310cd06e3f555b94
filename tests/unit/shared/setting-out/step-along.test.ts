import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { type Stretch, stepsAlong, stepsOfCopies } from "#shared/setting-out/step-along.ts";

const stretches = fc.array(
  fc
    .record({
      from: fc.double({ min: -2000, max: 2000, noNaN: true }),
      long: fc.double({ min: 0, max: 300, noNaN: true }),
    })
    .map(({ from, long }): Stretch => ({ from, to: from + long })),
  { minLength: 2, maxLength: 30 },
);
const middle = ({ from, to }: Stretch) => (from + to) / 2;
/** The stretches after their steps, in the order in which they lay before. */
function stepped(before: readonly Stretch[], steps: readonly number[]): Stretch[] {
  return before
    .map((stretch, index) => ({ stretch, step: steps[index] ?? Number.NaN, index }))
    .sort((a, b) => middle(a.stretch) - middle(b.stretch) || a.index - b.index)
    .map(({ stretch, step }) => ({ from: stretch.from + step, to: stretch.to + step }));
}
const spaces = (of: readonly Stretch[], space: (a: Stretch, b: Stretch) => number) =>
  of.slice(1).map((next, index) => space(of[index] ?? next, next));
const gap = (a: Stretch, b: Stretch) => b.from - a.to;
const pitch = (a: Stretch, b: Stretch) => middle(b) - middle(a);

describe("stepping things off along a line", () => {
  it.each([
    // Middles from 5, 80 and 100 to 5, 55 and 105.
    { spacing: { kind: "pitch", mm: 50 } as const, steps: [0, -25, 5] },
    // From 10 + 5 = 15 to 35, from 40 to 80.
    { spacing: { kind: "gap", mm: 5 } as const, steps: [0, -55, -40] },
    // From 0 to 120 lie 10 + 20 + 40 mm; the two gaps share the other 50.
    { spacing: { kind: "equal gaps" } as const, steps: [0, -35, 0] },
    { spacing: { kind: "equal pitch" } as const, steps: [0, -27.5, 0] },
  ])("steps three of 10, 20 and 40 mm with $spacing", ({ spacing, steps }) => {
    const three = [
      { from: 0, to: 10 },
      { from: 70, to: 90 },
      { from: 80, to: 120 },
    ];
    expect(stepsAlong(three, spacing)).toEqual(steps);
  });

  it("leaves equal gaps to a millionth of a micrometre, and the first and the last where they are", () => {
    fc.assert(
      fc.property(stretches, (before) => {
        const after = stepped(before, stepsAlong(before, { kind: "equal gaps" }));
        const gaps = spaces(after, gap);
        for (const one of gaps) expect(Math.abs(one - (gaps[0] ?? 0))).toBeLessThan(1e-9);
        const inOrder = stepped(
          before,
          before.map(() => 0),
        );
        expect(after[0]).toEqual(inOrder[0]);
        expect(after.at(-1)?.to).toBeCloseTo(inOrder.at(-1)?.to ?? Number.NaN, 9);
      }),
    );
  });

  it("leaves the pitch that was asked for from middle to middle, and the gap from edge to edge", () => {
    fc.assert(
      fc.property(stretches, fc.double({ min: 0, max: 400, noNaN: true }), (before, mm) => {
        const byPitch = stepped(before, stepsAlong(before, { kind: "pitch", mm }));
        for (const one of spaces(byPitch, pitch)) expect(Math.abs(one - mm)).toBeLessThan(1e-9);
        const byGap = stepped(before, stepsAlong(before, { kind: "gap", mm }));
        for (const one of spaces(byGap, gap)) expect(Math.abs(one - mm)).toBeLessThan(1e-9);
        const evenly = spaces(stepped(before, stepsAlong(before, { kind: "equal pitch" })), pitch);
        for (const one of evenly) expect(Math.abs(one - (evenly[0] ?? 0))).toBeLessThan(1e-9);
      }),
    );
  });

  it("leaves one alone where it is, and none at all", () => {
    expect(stepsAlong([{ from: 3, to: 8 }], { kind: "pitch", mm: 10 })).toEqual([0]);
    expect(stepsAlong([], { kind: "equal gaps" })).toEqual([]);
  });

  it.each([
    { kind: "pitch", mm: 25, steps: [25, 50, 75] },
    { kind: "gap", mm: 4, steps: [16, 32, 48] },
    { kind: "over", mm: 90, steps: [30, 60, 90] },
  ] as const)("steps three copies of a 12 mm thing off by $kind of $mm mm", ({ kind, mm, steps }) => {
    expect(stepsOfCopies(12, 3, { kind, mm })).toEqual(steps);
  });
});
