import { currencyDigits } from "./currency.ts";

/** An amount in whole minor units of the shop's currency: 1250 is 12.50 where 100 make one. */
export type Money = number;

/** Prices go up to a thousand million minor units; a larger one is a slip of the hand. */
export const mostPrice: Money = 1_000_000_000;
/** Amounts beyond this are no longer exact numbers. */
export const mostAmount: Money = Number.MAX_SAFE_INTEGER;

/** Shares (waste, markup, tax) are taken to a millionth. */
const shareSteps = 1_000_000;

/** A price for so many units: 1800 for 60 minutes, 950 for a pack of 100. */
export type Rate = { readonly amount: Money; readonly per: number };

/**
 * The quotient of two whole numbers, rounded half away from zero: 2.5 becomes 3 and −2.5 becomes −3. Throws a RangeError
 * for a divisor that isn't above 0.
 */
export function dividedRounded(value: bigint, by: bigint): bigint {
  if (by <= 0n) throw new RangeError("The divisor must be above 0.");
  const twice = 2n * (value < 0n ? -value : value);
  const whole = (twice + by) / (2n * by);
  return value < 0n ? -whole : whole;
}

/**
 * What a quantity costs, computed in whole numbers and rounded once. `steps` is the quantity in its last printed decimal:
 * 3500 with 4 decimals is 0.35. Null when it is more than can be kept exactly.
 */
export function amountOf(steps: number, decimals: number, { amount, per }: Rate): Money | null {
  return exact(dividedRounded(BigInt(amount) * BigInt(steps), BigInt(per) * 10n ** BigInt(decimals)));
}

/** A share of an amount, rounded once: markup, tax. Null when it is more than can be kept exactly. */
export function shareOfAmount(amount: Money, share: number): Money | null {
  return exact(dividedRounded(BigInt(amount) * BigInt(Math.round(share * shareSteps)), BigInt(shareSteps)));
}

/** Amounts added up. Null when the sum is more than can be kept exactly. */
export function sumOf(amounts: readonly Money[]): Money | null {
  return exact(amounts.reduce((sum, amount) => sum + BigInt(amount), 0n));
}

/** One of `count` equal parts of an amount, rounded half away from zero. */
export function partOfAmount(amount: Money, count: number): Money {
  return Number(dividedRounded(BigInt(amount), BigInt(count)));
}

const exact = (value: bigint): Money | null =>
  value > BigInt(mostAmount) || value < -BigInt(mostAmount) ? null : Number(value);

/** An amount with its currency's digits and code, thousands apart: "1 234.50 EUR". Unknown codes are written in minor units. */
export function formatMoney(amount: Money, currency: string): string {
  const digits = currencyDigits(currency) ?? 0;
  const text = String(Math.abs(amount)).padStart(digits + 1, "0");
  const whole = text.slice(0, text.length - digits).replace(/\B(?=(\d{3})+$)/g, "\u00a0");
  const minor = digits > 0 ? `.${text.slice(-digits)}` : "";
  return `${amount < 0 ? "−" : ""}${whole}${minor}\u00a0${currency}`;
}
