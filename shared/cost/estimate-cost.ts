import { combineQuantities } from "./combine-quantities.ts";
import { type DraftLine, draftLines } from "./cost-lines.ts";
import { type CostQuantities, checkQuantities, noQuantities } from "./cost-quantities.ts";
import { amountOf, type Money, partOfAmount, shareOfAmount, sumOf } from "./money.ts";
import type { CostProblem, PriceBook } from "./price-book.ts";

/** A line as it is printed: `quantity`, rounded to `decimals`, times the rate is `amount`, rounded once. */
export type CostLine = DraftLine & { readonly amount: Money };

export type CostTotals = {
  readonly subtotal: Money;
  readonly markup: Money;
  readonly tax: Money;
  /** The three together. */
  readonly total: Money;
};

export type CostEstimate = {
  readonly currency: string;
  readonly signs: number;
  /** For all signs. */
  readonly lines: readonly CostLine[];
  readonly whole: CostTotals;
  /** The whole divided by the number of signs, each figure rounded by itself; `total` is what these come to. */
  readonly perSign: CostTotals;
};

export type CostOutcome =
  | { readonly ok: true; readonly value: CostEstimate }
  | { readonly ok: false; readonly problems: readonly CostProblem[] };

export type CostOrder = {
  readonly book: PriceBook;
  /** What goes into each sign. */
  readonly each: CostQuantities;
  /** What is there once for all of them: whole sheets, setting up a machine. */
  readonly once?: CostQuantities;
  readonly signs: number;
};

/** Signs in one estimate. */
export const mostSigns = 10_000;
/** Takes a figure that binary holds a hair low to the side on which people round it. */
const hair = 1e-7;

/**
 * What an order costs the shop and what it asks. Everything is whole minor units: a line's printed quantity times its
 * rate is rounded once, half away from zero; the subtotal is the sum of the lines; markup is a share of the subtotal and
 * tax one of both, each rounded once; the total is the sum of the three.
 */
export function estimateCost({ book, each, once = noQuantities, signs }: CostOrder): CostOutcome {
  const problems = [...checkSigns(signs), ...checkQuantities(each, "each"), ...checkQuantities(once, "once")];
  if (problems.length > 0) return { ok: false, problems };
  const drafts = draftLines(book, combineQuantities(each, once, signs));
  if (drafts.problems.length > 0) return { ok: false, problems: drafts.problems };
  const lines: CostLine[] = [];
  for (const draft of drafts.lines) {
    const steps = Math.round(draft.quantity * 10 ** draft.decimals + hair);
    const amount = Number.isSafeInteger(steps) ? amountOf(steps, draft.decimals, draft.rate) : null;
    if (amount === null) return tooMuch(`${draft.group}.${draft.id}`, draft.what);
    lines.push({ ...draft, quantity: steps / 10 ** draft.decimals, amount });
  }
  const whole = totalsOf(lines, book);
  if (!whole) return tooMuch("total", "The whole order");
  return { ok: true, value: { currency: book.currency, signs, lines, whole, perSign: perSignOf(whole, signs) } };
}

/** Subtotal, markup, tax and total of lines; null when they are more than can be kept exactly. */
function totalsOf(lines: readonly CostLine[], { markup: markupShare, tax: { share } }: PriceBook): CostTotals | null {
  const subtotal = sumOf(lines.map(({ amount }) => amount));
  const markup = subtotal === null ? null : shareOfAmount(subtotal, markupShare);
  if (subtotal === null || markup === null) return null;
  const net = sumOf([subtotal, markup]);
  const tax = net === null ? null : shareOfAmount(net, share);
  const total = net === null || tax === null ? null : sumOf([net, tax]);
  return tax === null || total === null ? null : { subtotal, markup, tax, total };
}

function perSignOf(whole: CostTotals, signs: number): CostTotals {
  const subtotal = partOfAmount(whole.subtotal, signs);
  const markup = partOfAmount(whole.markup, signs);
  const tax = partOfAmount(whole.tax, signs);
  return { subtotal, markup, tax, total: subtotal + markup + tax };
}

function checkSigns(signs: number): CostProblem[] {
  if (Number.isInteger(signs) && signs >= 1 && signs <= mostSigns) return [];
  return [{ field: "signs", words: `The number of signs must be a whole number from 1 to ${mostSigns}.` }];
}

function tooMuch(field: string, what: string): CostOutcome {
  return {
    ok: false,
    problems: [
      { field, words: `${what} comes to more than can be reckoned exactly. Look for a slip in its price or quantity.` },
    ],
  };
}
