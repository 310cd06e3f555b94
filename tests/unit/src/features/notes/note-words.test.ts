import { expect, it } from "vitest";
import { balloonName, countWords, noteTone, placeWords } from "@/features/notes/model/note-words.ts";

const names = new Map([["p7", "Gold ring"]]);
const spot = { on: "spot", x: 10, y: 20, layerKey: null, pieceId: null } as const;

it.each([
  { anchor: { on: "whole" } as const, zone: null, words: "the whole sign" },
  { anchor: spot, zone: "B3", words: "zone B3" },
  { anchor: spot, zone: null, words: "a spot on the drawing" },
  { anchor: { ...spot, layerKey: "C", pieceId: "p7" }, zone: "B3", words: "zone B3, Gold ring on layer C" },
  { anchor: { ...spot, layerKey: "C", pieceId: "gone" }, zone: "B3", words: "zone B3, on layer C" },
])("a note is found at: $words", ({ anchor, zone, words }) => {
  expect(placeWords({ anchor, zone }, names)).toBe(words);
});

it("states are counted in the order of their life, those without a note left out", () => {
  const notes = (["settled", "open", "settled"] as const).map((state) => ({ state }));
  expect(countWords(notes)).toBe("1 open, 2 settled");
  expect(countWords([])).toBe("none yet");
});

it("a settled note is drawn as settled, whatever it asked", () => {
  expect(noteTone({ kind: "must change", state: "settled" })).toBe("settled");
  expect(noteTone({ kind: "must change", state: "answered" })).toBe("must");
});

it("a balloon's name says kind and state in words", () => {
  expect(balloonName({ number: 12, kind: "question", state: "open", zone: "D6" })).toBe(
    "Note 12, zone D6: question, open",
  );
});
