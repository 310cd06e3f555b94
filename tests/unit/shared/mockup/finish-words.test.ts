import { expect, it } from "vitest";
import type { Coat } from "#shared/mockup/document.ts";
import { finishWords } from "#shared/mockup/finish-words.ts";

const satin: Coat = { kind: "clear coat", name: "Clear satin", base: "water-borne", dryingHours: 2 };

it.each<{ coats: Coat[]; words: string }>([
  { coats: [], words: "bare" },
  { coats: [satin], words: "Clear satin" },
  {
    coats: [{ kind: "sanding", grit: 180 }, satin, { ...satin, dryingHours: 12 }],
    words: "sanded to 180, Clear satin, 2 coats",
  },
  { coats: [satin, { kind: "sanding", grit: 320 }, satin], words: "Clear satin, sanded to 320, Clear satin" },
])("$words", ({ coats, words }) => {
  expect(finishWords(coats)).toBe(words);
});
