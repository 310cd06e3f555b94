import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { patternFaults } from "#shared/hardware/hole-pattern.ts";
import { holeWindowOfKind } from "#shared/hardware/hole-window-of-kind.ts";

const play = { placingError: 0.5, movement: 0.25, cover: 1 };

// Arithmetic: lower = d + 2 (p + m), upper = (min(cover, barrel) + d)/2 − cover.
describe("the hole window of each kind", () => {
  it.each([
    { hole: { kind: "capStud", stud: 5, cap: 15, barrel: 15 }, lower: 6.5, upper: 9 },
    { hole: { kind: "throughScrew", screw: 4, head: 8, cap: null, spacer: 12 }, lower: 5.5, upper: 5 },
    { hole: { kind: "throughScrew", screw: 4, head: 8, cap: 14, spacer: 12 }, lower: 5.5, upper: 7 },
    { hole: { kind: "throughScrew", screw: 4, head: 8, cap: 14, spacer: 20 }, lower: 5.5, upper: 8 },
    { hole: { kind: "throughScrew", screw: 4, head: 12, cap: 6, spacer: 20 }, lower: 5.5, upper: 7 },
  ] as const)("$hole allows $lower to $upper", ({ hole, lower, upper }) => {
    const window = holeWindowOfKind(hole, play);
    expect(window?.lower).toBeCloseTo(lower, 9);
    expect(window?.upper).toBeCloseTo(upper, 9);
  });

  it.each(["blindStud", "edgeGrip"] as const)("%s has no hole in the panel", (kind) => {
    expect(holeWindowOfKind({ kind }, play)).toBeNull();
  });

  it("a wider cap never narrows it", () => {
    const mm = fc.double({ min: 1, max: 60, noNaN: true });
    fc.assert(
      fc.property(mm, mm, mm, (head, cap, more) => {
        const upperAt = (width: number) =>
          holeWindowOfKind({ kind: "throughScrew", screw: 4, head, cap: width, spacer: 30 }, play)?.upper ?? Number.NaN;
        expect(upperAt(cap + more)).toBeGreaterThanOrEqual(upperAt(cap));
      }),
    );
  });
});

describe("a hole pattern", () => {
  const hole = (id: string, diameter: number, fixed = false) => ({ id, diameter, fixed, least: 6.5 });
  it.each([
    { name: "no holes", holes: [], faults: [] },
    { name: "one fixed, others with play", holes: [hole("a", 6, true), hole("b", 6.5), hole("c", 8)], faults: [] },
    { name: "none fixed", holes: [hole("a", 7), hole("b", 7)], faults: [{ kind: "none fixed" }] },
    {
      name: "two fixed",
      holes: [hole("a", 6, true), hole("b", 6, true)],
      faults: [{ kind: "several fixed", ids: ["a", "b"] }],
    },
    {
      name: "one without play",
      holes: [hole("a", 6, true), hole("b", 6.2)],
      faults: [{ kind: "no play", id: "b", missing: expect.closeTo(0.3, 9) }],
    },
  ])("with $name has $faults", ({ holes, faults }) => {
    expect(patternFaults(holes)).toEqual(faults);
  });
});
