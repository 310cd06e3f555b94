import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { currencyCodes, currencyDigits } from "#shared/cost/currency.ts";
import {
  amountOf,
  dividedRounded,
  formatMoney,
  mostAmount,
  partOfAmount,
  shareOfAmount,
  sumOf,
} from "#shared/cost/money.ts";

describe("rounding", () => {
  it.each([
    { value: 5, by: 2, rounded: 3 },
    { value: -5, by: 2, rounded: -3 },
    { value: 7, by: 5, rounded: 1 },
    { value: -7, by: 5, rounded: -1 },
    { value: 8, by: 5, rounded: 2 },
    { value: 0, by: 7, rounded: 0 },
  ])("$value / $by is $rounded: half away from zero", ({ value, by, rounded }) => {
    expect(dividedRounded(BigInt(value), BigInt(by))).toBe(BigInt(rounded));
  });

  it("is never more than half a unit off", () => {
    fc.assert(
      fc.property(
        fc.bigInt({ min: -(10n ** 25n), max: 10n ** 25n }),
        fc.bigInt({ min: 1n, max: 10n ** 12n }),
        (value, by) => {
          const off = 2n * (dividedRounded(value, by) * by - value);
          expect(off <= by && off >= -by).toBe(true);
        },
      ),
    );
  });

  it("needs a divisor above nothing", () => {
    expect(() => dividedRounded(1n, 0n)).toThrow(RangeError);
  });
});

describe("amounts", () => {
  it.each([
    // 0.3500 m² at 42.99: 15.0465.
    { steps: 3500, decimals: 4, amount: 4299, per: 1, cost: 1505 },
    // 7.50 min at 0.99 an hour: 0.12375.
    { steps: 750, decimals: 2, amount: 99, per: 60, cost: 12 },
    // Half a cent: 1 of 2 for a cent.
    { steps: 1, decimals: 0, amount: 1, per: 2, cost: 1 },
  ])("$steps with $decimals decimals at $amount for $per cost $cost", ({ steps, decimals, amount, per, cost }) => {
    expect(amountOf(steps, decimals, { amount, per })).toBe(cost);
  });

  it("are exact up to the largest whole number, and none beyond", () => {
    expect(amountOf(mostAmount, 0, { amount: 1, per: 1 })).toBe(9_007_199_254_740_991);
    expect(amountOf(mostAmount, 0, { amount: 2, per: 1 })).toBeNull();
    expect(sumOf([mostAmount, 1])).toBeNull();
    expect(shareOfAmount(mostAmount, 1.5)).toBeNull();
  });

  it("have shares to a millionth: 8.875 % of 12345.67", () => {
    // 1234567 · 0.08875 = 109567.82.
    expect(shareOfAmount(1_234_567, 0.088_75)).toBe(109_568);
  });

  it("are divided", () => {
    expect([partOfAmount(100, 3), partOfAmount(101, 2), partOfAmount(0, 4)]).toEqual([33, 51, 0]);
  });
});

describe("currencies", () => {
  // ISO 4217, list one.
  it.each([
    { code: "EUR", digits: 2 },
    { code: "USD", digits: 2 },
    { code: "JPY", digits: 0 },
    { code: "ISK", digits: 0 },
    { code: "BHD", digits: 3 },
    { code: "TND", digits: 3 },
  ])("$code has $digits digits", ({ code, digits }) => {
    expect(currencyDigits(code)).toBe(digits);
  });

  it("no metals, no tests, no made-up ones", () => {
    for (const code of ["XAU", "XTS", "XXX", "eur", "", "ABC"]) expect(currencyDigits(code)).toBeNull();
    expect(new Set(currencyCodes).size).toBe(currencyCodes.length);
    for (const code of currencyCodes) expect(code).toMatch(/^[A-Z]{3}$/);
  });

  it.each([
    { amount: 123_450, currency: "EUR", text: "1 234.50 EUR" },
    { amount: 5, currency: "USD", text: "0.05 USD" },
    { amount: -1_000_000, currency: "JPY", text: "−1 000 000 JPY" },
    { amount: 1_234, currency: "KWD", text: "1.234 KWD" },
    { amount: 0, currency: "GBP", text: "0.00 GBP" },
  ])("$amount of $currency reads $text", ({ amount, currency, text }) => {
    expect(formatMoney(amount, currency).replaceAll("\u00a0", " ")).toBe(text);
  });
});
