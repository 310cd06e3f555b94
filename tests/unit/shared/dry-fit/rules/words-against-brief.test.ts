import { describe, expect, it } from "vitest";
import { wordsAgainstBrief } from "#shared/dry-fit/rules/words-against-brief.ts";
import type { MockupDocument, Piece } from "#shared/mockup/document.ts";
import { buildLayer, buildSign, plate } from "../../../../support/build-sign.ts";
import { findingsOf } from "../../../../support/dry-fit.ts";

/** A letter a piece, lines 60 mm apart, in no order that tells anything. */
function sign(...lines: string[]): MockupDocument {
  const pieces: Piece[] = lines.flatMap((line, row) =>
    [...line].flatMap((reads, column) =>
      reads === " " ? [] : [plate(`l${row}-${column}`, 18, 30, [40 + column * 24, 60 + row * 60], { reads })],
    ),
  );
  return buildSign([buildLayer("B", pieces.toReversed())]);
}
const of = (words: string, document: MockupDocument) => findingsOf(wordsAgainstBrief, document, { context: { words } });

describe("fine", () => {
  it.each([
    { words: "ORRERY BOOKS", lines: ["ORRERY", "BOOKS"] },
    { words: "Orrery\nBooks", lines: ["Orrery Books"] },
    { words: "  ORRERY   BOOKS ", lines: ["ORRERY BOOKS"] },
    { words: "Cafe\u0301", lines: ["Café"] },
    { words: "", lines: ["ANYTHING"] },
  ])("“$words” cut as $lines", async ({ words, lines }) => {
    expect(await of(words, sign(...lines))).toEqual([]);
  });
});

describe("a stop that names the letter", () => {
  it.each([
    { words: "ORRERY", lines: ["ORERY"], says: "it has “E” where the brief has “R”, letter 3." },
    { words: "ORRERY", lines: ["ORRERy"], says: "it has “y” where the brief has “Y”, letter 6." },
    { words: "BOOKS", lines: ["BOOK"], says: "it ends where “S” should follow, letter 5." },
    { words: "BOOK", lines: ["BOOKS"], says: "it goes on with “S” after the last letter, letter 5." },
    { words: "MARLOW & PIKE", lines: ["MARLOW PIKE"], says: "it has “P” where the brief has “&”, letter 7." },
  ])("$lines for “$words”", async ({ words, lines, says }) => {
    const [finding, ...others] = await of(words, sign(...lines));
    expect(others).toEqual([]);
    expect(finding).toMatchObject({ rule: 26, severity: "stop", layerKey: "B" });
    expect(finding?.text).toContain(says);
    expect(finding?.where).not.toBeNull();
  });

  it("the right letters in another order are told apart from a wrong letter", async () => {
    const [finding] = await of("PIKE", sign("KEPI"));
    expect(finding?.severity).toBe("stop");
    expect(finding?.text).toContain("they read “KEPI”");
  });
});

it("a piece may read a whole word", async () => {
  const word = buildSign([buildLayer("B", [plate("w", 120, 30, [200, 100], { reads: "Orrery Books" })])]);
  expect(await of("Orrery Books", word)).toEqual([]);
});

it("letters of one line need not stand quite level, and tall ones stay in their line", async () => {
  const pieces = [
    plate("d", 18, 40, [40, 95], { reads: "d" }),
    plate("o", 18, 20, [64, 105], { reads: "o" }),
    plate("g", 18, 30, [88, 110], { reads: "g" }),
  ];
  expect(await of("dog", buildSign([buildLayer("B", pieces)]))).toEqual([]);
});

it("nothing that reads is a caution, since nobody has looked", async () => {
  const mute = buildSign([buildLayer("B", [plate("p", 20, 30, [300, 200])])]);
  expect(await of("ORRERY", mute)).toMatchObject([{ severity: "caution" }]);
  expect(await of("", mute)).toEqual([]);
});
