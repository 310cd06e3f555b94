import fc from "fast-check";
import { expect, it } from "vitest";
import { nextRevisionLetter, revisionIndex, revisionLetter } from "#shared/lifecycle/revision-letter.ts";

// ASME Y14.35: A to Y without I, O, Q, S, X and Z, then AA, AB and so on. From memory.
it("the first revisions are A to Y without I, O, Q, S, X and Z", () => {
  const letters = Array.from({ length: 20 }, (_, index) => revisionLetter(index));
  expect(letters).toEqual([..."ABCDEFGHJKLMNPRTUVWY"]);
});

it.each([
  { index: 20, letter: "AA" },
  { index: 21, letter: "AB" },
  { index: 39, letter: "AY" },
  { index: 40, letter: "BA" },
  { index: 419, letter: "YY" },
  { index: 420, letter: "AAA" },
])("revision $index is $letter", ({ index, letter }) => {
  expect(revisionLetter(index)).toBe(letter);
});

it.each([
  { before: null, after: "A" },
  { before: "A", after: "B" },
  { before: "H", after: "J" },
  { before: "N", after: "P" },
  { before: "P", after: "R" },
  { before: "R", after: "T" },
  { before: "W", after: "Y" },
  { before: "Y", after: "AA" },
  { before: "AY", after: "BA" },
])("after $before comes $after", ({ before, after }) => {
  expect(nextRevisionLetter(before)).toBe(after);
});

it("a letter's place leads back to the letter", () => {
  fc.assert(
    fc.property(fc.integer({ min: 0, max: 1_000_000 }), (index) => {
      expect(revisionIndex(revisionLetter(index))).toBe(index);
    }),
  );
});

it.each(["", "I", "AO", "a", "A1", " A"])("%j is no revision letter", (text) => {
  expect(revisionIndex(text)).toBeNull();
  expect(() => nextRevisionLetter(text)).toThrow(RangeError);
});

it.each([-1, 0.5, Number.NaN, Number.POSITIVE_INFINITY])("%d is no place in the row", (index) => {
  expect(() => revisionLetter(index)).toThrow(RangeError);
});
