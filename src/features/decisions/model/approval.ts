/** What the reader has ticked, chosen and typed so far. */
export type Approval = {
  readonly acknowledgedIds: readonly string[];
  /** Answer to each open must-change note, by its id. */
  readonly answers: Readonly<Record<string, "settled" | "stop">>;
  readonly typedName: string;
  readonly consentToPortfolio: boolean;
};

export const emptyApproval: Approval = { acknowledgedIds: [], answers: {}, typedName: "", consentToPortfolio: false };

export type ApprovalGaps = {
  readonly acknowledgements: readonly string[];
  readonly notes: readonly string[];
  readonly typedName: boolean;
};

type Asked = { readonly id: string };

/** What stands between the reader and the approval: ids not ticked, notes not answered, no name. */
export function approvalGaps(
  approval: Approval,
  asked: { readonly acknowledgements: readonly Asked[]; readonly notes: readonly Asked[] },
): ApprovalGaps {
  return {
    acknowledgements: asked.acknowledgements.map(({ id }) => id).filter((id) => !approval.acknowledgedIds.includes(id)),
    notes: asked.notes.map(({ id }) => id).filter((id) => approval.answers[id] === undefined),
    typedName: approval.typedName.trim() === "",
  };
}

/** Whether the reader said that an open note is not settled: then there is nothing to approve. */
export const isStopped = (approval: Approval, notes: readonly Asked[]): boolean =>
  notes.some(({ id }) => approval.answers[id] === "stop");

export const isComplete = (gaps: ApprovalGaps): boolean =>
  gaps.acknowledgements.length === 0 && gaps.notes.length === 0 && !gaps.typedName;

/** The words of a name, without case and accents. */
const wordsOfName = (name: string): string[] =>
  name
    .normalize("NFD")
    .replace(/\p{M}/gu, "")
    .toLowerCase()
    .split(/[^\p{L}\p{N}]+/u)
    .filter((word) => word !== "");

/** Whether a typed name shares no word with the reader's own: then somebody else may be signing. Initials alone are no word. */
export function isAnotherName(typed: string, own: string): boolean {
  const known = wordsOfName(own);
  return !wordsOfName(typed).some((word) => known.includes(word));
}

/** The first and last figures of a hash, in fours, as people compare them: "3f9a 22c1 … 07be". */
export function shortHash(sha256: string): string {
  return `${sha256.slice(0, 4)} ${sha256.slice(4, 8)} … ${sha256.slice(-4)}`;
}

/** The letter now out, as `wrong_state` carries it, or null when the answer names none. */
export function currentOf(
  extra: Readonly<Record<string, unknown>> | undefined,
): { revisionId: string; letter: string } | null {
  const current = extra?.current;
  if (typeof current !== "object" || current === null || !("revisionId" in current) || !("letter" in current))
    return null;
  const { revisionId, letter } = current;
  return typeof revisionId === "string" && typeof letter === "string" ? { revisionId, letter } : null;
}
