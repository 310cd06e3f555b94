import { type RevisionInRow, revisionOut } from "./revision-row.ts";

export const jobStates = [
  "brief",
  "mockup",
  "out for proof",
  "revision asked",
  "approved",
  "in build",
  "handed over",
  "closed",
  "on hold",
  "cancelled",
] as const;
export type JobState = (typeof jobStates)[number];

/** States that staff set by hand. The others follow from the brief and the revisions. */
export const staffStates = ["in build", "handed over", "closed", "on hold", "cancelled"] as const;
export type StaffState = (typeof staffStates)[number];

export type JobFacts = {
  readonly briefComplete: boolean;
  /** Oldest first. */
  readonly revisions: readonly RevisionInRow[];
  /** What staff set; null while the job follows its revisions. */
  readonly setByStaff: StaffState | null;
};

/** The state of a job. Up to `approved` it follows from the revisions; what staff set comes before it. */
export function jobState({ briefComplete, revisions, setByStaff }: JobFacts): JobState {
  if (setByStaff) return setByStaff;
  const out = revisionOut(revisions);
  if (out?.state === "approved") return "approved";
  if (out?.state === "revision asked") return "revision asked";
  if (out) return "out for proof";
  // Once a revision was made the job is past its brief, even when the brief has gaps.
  return briefComplete || revisions.length > 0 ? "mockup" : "brief";
}

/**
 * Whether staff may set `to` on a job in state `from`. After approval the states are taken in order; any job not yet
 * handed over can be put on hold or cancelled. A job on hold is taken up again (its state then follows from the facts)
 * or cancelled.
 */
export function canSetJobState(from: JobState, to: StaffState | "taken up again"): boolean {
  switch (to) {
    case "in build":
      return from === "approved";
    case "handed over":
      return from === "in build";
    case "closed":
      return from === "handed over";
    case "on hold":
      return isUnderWay(from);
    case "cancelled":
      return isUnderWay(from) || from === "on hold";
    case "taken up again":
      return from === "on hold";
  }
}

/**
 * Whether work on the mockup and new revisions make sense in this state. A job in build can still be changed: by a new
 * revision.
 */
export function canIssue(state: JobState, revisions: readonly RevisionInRow[]): boolean {
  return isUnderWay(state) && !revisions.some((revision) => revision.state === "preparing");
}

function isUnderWay(state: JobState): boolean {
  return state !== "handed over" && state !== "closed" && state !== "on hold" && state !== "cancelled";
}
