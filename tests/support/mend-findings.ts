import { expect } from "vitest";
import { applyMend } from "#shared/dry-fit/apply-mend.ts";
import type { Finding } from "#shared/dry-fit/finding.ts";
import type { Rule } from "#shared/dry-fit/rule.ts";
import { subjectKey } from "#shared/dry-fit/set-aside.ts";
import { documentSchema, type MockupDocument } from "#shared/mockup/document.ts";
import { findingsOf, inputOf } from "./dry-fit.ts";

/** What a finding is about, and against which limit: a rule may find two faults of one thing. */
const nameOf = (finding: Finding): string => `${finding.severity} ${subjectKey(finding)} ${finding.limit}`;

/**
 * Every mend that a rule offers on a sign, tried: after it the finding is gone and the document still passes its schema.
 * Gives the labels, finding by finding, and the mended documents in the same order.
 */
export async function triedMends(
  rule: Rule,
  document: MockupDocument,
  options: Parameters<typeof findingsOf>[2] = {},
): Promise<{ readonly labels: string[][]; readonly mended: MockupDocument[] }> {
  const input = await inputOf(document, options);
  const labels: string[][] = [];
  const mended: MockupDocument[] = [];
  for (const finding of rule.check(input)) {
    const mends = rule.mends?.(finding, input) ?? [];
    labels.push(mends.map(({ label }) => label));
    for (const mend of mends) {
      const after = applyMend(document, mend);
      expect(documentSchema.safeParse(after).success, mend.label).toBe(true);
      expect((await findingsOf(rule, after, options)).map(nameOf), mend.label).not.toContain(nameOf(finding));
      mended.push(after);
    }
  }
  return { labels, mended };
}
