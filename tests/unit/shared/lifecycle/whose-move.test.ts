import fc from "fast-check";
import { expect, it } from "vitest";
import { staffStates } from "#shared/lifecycle/job-states.ts";
import { type RevisionState, revisionStates } from "#shared/lifecycle/revision-states.ts";
import { type Move, type MoveFacts, nextStep, whoseMove } from "#shared/lifecycle/whose-move.ts";

const row = (...states: RevisionState[]) =>
  states.map((state, index) => ({ letter: ["A", "B", "C", "D"][index] ?? "", state }));

const facts = (overrides: Partial<MoveFacts>): MoveFacts => ({
  briefComplete: true,
  briefSent: false,
  revisions: [],
  setByStaff: null,
  openClientNotes: 0,
  openedByClient: false,
  depositOwed: false,
  ...overrides,
});

it.each<{ when: string; given: Partial<MoveFacts>; move: Move; reason: string; action: string }>([
  {
    when: "the brief has gaps and was sent",
    given: { briefComplete: false, briefSent: true },
    move: "client",
    reason: "The brief is with the client",
    action: "wait for the brief",
  },
  {
    when: "the brief has gaps and was not sent",
    given: { briefComplete: false },
    move: "ours",
    reason: "Brief has gaps, fill it in",
    action: "fill in the brief",
  },
  {
    when: "the brief is complete",
    given: { briefSent: true },
    move: "ours",
    reason: "Brief is complete, start the mockup",
    action: "start the mockup",
  },
  {
    when: "A is being prepared",
    given: { revisions: row("preparing"), briefComplete: false, briefSent: true },
    move: "ours",
    reason: "A is being prepared, the client gets it when its PDF stands",
    action: "wait for the PDF",
  },
  {
    when: "the PDF of A failed",
    given: { revisions: row("draft") },
    move: "ours",
    reason: "The PDF of A failed, issue it again",
    action: "issue again",
  },
  {
    when: "the PDF of B failed while A is out",
    given: { revisions: row("issued", "draft") },
    move: "ours",
    reason: "The PDF of B failed, issue it again",
    action: "issue again",
  },
  {
    when: "A is out and was not opened",
    given: { revisions: row("issued") },
    move: "client",
    reason: "A is out, not opened yet",
    action: "wait for the decision",
  },
  {
    when: "C is out and was opened",
    given: { revisions: row("superseded", "withdrawn", "issued"), openedByClient: true },
    move: "client",
    reason: "C is out, opened, no decision yet",
    action: "wait for the decision",
  },
  {
    when: "one note of the client is open",
    given: { revisions: row("issued"), openClientNotes: 1 },
    move: "ours",
    reason: "1 note open, answer it or issue B",
    action: "answer the notes",
  },
  {
    when: "two notes of the client are open",
    given: { revisions: row("superseded", "issued"), openClientNotes: 2, openedByClient: true },
    move: "ours",
    reason: "2 notes open, answer them or issue C",
    action: "answer the notes",
  },
  {
    when: "a revision is asked",
    given: { revisions: row("revision asked"), openClientNotes: 3 },
    move: "ours",
    reason: "Revision asked, change the mockup and issue B",
    action: "change the mockup",
  },
  {
    when: "B was withdrawn",
    given: { revisions: row("superseded", "withdrawn") },
    move: "ours",
    reason: "B was withdrawn, issue C",
    action: "change the mockup",
  },
  {
    when: "A is approved and a deposit owed",
    given: { revisions: row("approved"), depositOwed: true },
    move: "client",
    reason: "A approved, deposit owed",
    action: "wait for the deposit",
  },
  {
    when: "A is approved and free to build",
    given: { revisions: row("approved") },
    move: "ours",
    reason: "A approved, free to build",
    action: "build",
  },
  {
    when: "A is approved and B was withdrawn",
    given: { revisions: row("approved", "withdrawn") },
    move: "ours",
    reason: "A approved, free to build",
    action: "build",
  },
  {
    when: "A is approved and B is out",
    given: { revisions: row("approved", "issued") },
    move: "client",
    reason: "B is out, not opened yet",
    action: "wait for the decision",
  },
  {
    when: "in build",
    given: { revisions: row("approved"), setByStaff: "in build", depositOwed: true },
    move: "ours",
    reason: "In build from A",
    action: "build",
  },
  {
    when: "handed over",
    given: { revisions: row("approved"), setByStaff: "handed over" },
    move: "nobody",
    reason: "Handed over, close it when nothing is left to do",
    action: "close",
  },
  { when: "closed", given: { setByStaff: "closed" }, move: "nobody", reason: "Closed", action: "nothing" },
  {
    when: "on hold with notes open",
    given: { revisions: row("issued"), openClientNotes: 2, setByStaff: "on hold" },
    move: "nobody",
    reason: "On hold",
    action: "nothing",
  },
  { when: "cancelled", given: { setByStaff: "cancelled" }, move: "nobody", reason: "Cancelled", action: "nothing" },
])("when $when the move is $move: $reason", ({ given, move, reason, action }) => {
  expect(nextStep(facts(given))).toEqual({ move, reason, action });
  expect(whoseMove(facts(given))).toEqual({ move, reason });
});

it("there is always a move and a reason, whatever the facts", () => {
  const states = fc.array(fc.constantFrom(...revisionStates), { maxLength: 4 }).map((list) => row(...list));
  const any = fc.record({
    briefComplete: fc.boolean(),
    briefSent: fc.boolean(),
    revisions: states,
    setByStaff: fc.constantFrom(null, ...staffStates),
    openClientNotes: fc.nat(5),
    openedByClient: fc.boolean(),
    depositOwed: fc.boolean(),
  });
  fc.assert(
    fc.property(any, (given) => {
      const { move, reason } = whoseMove(given);
      expect(["ours", "client", "nobody"]).toContain(move);
      expect(reason.length).toBeGreaterThan(5);
      expect(reason).not.toMatch(/undefined|null/);
      if (given.setByStaff && given.setByStaff !== "in build") expect(move).toBe("nobody");
    }),
  );
});
