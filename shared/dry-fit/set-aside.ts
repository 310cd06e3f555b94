import type { Finding } from "./finding.ts";

/** What of a finding a set-aside keeps: what it is about, what was measured, and how it read. */
export type BoundFinding = Pick<
  Finding,
  "rule" | "title" | "severity" | "text" | "layerKey" | "pieceIds" | "holeId" | "value" | "limit" | "unit"
>;

/** A finding that somebody set aside, as it was at that moment. `at` is an ISO instant. */
export type SetAside = { readonly finding: BoundFinding; readonly at: string };

/** As a revision freezes it: with the reason, and the id and name of who set it aside. */
export type FrozenSetAside = SetAside & { readonly reason: string; readonly by: string; readonly name: string };

/** A finding and what stands against it. At most one of the two is there. */
export type Standing<F extends BoundFinding = Finding, S extends SetAside = SetAside> = {
  readonly finding: F;
  /** Bound to this very finding: it neither asks for anything nor stops anything. */
  readonly setAside: S | null;
  /** Bound to the same rule at the same place with another value: the finding stands again. */
  readonly woken: S | null;
};

/** The kinds of staff, as shared/contracts/account.ts has them. */
type Role = "owner" | "maker" | "rep";

/** Rules whose stops are about people's safety: break-through, load, hanging, and what needs a licensed professional. */
export const safetyRules: readonly number[] = [10, 12, 36, 38];

export const isSafetyStop = ({ rule, severity }: Pick<Finding, "rule" | "severity">): boolean =>
  severity === "stop" && safetyRules.includes(rule);

/** Safety stops are an owner's to set aside, everything else an owner's or a maker's. */
export function maySetAside(role: Role, finding: Pick<Finding, "rule" | "severity">): boolean {
  return role === "owner" || (role === "maker" && !isSafetyStop(finding));
}

/** What a finding is about: rule, layer, pieces in any order, hole. */
export function subjectKey({ rule, layerKey, pieceIds, holeId }: BoundFinding): string {
  return JSON.stringify([rule, layerKey, pieceIds.toSorted(), holeId]);
}

/**
 * What a set-aside is bound to: the subject, the severity and the measured value with its limit, to 0.01 of its unit.
 * A rule that measures nothing is bound to its words.
 */
export function bindingKey(finding: BoundFinding): string {
  const { severity, value, limit, unit, text } = finding;
  const measure = value === null ? text : [hundredths(value), limit === null ? null : hundredths(limit), unit];
  return JSON.stringify([subjectKey(finding), severity, measure]);
}

/** Just what is bound, without where it was seen and where the rule comes from. */
export function boundFinding(finding: BoundFinding): BoundFinding {
  const { rule, title, severity, text, layerKey, pieceIds, holeId, value, limit, unit } = finding;
  return { rule, title, severity, text, layerKey, pieceIds, holeId, value, limit, unit };
}

/**
 * The findings in their order, each with what stands against it. One set-aside holds for all findings that are bound
 * alike. One whose finding is there no more wakes at most one finding of its subject, the newest first.
 */
export function matchSetAsides<F extends BoundFinding, S extends SetAside>(
  findings: readonly F[],
  setAsides: readonly S[],
): Standing<F, S>[] {
  const newestFirst = setAsides.toSorted((a, b) => Date.parse(b.at) - Date.parse(a.at));
  const byBinding = new Map(newestFirst.toReversed().map((one) => [bindingKey(one.finding), one]));
  const found = new Set(findings.map(bindingKey));
  const idle = new Map<string, S[]>();
  for (const one of newestFirst) {
    if (found.has(bindingKey(one.finding))) continue;
    const subject = subjectKey(one.finding);
    idle.set(subject, [...(idle.get(subject) ?? []), one]);
  }
  return findings.map((finding) => {
    const setAside = byBinding.get(bindingKey(finding)) ?? null;
    const woken = setAside === null ? (idle.get(subjectKey(finding))?.shift() ?? null) : null;
    return { finding, setAside, woken };
  });
}

/** Findings that nothing stands against. */
export function openFindings<F extends BoundFinding>(standings: readonly Standing<F, SetAside>[]): F[] {
  return standings.flatMap(({ finding, setAside }) => (setAside === null ? [finding] : []));
}

/** What keeps a revision from being issued. */
export function openStops<F extends BoundFinding>(standings: readonly Standing<F, SetAside>[]): F[] {
  return openFindings(standings).filter(({ severity }) => severity === "stop");
}

/** What is set aside and found, each once, in the order of the findings. */
export function setAsidesInForce<S extends SetAside>(standings: readonly Standing<BoundFinding, S>[]): S[] {
  return [...new Set(standings.flatMap(({ setAside }) => setAside ?? []))];
}

/** In whole hundredths, so that 0.1 + 0.2 and 0.3 are one value. */
const hundredths = (value: number): number => Math.round(value * 100);
