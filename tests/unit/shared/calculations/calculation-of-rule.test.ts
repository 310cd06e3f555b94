import { expect, it } from "vitest";
import { calculationOfRule } from "#shared/calculations/calculation-of-rule.ts";
import { calculations } from "#shared/calculations/definitions.ts";

it("every rule is explained by a calculation that there is", () => {
  const ids = calculations.flatMap((group) => group.calculations.map(({ id }) => id));
  expect(Object.values(calculationOfRule).filter((id) => !ids.includes(id))).toEqual([]);
  expect(calculationOfRule[6]).toBe("hole-window");
});
