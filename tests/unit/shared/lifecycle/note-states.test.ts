import { expect, it } from "vitest";
import {
  asksAtApproval,
  canMoveNote,
  noteKinds,
  noteStateAfterReply,
  noteStates,
  waitsOnShop,
} from "#shared/lifecycle/note-states.ts";

const actors = [
  { who: "the shop", actor: { side: "shop", isAuthor: false } },
  { who: "an author in the shop", actor: { side: "shop", isAuthor: true } },
  { who: "another contact", actor: { side: "client", isAuthor: false } },
  { who: "the author", actor: { side: "client", isAuthor: true } },
  { who: "the approver in approving", actor: { side: "client", isAuthor: false, approving: true } },
] as const;
const allowed = new Set([
  "open answered the shop",
  "open answered an author in the shop",
  "open settled an author in the shop",
  "open settled the author",
  "open settled the approver in approving",
  "answered settled an author in the shop",
  "answered settled the author",
  "answered settled the approver in approving",
  ...actors.flatMap(({ who }) => [`answered open ${who}`, `settled open ${who}`]),
]);

it.each(
  actors.flatMap(({ who, actor }) => noteStates.flatMap((from) => noteStates.map((to) => ({ from, to, who, actor })))),
)("a note goes from $from to $to by $who only where it may", ({ from, to, who, actor }) => {
  expect(canMoveNote(from, to, actor)).toBe(allowed.has(`${from} ${to} ${who}`));
});

it.each([
  { state: "open", side: "shop", after: "answered" },
  { state: "answered", side: "shop", after: "answered" },
  { state: "settled", side: "shop", after: "settled" },
  { state: "open", side: "client", after: "open" },
  { state: "answered", side: "client", after: "open" },
  { state: "settled", side: "client", after: "settled" },
] as const)("a reply by the $side makes a note that is $state $after", ({ state, side, after }) => {
  expect(noteStateAfterReply(state, side)).toBe(after);
});

const notes = noteKinds.flatMap((kind) =>
  noteStates.flatMap((state) =>
    (["shop", "client"] as const).flatMap((side) => [true, false].map((shopOnly) => ({ kind, state, side, shopOnly }))),
  ),
);

it.each(notes)("a $kind note, $state, of the $side, shop only $shopOnly", (note) => {
  const { kind, state, side, shopOnly } = note;
  const counts = ["must change", "question"].includes(kind) && state === "open" && side === "client" && !shopOnly;
  expect(waitsOnShop(note)).toBe(counts);
  expect(asksAtApproval(note)).toBe(kind === "must change" && state === "open" && !shopOnly);
});
