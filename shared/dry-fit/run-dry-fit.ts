import type { Finding, Severity } from "./finding.ts";
import { rules } from "./index.ts";
import type { RuleInput } from "./rule.ts";

const rank: Readonly<Record<Severity, number>> = { stop: 0, caution: 1, remark: 2 };

/**
 * Every rule on one sign. The figures are the document's own. Stops first, then cautions, then remarks; within them by
 * rule, and then from the top of the board down and from left to right.
 */
export function runDryFit(input: RuleInput): Finding[] {
  return rules.flatMap((rule) => rule.check(input)).toSorted(compareFindings);
}

function compareFindings(a: Finding, b: Finding): number {
  return (
    rank[a.severity] - rank[b.severity] ||
    a.rule - b.rule ||
    (a.where?.y ?? 0) - (b.where?.y ?? 0) ||
    (a.where?.x ?? 0) - (b.where?.x ?? 0) ||
    compareTexts(a.layerKey ?? "", b.layerKey ?? "") ||
    compareTexts(a.pieceIds[0] ?? a.holeId ?? "", b.pieceIds[0] ?? b.holeId ?? "")
  );
}

function compareTexts(a: string, b: string): number {
  if (a === b) return 0;
  return a < b ? -1 : 1;
}
