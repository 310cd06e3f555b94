import { faceOf } from "#shared/lettering/faces.ts";
import type { Setting } from "#shared/lettering/lay-words.ts";
import type { Lettering, MockupDocument } from "#shared/mockup/document.ts";
import { longestWords } from "#shared/mockup/lettering-schema.ts";
import { longestMm } from "#shared/mockup/schema-parts.ts";
import { type Bounds, isWithinBounds } from "./length-bounds.ts";

/** Lettering while it is written in a form. null is an empty field, NaN one that can't be read. */
export type LetteringDraft = {
  readonly words: string;
  readonly face: string;
  readonly capHeight: number | null;
  readonly letterSpacing: number | null;
  readonly kerning: boolean;
  readonly lineSpacing: number | null;
  readonly align: Setting["align"];
  readonly along: "line" | "over" | "under";
  readonly radius: number | null;
};

/** What each length may be. Our choice within what a document takes: no letter is cut smaller than 2 mm. */
export const letteringBounds = {
  capHeight: { least: 2, most: 5000 },
  letterSpacing: { least: -500, most: 2000 },
  lineSpacing: { least: 1, most: longestMm },
  radius: { least: 5, most: longestMm },
} as const satisfies Record<string, Bounds>;

export type LetteringLength = keyof typeof letteringBounds;

/** From one line to the next when nobody says otherwise, in cap heights: room for tails and accents (common practice, no source). */
const usualLines = 1.6;

export const usualLineSpacing = (capHeight: number): number => Math.round(capHeight * usualLines * 10) / 10;

/** What a lettering begins with: the first line of the brief that the sign does not bear yet, a tenth of the board high. */
export function newLetteringDraft(
  { board, lettering }: Pick<MockupDocument, "board" | "lettering">,
  briefWords: string,
): LetteringDraft {
  const tenth = Math.min(board.width, board.height) / 10;
  const capHeight = Math.max(
    letteringBounds.capHeight.least,
    tenth >= 10 ? Math.round(tenth / 5) * 5 : Math.round(tenth),
  );
  const set = new Set(lettering.flatMap(({ words }) => linesOfText(words)));
  const lines = linesOfText(briefWords);
  return {
    words: lines.find((line) => !set.has(line)) ?? lines[0] ?? "",
    face: "montserrat-600",
    capHeight,
    letterSpacing: 0,
    kerning: true,
    lineSpacing: usualLineSpacing(capHeight),
    align: "centre",
    along: "line",
    radius: Math.round(board.width / 2),
  };
}

/** The lines of a text that have something in them, trimmed. */
export function linesOfText(text: string): string[] {
  return text
    .split(/\r\n|\r|\n/)
    .map((line) => line.trim())
    .filter((line) => line !== "");
}

/** A lettering as the form shows it. A face that is no longer shipped gives way to the first. */
export function draftOfLettering(lettering: Lettering, boardWidth: number): LetteringDraft {
  const { words, face, capHeight, letterSpacing, kerning, lineSpacing, align, along } = lettering;
  return {
    words,
    face: faceOf(face)?.key ?? "montserrat-600",
    capHeight,
    letterSpacing,
    kerning,
    lineSpacing,
    align,
    along: along.kind === "arc" ? along.side : "line",
    radius: along.kind === "arc" ? along.radius : Math.round(boardWidth / 2),
  };
}

/** A draft after a change; the lines keep the usual distance as long as nobody gave them another. */
export function changedDraft(draft: LetteringDraft, change: Partial<LetteringDraft>): LetteringDraft {
  const next = { ...draft, ...change };
  const wasUsual = draft.capHeight !== null && draft.lineSpacing === usualLineSpacing(draft.capHeight);
  const canFollow = isWithinBounds(next.capHeight, letteringBounds.capHeight) && change.lineSpacing === undefined;
  return wasUsual && canFollow ? { ...next, lineSpacing: usualLineSpacing(next.capHeight ?? 0) } : next;
}

/** What a draft asks to be set; null while words or lengths are missing or out of bounds. */
export function settingOfDraft(draft: LetteringDraft): Setting | null {
  const { words, capHeight, letterSpacing, lineSpacing, radius, kerning, align, along } = draft;
  const hasLines = words.includes("\n");
  const lines = hasLines ? lineSpacing : usualLineSpacing(capHeight ?? 0);
  if (words.trim() === "" || words.length > longestWords) return null;
  if (!isWithinBounds(capHeight, letteringBounds.capHeight)) return null;
  if (!isWithinBounds(letterSpacing, letteringBounds.letterSpacing)) return null;
  if (!isWithinBounds(lines, letteringBounds.lineSpacing)) return null;
  const base = { words, capHeight, letterSpacing, lineSpacing: lines, kerning, align };
  if (along === "line") return { ...base, along: { kind: "line" } };
  if (!isWithinBounds(radius, letteringBounds.radius)) return null;
  return { ...base, along: { kind: "arc", radius, side: along } };
}
