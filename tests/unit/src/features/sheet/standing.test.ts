import { expect, it } from "vitest";
import { isHeld, standingOf } from "@/features/sheet/model/standing.ts";

const approver = { name: "Cleo Marsh", side: "client", approver: true } as const;
const colleague = { name: "Ned Marsh", side: "client", approver: false } as const;
const maker = { name: "Ada Finch", side: "shop", approver: false } as const;

it.each([
  { reader: approver, words: "waiting for you" },
  { reader: colleague, words: "waiting for your approver" },
  { reader: maker, words: "waiting for the client" },
])("an issued revision tells $reader.name: $words", ({ reader, words }) => {
  expect(standingOf({ state: "issued", decision: null, letter: "B" }, reader)).toEqual({
    words: `not yet: ${words}`,
    alone: words,
    tone: "waiting",
  });
});

it.each([
  { reader: approver, words: "the shop is answering", tone: "waiting" },
  { reader: colleague, words: "the shop is answering", tone: "waiting" },
  { reader: maker, words: "notes to answer", tone: "ours" },
])("an issued revision with a note that waits on the shop tells $reader.name: $words", ({ reader, words, tone }) => {
  expect(standingOf({ state: "issued", decision: null, letter: "B" }, reader, 1)).toEqual({
    words: `not yet: ${words}`,
    alone: words,
    tone,
  });
});

it("a revision that is asked for is named as what keeps the approval away", () => {
  expect(standingOf({ state: "revision asked", decision: null, letter: "B" }, approver)).toEqual({
    words: "not yet: a revision is asked for",
    alone: "a revision is asked for",
    tone: "ours",
  });
});

it("an approved revision shows the name that was typed, not the account's", () => {
  const decision = {
    kind: "approved",
    by: "cleo",
    typedName: "Cleo J. Marsh",
    summary: "",
    at: "2026-11-30T09:12:00.000Z",
    hasCertificate: true,
  } as const;
  expect(standingOf({ state: "approved", decision, letter: "B" }, maker)).toEqual({
    words: "Cleo J. Marsh",
    alone: "approved by Cleo J. Marsh",
    tone: "settled",
  });
});

const id = "0b0e9a50-8c4e-4a70-9f37-0d2b8a1f6c11";
const later = { revisionId: "6d5f1a7e-31c7-4a6d-8f0e-b8f2f1f0a922", letter: "B" };

it.each([
  { state: "approved", current: later, held: true },
  { state: "approved", current: null, held: false },
  { state: "approved", current: { revisionId: id, letter: "A" }, held: false },
  { state: "superseded", current: later, held: false },
] as const)("$state with current $current.letter is held back from cutting: $held", ({ state, current, held }) => {
  expect(isHeld({ id, state, current })).toBe(held);
});
