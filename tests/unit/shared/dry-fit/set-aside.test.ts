import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Severity } from "#shared/dry-fit/finding.ts";
import {
  type BoundFinding,
  bindingKey,
  boundFinding,
  isSafetyStop,
  matchSetAsides,
  maySetAside,
  openFindings,
  subjectKey,
} from "#shared/dry-fit/set-aside.ts";

const hole = (overrides: Partial<BoundFinding> = {}): BoundFinding => ({
  rule: 6,
  title: "Hole window",
  severity: "stop",
  text: "A hole of B is 9.4 mm wide.",
  layerKey: "B",
  pieceIds: [],
  holeId: "h1",
  value: 9.4,
  limit: 9,
  unit: "mm",
  ...overrides,
});
const setAside = (finding: BoundFinding, at = "2026-12-01T09:00:00.000Z") => ({ finding, at });

describe("a set-aside", () => {
  it("holds for the finding it was made for, whatever its words and the order of its pieces", () => {
    const then = hole({ pieceIds: ["p2", "p1"] });
    const now = hole({ pieceIds: ["p1", "p2"], text: "Said otherwise.", title: "Holes" });
    const [standing] = matchSetAsides([now], [setAside(then)]);
    expect(standing).toEqual({ finding: now, setAside: setAside(then), woken: null });
  });

  it.each<{ name: string; change: Partial<BoundFinding>; wakes: boolean }>([
    { name: "the value moves by a hundredth", change: { value: 9.41 }, wakes: true },
    { name: "the value moves by less than it is rounded to", change: { value: 9.404 }, wakes: false },
    { name: "the shop moves the limit", change: { limit: 8.5 }, wakes: true },
    { name: "it is measured in something else", change: { unit: "%" }, wakes: true },
    { name: "a caution becomes a stop", change: { severity: "caution" }, wakes: true },
  ])("when $name: wakes $wakes", ({ change, wakes }) => {
    const then = setAside(hole());
    const now = hole(change);
    const [standing] = matchSetAsides([now], [then]);
    expect(standing?.setAside).toEqual(wakes ? null : then);
    expect(standing?.woken).toEqual(wakes ? then : null);
    expect(openFindings(matchSetAsides([now], [then]))).toEqual(wakes ? [now] : []);
  });

  it.each<{ name: string; change: Partial<BoundFinding> }>([
    { name: "another rule", change: { rule: 7 } },
    { name: "another layer", change: { layerKey: "C" } },
    { name: "another piece", change: { pieceIds: ["p1"] } },
    { name: "another hole", change: { holeId: "h2" } },
  ])("has nothing to do with $name", ({ change }) => {
    expect(matchSetAsides([hole(change)], [setAside(hole())])).toEqual([
      { finding: hole(change), setAside: null, woken: null },
    ]);
  });

  it("of a rule that measures nothing is bound to its words", () => {
    const words = hole({ value: null, limit: null, unit: null, text: "HERON is spelt HERNO." });
    const [same] = matchSetAsides([words], [setAside(words)]);
    expect(same?.setAside).not.toBeNull();
    const [other] = matchSetAsides([{ ...words, text: "HERON is spelt HEORN." }], [setAside(words)]);
    expect(other).toMatchObject({ setAside: null, woken: setAside(words) });
  });

  it("sleeps again when the value comes back, and wakes nothing meanwhile that was set aside anew", () => {
    const first = setAside(hole({ value: 9.4 }));
    const second = setAside(hole({ value: 9.2 }), "2026-12-02T09:00:00.000Z");
    const at = (value: number) => matchSetAsides([hole({ value })], [first, second])[0];
    expect(at(9.4)).toMatchObject({ setAside: first, woken: null });
    expect(at(9.2)).toMatchObject({ setAside: second, woken: null });
    // The newest of those that are bound to what is no more is named.
    expect(at(9.3)).toMatchObject({ setAside: null, woken: second });
  });

  it("wakes one finding only: a second one in the same place is new", () => {
    const standings = matchSetAsides([hole({ value: 9.5 }), hole({ value: 9.6 })], [setAside(hole())]);
    expect(standings.map(({ woken }) => woken !== null)).toEqual([true, false]);
  });
});

