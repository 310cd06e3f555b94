import type { CostEstimate, CostLine } from "#shared/cost/estimate-cost.ts";
import { formatMoney } from "#shared/cost/money.ts";
import type { Unpriced } from "#shared/cost/priced-sign.ts";

/** The cost in a line: of a sign, of all of them, what is asked, and how much of it is not known. */
export function costSummary(
  { currency, signs, whole, perSign, lines }: CostEstimate,
  unpriced: readonly Unpriced[],
): string {
  const money = (amount: number) => formatMoney(amount, currency);
  const missing =
    unpriced.length === 0 ? "" : `, ${unpriced.length} ${unpriced.length === 1 ? "thing" : "things"} without a price`;
  if (lines.length === 0) return `What it costs is not known yet${missing}`;
  const all = signs === 1 ? "" : `, ${signs} signs ${money(whole.subtotal)}`;
  return `Costs ${money(perSign.subtotal)} a sign${all}${missing}`;
}

/** "0.0774 m², 50 % of it waste on top"; decimals that say nothing are left out. */
export function quantityWords({ quantity, decimals, unit, waste }: CostLine): string {
  const count = `${Number(quantity.toFixed(decimals))}\u00a0${unit === "each" ? "" : unit}`.trim();
  return waste === 0 ? count : `${count}, ${percentOf(waste)} waste in it`;
}

/** "60.00 EUR a m²" */
export function rateWords({ rate, rateUnit }: CostLine, currency: string): string {
  const unit = rateUnit === "each" ? "each" : rateUnit === "h" ? "an hour" : `a ${rateUnit}`;
  return `${formatMoney(rate.amount, currency)} ${unit}`;
}

export const percentOf = (share: number): string => `${Number((share * 100).toPrecision(6))}\u00a0%`;
