import { loadKernel } from "#server/artwork/load-kernel.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import { type Limits, limitsSchema } from "#shared/dry-fit/limits.ts";
import type { DryFitContext, Rule } from "#shared/dry-fit/rule.ts";
import { runDryFit } from "#shared/dry-fit/run-dry-fit.ts";
import { usualContext } from "#shared/dry-fit/usual-context.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { computeFigures } from "#shared/stack/compute-figures.ts";

type Options = { readonly limits?: Partial<Limits>; readonly context?: Partial<DryFitContext> };

/** What one rule finds on a sign, with the usual limits where none are given. */
export async function findingsOf(rule: Rule, document: MockupDocument, options: Options = {}): Promise<Finding[]> {
  return rule.check(await inputOf(document, options));
}

/** What the whole dry fit finds on a sign. */
export async function dryFitOf(document: MockupDocument, options: Options = {}): Promise<Finding[]> {
  return runDryFit(await inputOf(document, options));
}

/** What a rule is given of a sign. */
export async function inputOf(document: MockupDocument, { limits, context }: Options) {
  const kernel = await loadKernel();
  return {
    document,
    figures: computeFigures(document, kernel),
    limits: limitsSchema.parse(limits ?? {}),
    context: { ...usualContext, ...context },
    kernel,
  };
}
