import { expect, it } from "vitest";
import { doNotCut, letterToIssue, revisionApproved, revisionOut } from "#shared/lifecycle/revision-row.ts";
import type { RevisionState } from "#shared/lifecycle/revision-states.ts";

const letters = ["A", "B", "C"];
const row = (...states: RevisionState[]) => states.map((state, index) => ({ letter: letters[index] ?? "", state }));

it.each([
  { states: [], out: null, approved: null, next: "A", warning: null },
  { states: ["preparing"], out: null, approved: null, next: "B", warning: null },
  { states: ["draft"], out: null, approved: null, next: "A", warning: null },
  { states: ["issued"], out: "A", approved: null, next: "B", warning: null },
  { states: ["revision asked", "preparing"], out: "A", approved: null, next: "C", warning: null },
  { states: ["superseded", "issued"], out: "B", approved: null, next: "C", warning: null },
  { states: ["superseded", "withdrawn"], out: null, approved: null, next: "C", warning: null },
  { states: ["approved"], out: "A", approved: "A", next: "B", warning: null },
  { states: ["approved", "issued"], out: "B", approved: "A", next: "C", warning: "Do not cut: B is out" },
  { states: ["approved", "revision asked"], out: "B", approved: "A", next: "C", warning: "Do not cut: B is out" },
  { states: ["approved", "withdrawn"], out: "A", approved: "A", next: "C", warning: null },
  { states: ["superseded", "approved"], out: "B", approved: "B", next: "C", warning: null },
  { states: ["approved", "draft"], out: "A", approved: "A", next: "B", warning: null },
] satisfies {
  states: RevisionState[];
  out: string | null;
  approved: string | null;
  next: string;
  warning: string | null;
}[])("of revisions $states $out is out, $approved approved, $next comes next", ({ states, ...expected }) => {
  const revisions = row(...states);
  expect(revisionOut(revisions)?.letter ?? null).toBe(expected.out);
  expect(revisionApproved(revisions)?.letter ?? null).toBe(expected.approved);
  expect(letterToIssue(revisions)).toBe(expected.next);
  expect(doNotCut(revisions)).toBe(expected.warning);
});
