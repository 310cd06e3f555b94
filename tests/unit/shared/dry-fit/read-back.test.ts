import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { isAlike, readBack } from "#shared/dry-fit/read-back.ts";

/** Letters in reading order, a piece each. */
const signOf = (texts: readonly string[]) => texts.map((reads, index) => ({ piece: { id: `p${index}`, reads } }));
/** Each cell as "brief/sign", words parted by spaces and lines by bars. */
const shown = (brief: string, sign: string): string =>
  readBack(brief, signOf([...sign]))
    .lines.map(({ words }) =>
      words
        .map((word) =>
          word.map((cell) => (isAlike(cell) ? cell.brief : `[${cell.brief ?? ""}/${cell.sign?.text ?? ""}]`)).join(""),
        )
        .join(" "),
    )
    .join(" | ");

describe("the sign beside the brief", () => {
  it.each([
    { brief: "ORRERY BOOKS", sign: "ORRERYBOOKS", read: "ORRERY BOOKS" },
    { brief: "Orrery\nBooks & Maps", sign: "OrreryBooks&Maps", read: "Orrery | Books & Maps" },
    { brief: "ORRERY", sign: "ORERY", read: "OR[R/]ERY" },
    { brief: "ORRERY", sign: "ORRERy", read: "ORRER[Y/y]" },
    { brief: "BOOK", sign: "BOOKS", read: "BOOK[/S]" },
    { brief: "BOOK END", sign: "BOOKSEND", read: "BOOK[/S] END" },
    { brief: "PIKE", sign: "", read: "[P/][I/][K/][E/]" },
    { brief: "", sign: "PIKE", read: "[/P][/I][/K][/E]" },
    { brief: "Cafe\u0301", sign: "Café", read: "Café" },
  ])("$brief cut as $sign", ({ brief, sign, read }) => {
    expect(shown(brief, sign)).toBe(read);
  });

  it("counts letters and differences", () => {
    expect(readBack("ORRERY", signOf([..."ORXERYS"]))).toMatchObject({ letters: 7, differences: 2 });
    expect(readBack("", [])).toEqual({ lines: [], letters: 0, differences: 0 });
  });

  it("reads a piece that is a whole word letter by letter", () => {
    const { lines, differences } = readBack("IN THE", signOf(["In", "the"]));
    expect(differences).toBe(4);
    expect(lines[0]?.words[1]?.map(({ sign }) => sign?.pieceId)).toEqual(["p1", "p1", "p1"]);
  });

  it("has every letter of both once, in order, and no more differences than letters", () => {
    const text = fc.string({ unit: fc.constantFrom("A", "B", "C", " ", "\n"), maxLength: 24 });
    fc.assert(
      fc.property(text, text, (brief, sign) => {
        const bare = (of: string) => of.replace(/\s/g, "");
        const read = readBack(brief, signOf([...bare(sign)]));
        const cells = read.lines.flatMap(({ words }) => words.flat());
        expect(cells.map((cell) => cell.brief ?? "").join("")).toBe(bare(brief));
        expect(cells.map((cell) => cell.sign?.text ?? "").join("")).toBe(bare(sign));
        expect(read.differences).toBeLessThanOrEqual(Math.max(bare(brief).length, bare(sign).length));
        expect(read.differences === 0).toBe(bare(brief) === bare(sign));
      }),
      { numRuns: 300 },
    );
  });
});
