import { nextRevisionLetter } from "./revision-letter.ts";
import type { RevisionState } from "./revision-states.ts";

/** A revision in the row of its job's revisions, oldest first. */
export type RevisionInRow = { readonly letter: string; readonly state: RevisionState };

/** The revision that the talk is about: the newest that is out (issued, revision asked or approved), else none. */
export function revisionOut<T extends RevisionInRow>(row: readonly T[]): T | null {
  return row.findLast(({ state }) => state === "issued" || state === "revision asked" || state === "approved") ?? null;
}

/** The revision to build from, if one is approved. It stays so while a later one is out. */
export function revisionApproved<T extends RevisionInRow>(row: readonly T[]): T | null {
  return row.findLast(({ state }) => state === "approved") ?? null;
}

/**
 * The letter the next revision gets. A letter that was ever out is never used again; one in draft, because its
 * PDF failed, is still to be used.
 */
export function letterToIssue(row: readonly RevisionInRow[]): string {
  const last = row.at(-1);
  if (last?.state === "draft") return last.letter;
  return nextRevisionLetter(last?.letter ?? null);
}

/** The words over an approved revision while a later letter is out; null when it may be cut. */
export function doNotCut(row: readonly RevisionInRow[]): string | null {
  const approved = revisionApproved(row);
  const out = revisionOut(row);
  return approved && out && out.letter !== approved.letter ? `Do not cut: ${out.letter} is out` : null;
}
