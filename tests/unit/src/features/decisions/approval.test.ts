import { expect, it } from "vitest";
import {
  approvalGaps,
  currentOf,
  emptyApproval,
  isAnotherName,
  isComplete,
  isStopped,
  shortHash,
} from "@/features/decisions/model/approval.ts";

const asked = {
  acknowledgements: [{ id: "words" }, { id: "size" }],
  notes: [{ id: "n1" }, { id: "n4" }],
};
const full = {
  acknowledgedIds: ["size", "words"],
  answers: { n1: "settled", n4: "settled" },
  typedName: "Cleo Marsh",
  consentToPortfolio: false,
} as const;

it("nothing ticked: everything that is asked is missing", () => {
  const gaps = approvalGaps(emptyApproval, asked);
  expect(gaps).toEqual({ acknowledgements: ["words", "size"], notes: ["n1", "n4"], typedName: true });
  expect(isComplete(gaps)).toBe(false);
});

it.each([
  { name: "one acknowledgement", approval: { ...full, acknowledgedIds: ["size"] } },
  { name: "one note's answer", approval: { ...full, answers: { n1: "settled" as const } } },
  { name: "a name of blanks", approval: { ...full, typedName: "  " } },
])("$name missing is enough to hold it back", ({ approval }) => {
  expect(isComplete(approvalGaps(approval, asked))).toBe(false);
});

it("all ticked, answered and named is complete, portfolio or not", () => {
  expect(isComplete(approvalGaps(full, asked))).toBe(true);
  expect(isComplete(approvalGaps({ ...full, consentToPortfolio: true }, asked))).toBe(true);
});

it("a note said to be unsettled stops it, one that is asked no longer does not", () => {
  expect(isStopped({ ...full, answers: { n1: "stop", n4: "settled" } }, asked.notes)).toBe(true);
  expect(isStopped({ ...full, answers: { n9: "stop", n1: "settled" } }, asked.notes)).toBe(false);
});

it("a hash is shown by its ends", () => {
  expect(shortHash("3f9a22c1aa00bb11cc22dd33ee44ff5566778899aabbccddeeff00112233 07be".replace(" ", ""))).toBe(
    "3f9a 22c1 … 07be",
  );
});

it.each([undefined, {}, { current: null }, { current: "B" }, { current: { revisionId: 7, letter: "B" } }])(
  "an answer without a current letter leads nowhere: %j",
  (extra) => {
    expect(currentOf(extra)).toBeNull();
  },
);

it("the current letter is read from the answer", () => {
  const current = { revisionId: "6d5f1a7e-31c7-4a6d-8f0e-b8f2f1f0a922", letter: "C" };
  expect(currentOf({ current })).toEqual(current);
});

it.each([
  { typed: "Cleo Marsh", own: "Cleo Marsh", another: false },
  { typed: "  cleo  MARSH ", own: "Cleo Marsh", another: false },
  { typed: "C. J. Marsh", own: "Cleo Marsh", another: false },
  { typed: "Cléo", own: "Cleo Marsh", another: false },
  { typed: "Marsh-Hale", own: "Cleo Marsh", another: false },
  { typed: "Somebody Else", own: "Cleo Marsh", another: true },
  { typed: "C. M.", own: "Cleo Marsh", another: true },
  { typed: "…", own: "Cleo Marsh", another: true },
])("“$typed” signing for $own is another's name: $another", ({ typed, own, another }) => {
  expect(isAnotherName(typed, own)).toBe(another);
});
