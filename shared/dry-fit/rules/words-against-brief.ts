import type { Finding } from "../finding.ts";
import { type Letter, lettersOf } from "../lettering.ts";
import { linesOf } from "../reading-lines.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";

const source = "the brief";

/** Rule 26: the sign reads what the brief says, letter by letter; spaces are not cut, so they don't count. */
export const wordsAgainstBrief: Rule = { number: 26, title: "Words", check };

function check(input: RuleInput): Finding[] {
  const wanted = charactersOf(input.context.words);
  if (wanted.length === 0) return [];
  const letters = linesOf(lettersOf(input), input.document.lettering).flat();
  if (letters.length === 0) {
    return [
      foundBy(wordsAgainstBrief, {
        severity: "caution",
        text: `No piece is said to read anything, so nobody has compared the sign with the brief's “${short(input.context.words)}”. Write in the piece list what each letter reads.`,
        source,
      }),
    ];
  }
  const read = letters.flatMap((letter) =>
    charactersOf(letter.piece.reads).map((character) => ({ character, letter })),
  );
  const at = read.findIndex(({ character }, index) => character !== wanted[index]);
  if (at < 0 && read.length === wanted.length) return [];
  return [differenceAt(at < 0 ? read.length : at, read, wanted, input.context.words)];
}

type Read = { readonly character: string; readonly letter: Letter };

function differenceAt(at: number, read: readonly Read[], wanted: readonly string[], words: string): Finding {
  const says = read.map(({ character }) => character).join("");
  const place = read[at] ?? read.at(-1);
  const base = {
    where: place?.letter.figures.centroid ?? null,
    layerKey: place?.letter.layer.key ?? null,
    pieceIds: place ? [place.letter.piece.id] : [],
    source,
  };
  const sorted = (list: readonly string[]) => list.toSorted().join("");
  if (sorted(read.map(({ character }) => character)) === sorted(wanted)) {
    const text = `The sign has the letters of “${short(words)}”, but from the top and the left they read “${short(says)}”. Where they run along an arc or in columns, read them on the drawing and set this aside.`;
    return foundBy(wordsAgainstBrief, { ...base, severity: "stop", text });
  }
  const is = read[at]?.character;
  const shall = wanted[at];
  const what =
    is === undefined
      ? `ends where “${shall ?? ""}” should follow`
      : shall === undefined
        ? `goes on with “${is}” after the last letter`
        : `has “${is}” where the brief has “${shall}”`;
  const text = `The brief reads “${short(words)}”, the sign “${short(says)}”: it ${what}, letter ${at + 1}.`;
  return foundBy(wordsAgainstBrief, { ...base, severity: "stop", text });
}

/** Single characters as they are read, without spaces. */
function charactersOf(text: string): string[] {
  return [...text.normalize("NFC").replace(/\s+/gu, "")];
}

function short(text: string): string {
  const line = text.trim().replace(/\s+/gu, " ");
  return line.length > 60 ? `${line.slice(0, 59)}…` : line;
}
