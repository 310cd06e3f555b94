import { expect, it } from "vitest";
import {
  canIssue,
  canSetJobState,
  jobState,
  jobStates,
  type StaffState,
  staffStates,
} from "#shared/lifecycle/job-states.ts";
import type { RevisionState } from "#shared/lifecycle/revision-states.ts";

const row = (...states: RevisionState[]) =>
  states.map((state, index) => ({ letter: ["A", "B", "C"][index] ?? "", state }));

it.each([
  { briefComplete: false, states: [], state: "brief" },
  { briefComplete: true, states: [], state: "mockup" },
  { briefComplete: false, states: ["preparing"], state: "mockup" },
  { briefComplete: true, states: ["draft"], state: "mockup" },
  { briefComplete: true, states: ["issued"], state: "out for proof" },
  { briefComplete: true, states: ["revision asked"], state: "revision asked" },
  { briefComplete: true, states: ["revision asked", "preparing"], state: "revision asked" },
  { briefComplete: true, states: ["superseded", "issued"], state: "out for proof" },
  { briefComplete: true, states: ["superseded", "withdrawn"], state: "mockup" },
  { briefComplete: true, states: ["approved"], state: "approved" },
  { briefComplete: true, states: ["approved", "issued"], state: "out for proof" },
  { briefComplete: true, states: ["approved", "withdrawn"], state: "approved" },
] satisfies { briefComplete: boolean; states: RevisionState[]; state: string }[])(
  "with a brief that is complete: $briefComplete and revisions $states a job is in $state",
  ({ briefComplete, states, state }) => {
    expect(jobState({ briefComplete, revisions: row(...states), setByStaff: null })).toBe(state);
  },
);

it.each(staffStates)("what staff set comes before the revisions: %s", (setByStaff) => {
  expect(jobState({ briefComplete: true, revisions: row("approved", "issued"), setByStaff })).toBe(setByStaff);
});

const allowed: Record<StaffState | "taken up again", string[]> = {
  "in build": ["approved"],
  "handed over": ["in build"],
  closed: ["handed over"],
  "on hold": ["brief", "mockup", "out for proof", "revision asked", "approved", "in build"],
  cancelled: ["brief", "mockup", "out for proof", "revision asked", "approved", "in build", "on hold"],
  "taken up again": ["on hold"],
};
const targets = [...staffStates, "taken up again" as const];

it.each(jobStates.flatMap((from) => targets.map((to) => ({ from, to }))))(
  "a job in $from set to $to",
  ({ from, to }) => {
    expect(canSetJobState(from, to)).toBe(allowed[to].includes(from));
  },
);

it.each(jobStates)("a job in %s takes a new revision only while it is under way", (state) => {
  const underWay = !["handed over", "closed", "on hold", "cancelled"].includes(state);
  expect(canIssue(state, row("issued"))).toBe(underWay);
  expect(canIssue(state, row("issued", "preparing"))).toBe(false);
});
