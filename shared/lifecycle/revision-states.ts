export const revisionStates = [
  "draft",
  "preparing",
  "issued",
  "approved",
  "revision asked",
  "superseded",
  "withdrawn",
] as const;
export type RevisionState = (typeof revisionStates)[number];

/**
 * Every move there is. Preparing falls back to draft when the PDF fails; an issued revision, or one with a revision
 * asked, is superseded when a later one is issued; an approved one only when a later one is approved. Superseded and
 * withdrawn are the end.
 */
export const revisionArrows: Readonly<Record<RevisionState, readonly RevisionState[]>> = {
  draft: ["preparing"],
  preparing: ["issued", "draft"],
  issued: ["approved", "revision asked", "superseded", "withdrawn"],
  approved: ["superseded"],
  "revision asked": ["superseded"],
  superseded: [],
  withdrawn: [],
};

export function canMoveRevision(from: RevisionState, to: RevisionState): boolean {
  return revisionArrows[from].includes(to);
}

/** Whether a client or a guest of theirs may see it: once issued, and for good unless it was withdrawn. */
export function visibleToClient(state: RevisionState): boolean {
  return state === "issued" || state === "approved" || state === "revision asked" || state === "superseded";
}

/** Whether notes and replies may be added: while it is the one being talked about. */
export function takesNotes(state: RevisionState): boolean {
  return state === "issued" || state === "revision asked";
}

/** Whether an approver may approve it or ask for a revision. */
export function canDecide(state: RevisionState): boolean {
  return canMoveRevision(state, "approved") && canMoveRevision(state, "revision asked");
}

/** An approved revision is never withdrawn: a change of it is a new revision. */
export function canWithdraw(state: RevisionState): boolean {
  return canMoveRevision(state, "withdrawn");
}

/**
 * What becomes of an earlier revision when a later one of its job reaches `later`; the same state when nothing does.
 */
export function stateAfterLater(earlier: RevisionState, later: RevisionState): RevisionState {
  if (later === "issued" && (earlier === "issued" || earlier === "revision asked")) return "superseded";
  if (later === "approved" && earlier === "approved") return "superseded";
  return earlier;
}
