import type { Kernel } from "../geometry/kernel.ts";
import type { Outcome } from "../units/outcome.ts";

/**
 * How sure a rule is: printed in a text that can be looked up, handed down among those who build signs, recalled from a
 * text that is not at hand, decided by us, or following from arithmetic and geometry alone.
 */
export type SourceStatus = "published" | "common practice" | "from memory" | "our choice" | "calculated";

export type Quantity = { readonly name: string; readonly value: number | string; readonly unit: string };

/** What goes in and what comes out; computed when it is asked for, by the function that the product itself uses. */
export type WorkedExample = { readonly given: readonly Quantity[]; readonly gives: readonly Quantity[] };

/** One calculation as the product explains it. */
export type Calculation = {
  readonly id: string;
  readonly title: string;
  /** The rule in words and signs, with what the signs stand for. */
  readonly formula: string;
  readonly source: { readonly text: string; readonly status: SourceStatus };
  /** Where it holds, and what it leaves out. */
  readonly limits: string;
  readonly example: (kernel: Kernel) => WorkedExample;
};

/** Calculations that belong together, under a heading. */
export type CalculationGroup = { readonly title: string; readonly calculations: readonly Calculation[] };

type Row = readonly [name: string, value: number | string, unit?: string];

/** An example from rows of name, value and unit. */
export function worked(given: readonly Row[], gives: readonly Row[]): WorkedExample {
  const quantity = ([name, value, unit = ""]: Row): Quantity => ({ name, value, unit });
  return { given: given.map(quantity), gives: gives.map(quantity) };
}

/** The value of an outcome whose inputs are our own; throws when they were chosen wrong. */
export function resultOf<T>(outcome: Outcome<T>): T {
  if (outcome.ok) return outcome.value;
  throw new Error(`An example is refused for its ${outcome.reason.field}.`);
}

/** The same for something that can be missing. */
export function present<T>(value: T | null | undefined): T {
  if (value === null || value === undefined) throw new Error("An example has no result.");
  return value;
}
