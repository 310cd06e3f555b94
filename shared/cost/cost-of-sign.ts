import { type CostOutcome, estimateCost } from "./estimate-cost.ts";
import type { PricedSign, Unpriced } from "./priced-sign.ts";
import { quantitiesOfSign } from "./quantities-of-sign.ts";

export type SignCost = {
  /** Of what has a price. */
  readonly outcome: CostOutcome;
  /** What has none yet, and is not in the estimate. */
  readonly unpriced: readonly Unpriced[];
};

/** What the signs of an order cost by the price book, and what it can't say. */
export function costOfSign(sign: PricedSign): SignCost {
  const { each, once, unpriced } = quantitiesOfSign(sign);
  return { outcome: estimateCost({ book: sign.book, each, once, signs: sign.signs }), unpriced };
}

/** "no price yet for Midnight, 3 mm" */
export const unpricedWords = ({ name }: Unpriced): string => `no price yet for ${name}`;