const roles = ["owner", "maker", "rep"] as const;
const rules = Array.from({ length: 39 }, (_, index) => index + 1);

describe("who may set aside", () => {
  it("safety stops are the owner's, the rest the owner's and the makers', and a rep's never", () => {
    const owners = rules.filter((rule) => !maySetAside("maker", { rule, severity: "stop" }));
    expect(owners).toEqual([10, 12, 36, 38]);
    for (const rule of rules) {
      for (const severity of ["stop", "caution", "remark"] as const) {
        const may = roles.map((role) => maySetAside(role, { rule, severity }));
        expect({ rule, severity, may }).toEqual({
          rule,
          severity,
          may: [true, severity !== "stop" || !owners.includes(rule), false],
        });
      }
    }
    expect(isSafetyStop({ rule: 36, severity: "caution" })).toBe(false);
  });
});

const someFinding: fc.Arbitrary<BoundFinding> = fc.record({
  rule: fc.integer({ min: 1, max: 3 }),
  title: fc.constant("Rule"),
  severity: fc.constantFrom<Severity>("stop", "caution", "remark"),
  text: fc.constantFrom("one", "two"),
  layerKey: fc.constantFrom(null, "B", "C"),
  pieceIds: fc.uniqueArray(fc.constantFrom("p1", "p2", "p3"), { maxLength: 3 }),
  holeId: fc.constantFrom(null, "h1"),
  value: fc.option(fc.double({ min: -5, max: 5, noNaN: true })),
  limit: fc.option(fc.constantFrom(1, 2)),
  unit: fc.constantFrom(null, "mm", "%"),
});
const someSetAsides = fc.array(
  fc.record({ finding: someFinding, at: fc.integer({ min: 0, max: 9 }).map((day) => `2026-12-0${day + 1}T00:00:00Z`) }),
  { maxLength: 12 },
);

describe("whatever is found and whatever was set aside", () => {
  it("each finding comes back once, in its order, set aside exactly when something is bound to it", () => {
    fc.assert(
      fc.property(fc.array(someFinding, { maxLength: 12 }), someSetAsides, (findings, setAsides) => {
        const standings = matchSetAsides(findings, setAsides);
        expect(standings.map(({ finding }) => finding)).toEqual(findings);
        const bound = new Set(setAsides.map(({ finding }) => bindingKey(finding)));
        for (const { finding, setAside: one, woken } of standings) {
          expect(one !== null).toBe(bound.has(bindingKey(finding)));
          expect(one !== null && woken !== null).toBe(false);
          if (one) expect(bindingKey(one.finding)).toBe(bindingKey(finding));
          if (woken) {
            expect(subjectKey(woken.finding)).toBe(subjectKey(finding));
            expect(bindingKey(woken.finding)).not.toBe(bindingKey(finding));
          }
        }
        // The order in which they are kept says nothing about what is silenced.
        const turned = matchSetAsides(findings, setAsides.toReversed());
        expect(openFindings(turned)).toEqual(openFindings(standings));
      }),
    );
  });

  it("what is kept as JSON is bound like what was found, and pieces in any order are the same pieces", () => {
    fc.assert(
      fc.property(someFinding, (finding) => {
        const kept = JSON.parse(JSON.stringify(boundFinding(finding))) as BoundFinding;
        expect(bindingKey(kept)).toBe(bindingKey(finding));
        expect(bindingKey({ ...finding, pieceIds: finding.pieceIds.toReversed() })).toBe(bindingKey(finding));
      }),
    );
  });

  it("a measured value that differs by a hundredth or more is never silenced", () => {
    const step = fc.double({ min: 0.0101, max: 3, noNaN: true });
    fc.assert(
      fc.property(someFinding, fc.double({ min: -5, max: 5, noNaN: true }), step, (finding, value, by) => {
        const now = { ...finding, value: value + by };
        expect(openFindings(matchSetAsides([now], [setAside({ ...finding, value })]))).toEqual([now]);
      }),
    );
  });
});
