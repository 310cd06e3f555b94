import { boxOfPath } from "../geometry/box.ts";
import type { Box } from "../geometry/path.ts";
import { placePoint, unplacePoint } from "../geometry/placement.ts";
import { unrolled } from "../lettering/along.ts";
import { linesOfWords } from "../lettering/letters-of-words.ts";
import { copiesOf, type LetterPiece, movementOfLetters } from "../lettering/letters-on-board.ts";
import type { Lettering } from "../mockup/document.ts";
import { inReadingOrder } from "../pieces/reading-order.ts";
import type { Letter } from "./lettering.ts";

/** A letter with the box that it is read by. */
type Boxed = { readonly letter: Letter; readonly box: Box };

/** Lettering that is turned by less reads as level, degrees. */
const levelDegrees = 1;

/**
 * What the letters read in lines from the top, each from left to right: a letter belongs to the line whose middle lies
 * within half its height. Letters that were set as words are read where they stand on their line, so that a comma belongs to it
 * though it lies low; along an arc and where the words are turned, they are read in the words' own plane and in one go.
 * Spaces between words are not told.
 */
export function linesOf(letters: readonly Letter[], lettering: readonly Lettering[]): Letter[][] {
  const level: Boxed[] = [];
  const blocks: { readonly middle: number; readonly x: number; readonly lines: Letter[][] }[] = [];
  const set = new Set<Letter>();
  for (const words of lettering) {
    const own = letters.flatMap((letter) => {
      const { source } = letter.piece;
      return source.kind === "lettering" && source.letteringId === words.id ? [{ ...letter, source, letter }] : [];
    });
    for (const copy of copiesOf(own)) {
      for (const { letter } of copy) set.add(letter);
      const { isLevel, origin, boxed } = readAsSet(copy, words);
      if (isLevel) level.push(...boxed);
      else blocks.push({ middle: origin.y, x: origin.x, lines: linesOfBoxes(boxed).map(({ letters: line }) => line) });
    }
  }
  for (const letter of letters) if (!set.has(letter)) level.push({ letter, box: letter.figures.box });
  const levelLines = linesOfBoxes(level).map(({ middle, x, letters: line }) => ({ middle, x, lines: [line] }));
  return [...levelLines, ...blocks].toSorted((a, b) => a.middle - b.middle || a.x - b.x).flatMap(({ lines }) => lines);
}

type SetLetter = LetterPiece & { readonly letter: Letter };

/**
 * The letters of one copy with boxes that are as high as a capital and stand on the feet of their line, wherever they were moved
 * to from there: on the board where the words lie level, else in the words' plane, unrolled.
 */
function readAsSet(copy: readonly SetLetter[], { words, along, capHeight, lineSpacing }: Lettering) {
  const movement = movementOfLetters(copy) ?? { x: 0, y: 0, turn: 0, scale: 1, mirrored: false };
  const lineAt = new Map(
    linesOfWords(words).flatMap((line, index) => line.map(({ letter }) => [letter, index] as const)),
  );
  const turn = Math.abs(movement.turn - 360 * Math.round(movement.turn / 360));
  const isLevel = along.kind === "line" && turn < levelDegrees && !movement.mirrored;
  const { scale } = movement;
  const boxed = copy.map(({ letter, piece, source }): Boxed => {
    const now = unrolled(along, unplacePoint(piece.placement, movement));
    const then = unrolled(along, source.laid);
    const foot = (lineAt.get(source.letter) ?? 0) * lineSpacing + now.down - then.down;
    const width = ((boxOfPath(piece.path)?.width ?? 0) * piece.placement.scale) / scale;
    const box = { x: now.across - width / 2, y: foot - capHeight, width, height: capHeight };
    if (!isLevel) return { letter, box };
    return {
      letter,
      box: { ...placePoint(box, { ...movement, turn: 0 }), width: width * scale, height: capHeight * scale },
    };
  });
  return { isLevel, origin: placePoint({ x: 0, y: 0 }, movement), boxed };
}

function linesOfBoxes(letters: readonly Boxed[]): { middle: number; x: number; letters: Letter[] }[] {
  return inReadingOrder(letters, ({ box }) => box).map((line) => {
    const tallest = line.reduce((most, one) => (one.box.height > most.box.height ? one : most));
    return {
      middle: tallest.box.y + tallest.box.height / 2,
      x: line[0]?.box.x ?? 0,
      letters: line.map(({ letter }) => letter),
    };
  });
}
