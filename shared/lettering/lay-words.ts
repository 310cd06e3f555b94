import { boxCentre, boxOfPath, boxUnion } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Box, Path, Point } from "../geometry/path.ts";
import { placePath } from "../geometry/placement.ts";
import { pathTransform, segmentMap, translateMatrix } from "../geometry/transform.ts";
import type { Lettering } from "../mockup/document.ts";
import { footAlong, radiusOfLine } from "./along.ts";
import { letterOutline } from "./letter-outline.ts";
import { missingLetters } from "./letters-of-words.ts";
import type { OpenFace } from "./open-face.ts";
import { type SetLetter, setLines } from "./set-line.ts";
import { touchingLetters } from "./touching-letters.ts";

/** How words are set: a document's lettering without what says which it is. Lengths mm. */
export type Setting = Omit<Lettering, "id" | "face" | "fontSha256">;

/** A letter ready to be a piece. */
export type LaidLetter = {
  /** Its place among the words, from 0, spaces and line feeds counted. */
  readonly letter: number;
  readonly reads: string;
  /** mm about the middle of its own box, upright. All its parts are in it, as the dot of an i. */
  readonly path: Path;
  /** Where that middle lies about the lettering's origin, mm, and the letter's turn in degrees clockwise. */
  readonly laid: { readonly x: number; readonly y: number; readonly turn: number };
};

export type LaidWords = {
  readonly letters: readonly LaidLetter[];
  /** What the face has no letter for, each once. Nothing stands in their place. */
  readonly missing: readonly string[];
  /** Letters that run into each other, by their places among the words. */
  readonly touching: readonly (readonly [number, number])[];
  /** Round all letters as they are laid, about the lettering's origin; null when there is none. */
  readonly box: Box | null;
};

/** Words as they are laid, or in a sentence why they can't be. */
export type LayOutcome =
  | { readonly ok: true; readonly laid: LaidWords }
  | { readonly ok: false; readonly problem: string };

/**
 * Sets words in a face. Capitals as H are `capHeight` mm high. A line is as wide as its outlines: from their left edge, round their
 * middle or to their right edge it is lined up at the origin, which lies on the first line (see `footAlong`). Letters on
 * an arc are not bent: the middle of a letter's width stands on the radius. Words that would go round an arc more than once,
 * or whose last line would have no radius left, are refused.
 */
export function layWords(setting: Setting, face: OpenFace, kernel: Kernel): LayOutcome {
  const { words, along, align, lineSpacing, capHeight } = setting;
  const lines = setLines(setting, face).map((line) =>
    line.map((one) => ({ ...one, path: letterOutline(one.contours, capHeight, kernel) })),
  );
  const letters: LaidLetter[] = [];
  for (const [index, line] of lines.entries()) {
    const span = spanOf(line);
    if (span === null) continue;
    const down = index * lineSpacing;
    if (along.kind === "arc") {
      const problem = arcProblem(radiusOfLine(along, down), span.right - span.left, lines.length > 1 ? index : null);
      if (problem !== null) return { ok: false, problem };
    }
    const start = { left: span.left, centre: (span.left + span.right) / 2, right: span.right }[align];
    for (const one of line) {
      const letter = laidLetter(one, footAlong(along, { across: one.middle - start, down }));
      if (letter) letters.push(letter);
    }
  }
  const placed = letters.map(({ path, laid }) => placePath(path, { ...laid, scale: 1, mirrored: false }));
  return {
    ok: true,
    laid: {
      letters,
      missing: missingLetters(words, face.has),
      touching: touchingLetters(placed, kernel).map(([a, b]) => [letters[a]?.letter ?? a, letters[b]?.letter ?? b]),
      box: boxUnion(placed.map(boxOfPath)),
    },
  };
}

type OutlinedLetter = Pick<SetLetter, "letter" | "reads" | "middle"> & { readonly path: Path };

/** From the left edge of a line's outlines to their right edge, on the pen's line. */
function spanOf(line: readonly OutlinedLetter[]): { readonly left: number; readonly right: number } | null {
  const boxes = line.flatMap(({ path, middle }) => {
    const box = boxOfPath(path);
    return box ? [{ left: middle + box.x, right: middle + box.x + box.width }] : [];
  });
  if (boxes.length === 0) return null;
  return { left: Math.min(...boxes.map(({ left }) => left)), right: Math.max(...boxes.map(({ right }) => right)) };
}

function arcProblem(radius: number, width: number, line: number | null): string | null {
  const which = line === null ? "The words" : `Line ${line + 1}`;
  if (!(radius > 0))
    return `${which} would stand on no radius at all. Take a larger radius, fewer lines or less space between them.`;
  const degrees = ((width / radius) * 180) / Math.PI;
  if (degrees <= 360) return null;
  return `${which} would go ${Math.round(degrees)}° round, more than once. Take a larger radius, smaller letters or less space between them.`;
}

function laidLetter(
  { letter, reads, path }: OutlinedLetter,
  foot: { x: number; y: number; turn: number },
): LaidLetter | null {
  const box = boxOfPath(path);
  if (!box) return null;
  const middle = round(boxCentre(box));
  const own = pathTransform(path, translateMatrix(-middle.x, -middle.y)).map(({ start, segments }) => ({
    start: round(start),
    segments: segments.map((segment) => segmentMap(segment, round)),
  }));
  const radians = (foot.turn * Math.PI) / 180;
  const at = {
    x: foot.x + middle.x * Math.cos(radians) - middle.y * Math.sin(radians),
    y: foot.y + middle.x * Math.sin(radians) + middle.y * Math.cos(radians),
  };
  return {
    letter,
    reads,
    path: own,
    laid: { x: exact(at.x), y: exact(at.y), turn: Math.round(foot.turn * 100) / 100 + 0 },
  };
}

/** To a thousandth of a mm, the kernel's grid. */
const round = ({ x, y }: Point): Point => ({ x: Math.round(x * 1000) / 1000 + 0, y: Math.round(y * 1000) / 1000 + 0 });

/** Places are kept finer, so that equal spaces along an arc stay equal. */
const exact = (value: number): number => Math.round(value * 1e6) / 1e6 + 0;
