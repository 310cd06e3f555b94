import { describe, expect, it } from "vitest";
import type { Calculation } from "#shared/calculations/calculation.ts";
import { calculations } from "#shared/calculations/definitions.ts";
import { findCalculations, numbered } from "@/features/calculations/model/find-calculations.ts";

const calculation = (id: string, title: string, formula: string): Calculation => ({
  id,
  title,
  formula,
  source: { text: "Plane geometry", status: "calculated" },
  limits: "None.",
  example: () => ({ given: [], gives: [] }),
});
const groups = numbered([
  { title: "Pieces", calculations: [calculation("area", "Area", "Shoelace"), calculation("mass", "Mass", "Area · t")] },
  { title: "Holes", calculations: [calculation("window", "Hole window", "From d to D")] },
]);
const found = (query: string) => findCalculations(groups, query).flatMap(({ entries }) => entries.map((e) => e.number));

describe("findCalculations", () => {
  it.each([
    { query: "", numbers: ["1.1", "1.2", "2.1"] },
    { query: "  ", numbers: ["1.1", "1.2", "2.1"] },
    { query: "AREA", numbers: ["1.1", "1.2"] },
    { query: "pieces shoelace", numbers: ["1.1"] },
    { query: "window hole", numbers: ["2.1"] },
    { query: "geometry", numbers: ["1.1", "1.2", "2.1"] },
    { query: "area zzzz", numbers: [] },
  ])('finds $numbers for "$query"', ({ query, numbers }) => {
    expect(found(query)).toEqual(numbers);
  });
  it("leaves out groups without anything found and keeps the numbers of the others", () => {
    expect(findCalculations(groups, "window").map(({ number }) => number)).toEqual(["2"]);
  });
});

it("no calculation has the id of another part of the page", () => {
  const ids = calculations.flatMap((group) => group.calculations.map(({ id }) => id));
  expect(new Set(ids).size).toBe(ids.length);
  for (const id of ids) {
    expect(id).toMatch(/^[a-z][a-z0-9-]*$/);
    expect(id).not.toMatch(/^(content|index|sources|find-calculation|group-\d+)$/);
  }
});
