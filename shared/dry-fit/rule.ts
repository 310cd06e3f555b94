import type { Kernel } from "../geometry/kernel.ts";
import type { Stock } from "../materials/stock.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import type { LengthUnit } from "../units/length.ts";
import type { Finding } from "./finding.ts";
import type { Limits } from "./limits.ts";
import type { Mend } from "./mend.ts";

/**
 * What a dry fit knows besides the sign: how lengths are written, where it will hang, and what the shop can offer
 * instead.
 */
export type DryFitContext = {
  readonly unit: LengthUnit;
  readonly place: "inside" | "outside";
  /** What the brief says of the place: people walk past it, stand under it, or it has electrical parts. */
  readonly walkway: boolean;
  readonly overhead: boolean;
  readonly electrical: boolean;
  /** The words as they shall read, a line a line; empty when the brief states none. */
  readonly words: string;
  /** What the shop has on hand. */
  readonly stock: Stock;
};

export type RuleInput = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly limits: Limits;
  readonly context: DryFitContext;
  readonly kernel: Kernel;
};

/** One check of the dry fit. Pure: the same sign gives the same findings in the same order. */
export type Rule = {
  readonly number: number;
  readonly title: string;
  readonly check: (input: RuleInput) => Finding[];
  /** Changes of the document that mend a finding of this rule, best first; none when only the maker can decide. */
  readonly mends?: (finding: Finding, input: RuleInput) => Mend[];
};

/** A finding of `rule` with what it does not state left out. */
export function foundBy(
  rule: Pick<Rule, "number" | "title">,
  said: Pick<Finding, "severity" | "text" | "source"> & Partial<Finding>,
): Finding {
  return {
    layerKey: null,
    pieceIds: [],
    holeId: null,
    where: null,
    limit: null,
    unit: null,
    ...said,
    rule: rule.number,
    title: rule.title,
    value: said.value === undefined || said.value === null ? null : roundedToHundredth(said.value),
  };
}

function roundedToHundredth(value: number): number {
  const rounded = Math.round(value * 100) / 100;
  return rounded === 0 ? 0 : rounded;
}
