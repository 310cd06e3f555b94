import { expect, it } from "vitest";
import { comparedWith } from "@/features/sheet/model/compared-with.ts";

const letters = (text: string) => text.split(" ").map((letter) => ({ letter }));

it.each([
  { letter: "C", others: "A B D", with: "B" },
  { letter: "A", others: "C B", with: "B" },
  { letter: "AA", others: "B Y A", with: "Y" },
  { letter: "Y", others: "AA", with: "AA" },
  { letter: "B", others: "B A", with: "A" },
])("$letter among $others is compared with $with", ({ letter, others, with: other }) => {
  expect(comparedWith(letter, letters(others))).toEqual({ letter: other });
});

it("a lone letter has none", () => {
  expect(comparedWith("A", [])).toBeNull();
  expect(comparedWith("A", letters("A"))).toBeNull();
});
