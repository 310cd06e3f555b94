import { describe, expect, it } from "vitest";
import {
  canDecide,
  canMoveRevision,
  canWithdraw,
  type RevisionState,
  revisionStates,
  stateAfterLater,
  takesNotes,
  visibleToClient,
} from "#shared/lifecycle/revision-states.ts";

const arrows = [
  "draft → preparing",
  "preparing → issued",
  "preparing → draft",
  "issued → approved",
  "issued → revision asked",
  "issued → superseded",
  "issued → withdrawn",
  "approved → superseded",
  "revision asked → superseded",
];
const pairs = revisionStates.flatMap((from) => revisionStates.map((to) => ({ from, to })));

it("there are seven states", () => {
  expect(revisionStates).toHaveLength(7);
});

it.each(pairs)("$from to $to is a move only along the nine arrows", ({ from, to }) => {
  expect(canMoveRevision(from, to)).toBe(arrows.includes(`${from} → ${to}`));
});

describe.each<{ state: RevisionState; seen: boolean; notes: boolean; decide: boolean; withdraw: boolean }>([
  { state: "draft", seen: false, notes: false, decide: false, withdraw: false },
  { state: "preparing", seen: false, notes: false, decide: false, withdraw: false },
  { state: "issued", seen: true, notes: true, decide: true, withdraw: true },
  { state: "approved", seen: true, notes: false, decide: false, withdraw: false },
  { state: "revision asked", seen: true, notes: true, decide: false, withdraw: false },
  { state: "superseded", seen: true, notes: false, decide: false, withdraw: false },
  { state: "withdrawn", seen: false, notes: false, decide: false, withdraw: false },
])("a revision in state $state", ({ state, seen, notes, decide, withdraw }) => {
  it(`is ${seen ? "seen" : "not seen"} by the client`, () => expect(visibleToClient(state)).toBe(seen));
  it(`${notes ? "takes" : "takes no"} notes`, () => expect(takesNotes(state)).toBe(notes));
  it(`${decide ? "can" : "can't"} be decided on`, () => expect(canDecide(state)).toBe(decide));
  it(`${withdraw ? "can" : "can't"} be withdrawn`, () => expect(canWithdraw(state)).toBe(withdraw));
});

it.each(pairs)("an earlier revision that is $from, when a later one is $to", ({ from, to }) => {
  const superseded =
    (to === "issued" && (from === "issued" || from === "revision asked")) || (to === "approved" && from === "approved");
  expect(stateAfterLater(from, to)).toBe(superseded ? "superseded" : from);
  if (superseded) expect(canMoveRevision(from, "superseded")).toBe(true);
});
