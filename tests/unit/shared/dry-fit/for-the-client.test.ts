import { expect, it } from "vitest";
import { forTheClient } from "#shared/dry-fit/for-the-client.ts";
import { rules } from "#shared/dry-fit/index.ts";
import { foundBy } from "#shared/dry-fit/rule.ts";

const finding = (number: number) =>
  foundBy({ number, title: "A rule" }, { severity: "caution", text: "Found.", source: "our choice" });

it("a proof says what is found about the sign, and nothing of stock, tools and handling", () => {
  const kept = forTheClient(rules.map(({ number }) => finding(number))).map(({ rule }) => rule);
  expect(kept).toEqual([23, 24, 25, 27, 37, 38]);
});
