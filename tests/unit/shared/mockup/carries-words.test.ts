import { expect, it } from "vitest";
import { carriesWords } from "#shared/mockup/carries-words.ts";

it.each([
  { name: "Heron rings", texts: ["HERON & WEIR"], carries: true },
  { name: "Night disc", texts: ["HERON & WEIR"], carries: false },
  // A word within a word counts: better a neutral name too many.
  { name: "Weirwater", texts: ["", "HERON\nWEIR"], carries: true },
  // Full-width letters are the same letters (Unicode NFKC).
  { name: "ＨＥＲＯＮ", texts: ["heron"], carries: true },
  { name: "Layer of oak", texts: ["O & R of"], carries: false },
  { name: "", texts: ["HERON"], carries: false },
  { name: "Heron", texts: [], carries: false },
])("“$name” carries a word of $texts: $carries", ({ name, texts, carries }) => {
  expect(carriesWords(name, texts)).toBe(carries);
});
