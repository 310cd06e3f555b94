import type { Calculation, CalculationGroup, WorkedExample } from "#shared/calculations/calculation.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";

/** The example of one calculation, or why it could not be computed. */
export type ExampleOutcome =
  | { readonly ok: true; readonly example: WorkedExample }
  | { readonly ok: false; readonly reason: string };

/** Outcomes by the id of their calculation. */
export type Examples = Readonly<Record<string, ExampleOutcome>>;

/** What the worker says once it is done, or why it could not begin. */
export type ExamplesAnswer =
  | { readonly ok: true; readonly examples: Examples }
  | { readonly ok: false; readonly reason: string };

/** Runs the worked example of every calculation; one that fails leaves the others standing. */
export function workedExamples(groups: readonly CalculationGroup[], kernel: Kernel): Examples {
  const all = groups.flatMap(({ calculations }) => calculations);
  return Object.fromEntries(all.map((calculation) => [calculation.id, outcomeOf(calculation, kernel)]));
}

function outcomeOf({ example }: Calculation, kernel: Kernel): ExampleOutcome {
  try {
    return { ok: true, example: example(kernel) };
  } catch (error) {
    return { ok: false, reason: error instanceof Error ? error.message : String(error) };
  }
}
