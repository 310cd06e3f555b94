import fc from "fast-check";
import { expect, it } from "vitest";
import { reuseUnchanged } from "#shared/mockup/reuse-unchanged.ts";
import { orreryBooks } from "../../../support/orrery-books.ts";

it("a copy becomes the very object it was copied from", () => {
  const document = orreryBooks();
  expect(reuseUnchanged(document, structuredClone(document))).toBe(document);
});

it("only what leads to a change is new", () => {
  const before = orreryBooks();
  const copy = structuredClone(before);
  const moved = copy.layers[2]?.pieces[0];
  if (!moved) throw new Error("There is no sun.");
  moved.placement.x += 1;
  const after = reuseUnchanged(before, copy);
  expect(after).toEqual(copy);
  expect(after.layers[2]?.pieces[0]?.path).toBe(before.layers[2]?.pieces[0]?.path);
  expect(after.layers[2]?.pieces[0]).not.toBe(before.layers[2]?.pieces[0]);
  for (const index of [0, 1, 3, 4, 5]) expect(after.layers[index]).toBe(before.layers[index]);
});

it("pieces are known again by their ids when one before them goes", () => {
  const before = orreryBooks();
  const copy = structuredClone(before);
  copy.layers[1]?.pieces.shift();
  const after = reuseUnchanged(before, copy);
  expect(after).toEqual(copy);
  expect(after.layers[1]?.pieces[0]).toBe(before.layers[1]?.pieces[1]);
});

it("gives a value equal to the next one, whatever the one before", () => {
  const data = fc.jsonValue({ maxDepth: 4 });
  fc.assert(
    fc.property(data, data, (before, next) => {
      const kept = structuredClone(next);
      expect(reuseUnchanged(before, next)).toEqual(kept);
      expect(next).toEqual(kept);
    }),
    { numRuns: 500 },
  );
});
