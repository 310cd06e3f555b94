import { expect, it } from "vitest";
import { calculationOfRule } from "#shared/calculations/calculation-of-rule.ts";
import { calculations } from "#shared/calculations/definitions.ts";
import { rules } from "#shared/dry-fit/index.ts";

it("every rule is explained by a calculation that there is", () => {
  const ids = calculations.flatMap((group) => group.calculations.map(({ id }) => id));
  expect(Object.values(calculationOfRule).filter((id) => !ids.includes(id))).toEqual([]);
  expect(calculationOfRule[6]).toBe("hole-window");
});

it("no calculation stands for a rule that there isn't", () => {
  const numbers = rules.map(({ number }) => String(number));
  expect(Object.keys(calculationOfRule).filter((number) => !numbers.includes(number))).toEqual([]);
});
