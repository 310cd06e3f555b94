import { currencyDigits } from "./currency.ts";
import type { Money } from "./money.ts";

export type MoneyOutcome =
  | { readonly ok: true; readonly value: Money }
  | { readonly ok: false; readonly words: string };

/**
 * An amount as people write it, in minor units: "12.50", "12,50", "1 234.50", "1.234,50". The last point or comma parts the
 * decimals, no more of which than the currency has; what could be read two ways ("1,234" in euros) is refused with words.
 */
export function parseMoney(text: string, currency: string): MoneyOutcome {
  const digits = currencyDigits(currency) ?? 0;
  const example = digits === 0 ? "1250" : `12.${"50".padEnd(digits, "0").slice(0, digits)}`;
  const unreadable = { ok: false, words: `Write an amount, like ${example}.` } as const;
  const compact = text.trim().replace(/[\s\u00a0\u202f'’]/g, "");
  const parts = /^(-|−)?(\d[\d.,]*|[.,]\d+)$/.exec(compact);
  if (!parts) return unreadable;
  const [, sign, amount = ""] = parts;
  if (sign) return { ok: false, words: "A price can't be below 0." };
  const at = Math.max(amount.lastIndexOf("."), amount.lastIndexOf(","));
  const decimals = at < 0 ? "" : amount.slice(at + 1);
  const whole = at < 0 ? amount : amount.slice(0, at);
  if (!isGrouped(whole, at < 0 ? "" : amount.charAt(at))) return unreadable;
  if (decimals.length > digits) {
    const most = digits === 0 ? "no decimals" : `${digits} decimals at most`;
    return { ok: false, words: `${currency} has ${most}: write ${example}.` };
  }
  return { ok: true, value: Number(whole.replace(/[.,]/g, "") + decimals.padEnd(digits, "0")) };
}

/** Whether whole units are written in one, or in threes by the mark that doesn't part the decimals. */
function isGrouped(whole: string, decimalMark: string): boolean {
  if (/^\d*$/.test(whole)) return true;
  const mark = decimalMark === "," ? "\\." : ",";
  return new RegExp(`^\\d{1,3}(${mark}\\d{3})+$`).test(whole);
}

/** An amount as it stands in a field, with the currency's decimals and nothing else: "12.50". */
export function writtenMoney(amount: Money, currency: string): string {
  const digits = currencyDigits(currency) ?? 0;
  return (amount / 10 ** digits).toFixed(digits);
}
