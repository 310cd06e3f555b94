import { expect, it } from "vitest";
import { draftGaps, emptyDraft, readNoteDraft } from "@/features/notes/model/note-draft.ts";

it("an empty draft lacks place, kind and words", () => {
  expect(Object.keys(draftGaps(emptyDraft))).toEqual(["anchor", "kind", "text"]);
});

it("blanks are no words, and 4001 characters are too many", () => {
  const draft = { ...emptyDraft, kind: "question", anchor: { on: "whole" } } as const;
  expect(draftGaps({ ...draft, text: " \n " })).toEqual({ text: "Write something first." });
  expect(draftGaps({ ...draft, text: "x".repeat(4001) })).toEqual({ text: "At most 4000 characters." });
  expect(draftGaps({ ...draft, text: "x".repeat(4000) })).toEqual({});
});

it.each([null, "text", { text: 7 }, { text: "a", kind: "loud", anchor: null, shopOnly: false }])(
  "what is no draft is not taken up: %j",
  (stored) => {
    expect(readNoteDraft(stored)).toBeNull();
  },
);

it("a draft comes back from its text as it was", () => {
  const draft = {
    text: "Wider, please",
    kind: "must change",
    anchor: { on: "spot", x: 1.5, y: 2, layerKey: "B", pieceId: null },
    shopOnly: false,
  } as const;
  expect(readNoteDraft(JSON.parse(JSON.stringify(draft)))).toEqual(draft);
});
