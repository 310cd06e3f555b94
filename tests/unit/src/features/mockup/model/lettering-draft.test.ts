import { describe, expect, it } from "vitest";
import type { Lettering } from "#shared/mockup/document.ts";
import {
  changedDraft,
  draftOfLettering,
  newLetteringDraft,
  settingOfDraft,
  usualLineSpacing,
} from "@/features/mockup/model/lettering-draft.ts";
import { missingWords, shortWords, touchingWords } from "@/features/mockup/model/lettering-words.ts";
import { emptyMockup } from "../sample-mockup.ts";

const set: Lettering = {
  id: "w",
  words: "ORRERY\nBOOKS",
  face: "bitter-700",
  fontSha256: "c".repeat(64),
  capHeight: 30,
  letterSpacing: 1,
  kerning: false,
  lineSpacing: 55,
  align: "right",
  along: { kind: "arc", radius: 210, side: "under" },
};

describe("what new lettering begins with", () => {
  it.each([
    { brief: "ORRERY\nBOOKS", on: [], words: "ORRERY" },
    { brief: " ORRERY \r\n\r\nBOOKS", on: ["ORRERY"], words: "BOOKS" },
    { brief: "ORRERY\nBOOKS", on: ["ORRERY\nBOOKS"], words: "ORRERY" },
    { brief: "", on: [], words: "" },
  ])("$words for $brief with $on on the board", ({ brief, on, words }) => {
    const lettering = on.map((one, index) => ({ ...set, id: `w${index}`, words: one }));
    expect(newLetteringDraft(emptyMockup({ lettering }), brief).words).toBe(words);
  });

  it("is a tenth of the board's shorter side high, and never too small to be set", () => {
    const board = emptyMockup().board;
    expect(newLetteringDraft(emptyMockup(), "A").capHeight).toBe(40);
    expect(newLetteringDraft(emptyMockup({ board: { ...board, width: 70, height: 52 } }), "A").capHeight).toBe(5);
    const tiny = newLetteringDraft(emptyMockup({ board: { ...board, width: 20, height: 20 } }), "A");
    expect(tiny.capHeight).toBe(2);
    expect(settingOfDraft(tiny)).not.toBeNull();
  });
});

describe("the space from line to line", () => {
  it("follows the cap height until somebody gives it", () => {
    const draft = newLetteringDraft(emptyMockup(), "A\nB");
    expect(draft.lineSpacing).toBe(64);
    expect(changedDraft(draft, { capHeight: 50 }).lineSpacing).toBe(80);
    const own = changedDraft(draft, { lineSpacing: 70 });
    expect(changedDraft(own, { capHeight: 50 }).lineSpacing).toBe(70);
    expect(changedDraft(draft, { capHeight: Number.NaN }).lineSpacing).toBe(64);
  });
});

describe("a draft as a setting", () => {
  it("is that of the lettering it was made of", () => {
    const { id, face, fontSha256, ...setting } = set;
    expect(settingOfDraft(draftOfLettering(set, 600))).toEqual(setting);
    expect([id, face, fontSha256.length]).toEqual(["w", "bitter-700", 64]);
  });

  it.each([
    { words: " \n " },
    { words: "A".repeat(501) },
    { capHeight: null },
    { capHeight: 1.9 },
    { letterSpacing: Number.NaN },
    { lineSpacing: 0 },
    { radius: null },
  ])("is none with %o", (change) => {
    expect(settingOfDraft({ ...draftOfLettering(set, 600), ...change })).toBeNull();
  });

  it("asks for no radius on a straight line, and for no line spacing on one", () => {
    const draft = {
      ...draftOfLettering(set, 600),
      words: "ONE",
      along: "line" as const,
      radius: null,
      lineSpacing: null,
    };
    expect(settingOfDraft(draft)).toMatchObject({ along: { kind: "line" }, lineSpacing: usualLineSpacing(30) });
  });

  it("takes the first face for one that is no longer shipped", () => {
    expect(draftOfLettering({ ...set, face: "gone-400" }, 600).face).toBe("montserrat-600");
  });
});

describe("what is amiss, in words", () => {
  it("names missing letters with their numbers", () => {
    expect(missingWords([], "Bitter")).toBeNull();
    expect(missingWords(["Ж", "→"], "Bitter")).toBe(
      "Bitter has no letter for Ж (U+0416) and → (U+2192). Choose another face, or write it with other letters.",
    );
  });

  it("names pairs that touch, the first of them", () => {
    const letters = [..."abcdefghi"].map((reads, letter) => ({
      letter,
      reads,
      path: [],
      laid: { x: 0, y: 0, turn: 0 },
    }));
    expect(touchingWords({ letters, touching: [] })).toBeNull();
    expect(touchingWords({ letters, touching: [[1, 2]] })).toMatch(/^Two letters run into each other: bc\. /);
    const many = Array.from({ length: 8 }, (_, index) => [index, index + 1] as const);
    expect(touchingWords({ letters, touching: many })).toMatch(/: ab, bc, cd, de, ef, fg and 2 more\. /);
  });

  it("shortens long words, and puts lines in one", () => {
    expect(shortWords("ORRERY\n BOOKS")).toBe("ORRERY BOOKS");
    expect(shortWords("A".repeat(40))).toBe(`${"A".repeat(27)}…`);
  });
});
