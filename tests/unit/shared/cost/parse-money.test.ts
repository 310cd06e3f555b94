import { describe, expect, it } from "vitest";
import { parseMoney, writtenMoney } from "#shared/cost/parse-money.ts";

describe("parseMoney", () => {
  it.each([
    ["12.50", "EUR", 1250],
    ["12,50", "EUR", 1250],
    ["12,5", "EUR", 1250],
    ["12", "EUR", 1200],
    ["0", "EUR", 0],
    [".5", "EUR", 50],
    ["7.", "EUR", 700],
    ["1 234.50", "EUR", 123_450],
    ["1\u00a0234,50", "EUR", 123_450],
    ["1.234,50", "EUR", 123_450],
    ["1,234.50", "USD", 123_450],
    ["1,234,567.8", "USD", 123_456_780],
    ["1250", "JPY", 1250],
    ["1.234", "BHD", 1234],
    ["19.99", "EUR", 1999],
  ])("reads %s in %s", (text, currency, value) => {
    expect(parseMoney(text, currency)).toEqual({ ok: true, value });
  });

  it.each([
    ["1,234", "EUR", "EUR has 2 decimals at most: write 12.50."],
    ["12.505", "EUR", "EUR has 2 decimals at most: write 12.50."],
    ["12.5", "JPY", "JPY has no decimals: write 1250."],
    ["-3", "EUR", "A price can't be below 0."],
    ["−3", "EUR", "A price can't be below 0."],
    ["twelve", "EUR", "Write an amount, like 12.50."],
    ["12 €", "EUR", "Write an amount, like 12.50."],
    ["1.23.4", "EUR", "Write an amount, like 12.50."],
    ["1,2,3", "EUR", "Write an amount, like 12.50."],
    ["", "EUR", "Write an amount, like 12.50."],
    [".", "EUR", "Write an amount, like 12.50."],
    ["1e5", "EUR", "Write an amount, like 12.50."],
  ])("refuses %s in %s with words", (text, currency, words) => {
    expect(parseMoney(text, currency)).toEqual({ ok: false, words });
  });

  it("reads back what it wrote", () => {
    for (const currency of ["EUR", "JPY", "KWD"])
      for (const amount of [0, 1, 5, 99, 100, 1005, 123_456_789])
        expect(parseMoney(writtenMoney(amount, currency), currency)).toEqual({ ok: true, value: amount });
    expect(writtenMoney(1250, "EUR")).toBe("12.50");
    expect(writtenMoney(1250, "JPY")).toBe("1250");
  });
});
