import type { Finding } from "./finding.ts";
import { rules } from "./index.ts";
import type { Mend } from "./mend.ts";
import type { RuleInput } from "./rule.ts";

/** What would mend a finding of this very sign, best first; none when only a person can decide. */
export function listMends(finding: Finding, input: RuleInput): readonly Mend[] {
  return rules.find(({ number }) => number === finding.rule)?.mends?.(finding, input) ?? [];
}
