import { type JobFacts, jobState } from "./job-states.ts";
import { letterToIssue, revisionApproved, revisionOut } from "./revision-row.ts";

export type Move = "ours" | "client" | "nobody";

export type MoveFacts = JobFacts & {
  /** Whether the brief went to the client to be filled in. */
  readonly briefSent: boolean;
  /** Open notes of the client that wait on the shop (see waitsOnShop). */
  readonly openClientNotes: number;
  /** Whether somebody on the client's side has opened the revision that is out. */
  readonly openedByClient: boolean;
  readonly depositOwed: boolean;
};

/** What is to be done next, for the one button at the top of a job. */
export type NextAction =
  | "fill in the brief"
  | "wait for the brief"
  | "start the mockup"
  | "wait for the PDF"
  | "issue again"
  | "answer the notes"
  | "change the mockup"
  | "wait for the decision"
  | "wait for the deposit"
  | "build"
  | "close"
  | "nothing";

export type NextStep = { readonly move: Move; readonly reason: string; readonly action: NextAction };

/** Whose move it is, with the reason as the Bench shows it. */
export function whoseMove(facts: MoveFacts): { readonly move: Move; readonly reason: string } {
  const { move, reason } = nextStep(facts);
  return { move, reason };
}

/** Whose move it is, why, and what to do. */
export function nextStep(facts: MoveFacts): NextStep {
  switch (jobState(facts)) {
    case "on hold":
      return { move: "nobody", reason: "On hold", action: "nothing" };
    case "cancelled":
      return { move: "nobody", reason: "Cancelled", action: "nothing" };
    case "closed":
      return { move: "nobody", reason: "Closed", action: "nothing" };
    case "handed over":
      return { move: "nobody", reason: "Handed over, close it when nothing is left to do", action: "close" };
    default:
      return stepOfRevisions(facts);
  }
}

function stepOfRevisions(facts: MoveFacts): NextStep {
  const { revisions, openClientNotes } = facts;
  const newest = revisions.at(-1);
  const next = letterToIssue(revisions);
  if (newest?.state === "preparing") {
    return {
      move: "ours",
      reason: `${newest.letter} is being prepared, the client gets it when its PDF stands`,
      action: "wait for the PDF",
    };
  }
  // A draft has a row of its own only after its PDF failed: before that the mockup is the draft.
  if (newest?.state === "draft") {
    return { move: "ours", reason: `The PDF of ${newest.letter} failed, issue it again`, action: "issue again" };
  }
  const out = revisionOut(revisions);
  if (!out) return stepBeforeProof(facts, next);
  if (out.state === "revision asked") {
    return { move: "ours", reason: `Revision asked, change the mockup and issue ${next}`, action: "change the mockup" };
  }
  if (out.state === "approved") return stepAfterApproval(facts);
  if (openClientNotes > 0) {
    const notes = openClientNotes === 1 ? "1 note open, answer it" : `${openClientNotes} notes open, answer them`;
    return { move: "ours", reason: `${notes} or issue ${next}`, action: "answer the notes" };
  }
  const seen = facts.openedByClient ? "opened, no decision yet" : "not opened yet";
  return { move: "client", reason: `${out.letter} is out, ${seen}`, action: "wait for the decision" };
}

function stepBeforeProof({ revisions, briefComplete, briefSent }: MoveFacts, next: string): NextStep {
  const newest = revisions.at(-1);
  if (newest) {
    return { move: "ours", reason: `${newest.letter} was withdrawn, issue ${next}`, action: "change the mockup" };
  }
  if (briefComplete) return { move: "ours", reason: "Brief is complete, start the mockup", action: "start the mockup" };
  if (briefSent) return { move: "client", reason: "The brief is with the client", action: "wait for the brief" };
  return { move: "ours", reason: "Brief has gaps, fill it in", action: "fill in the brief" };
}

function stepAfterApproval(facts: MoveFacts): NextStep {
  const letter = revisionApproved(facts.revisions)?.letter ?? "";
  if (facts.setByStaff === "in build") {
    return { move: "ours", reason: `In build from ${letter}`, action: "build" };
  }
  if (facts.depositOwed) {
    return { move: "client", reason: `${letter} approved, deposit owed`, action: "wait for the deposit" };
  }
  return { move: "ours", reason: `${letter} approved, free to build`, action: "build" };
}
