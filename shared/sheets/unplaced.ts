import { formatSize } from "../units/format-length.ts";
import { type CutShape, layShape } from "./cut-shape.ts";
import type { Item, LaidCopy } from "./filler.ts";
import type { UnplacedPiece, UnplacedReason } from "./nesting.ts";
import { turnsToTry } from "./outline-turns.ts";
import type { SheetField } from "./sheet-field.ts";

type Outcome = {
  readonly items: readonly Item[];
  readonly shapes: readonly CutShape[];
  readonly laid: readonly LaidCopy[];
  readonly faulty: ReadonlySet<LaidCopy>;
  /** By shape: whether it goes on any empty sheet. */
  readonly fitting: readonly boolean[];
  readonly fields: readonly SheetField[];
  readonly stopped: boolean;
};

/** What lies nowhere, piece by piece, with the reason in words. */
export function unplacedPieces({ items, shapes, laid, faulty, fitting, fields, stopped }: Outcome): UnplacedPiece[] {
  const placed = new Set(laid.map(({ item }) => item.index));
  const unsafe = new Set([...faulty].map(({ item }) => item.index));
  return shapes.flatMap((shape, index) => {
    const missing = items.filter((item) => item.shape === index && !placed.has(item.index));
    if (missing.length === 0) return [];
    const reason: UnplacedReason = !fitting[index]
      ? "larger than every sheet"
      : missing.some((item) => unsafe.has(item.index))
        ? "no safe place"
        : stopped
          ? "stopped"
          : "no sheet left";
    const words = reasonWords(reason, shape, missing.length, fields);
    return [{ pieceId: shape.piece.id, copies: missing.length, reason, words }];
  });
}

function reasonWords(reason: UnplacedReason, shape: CutShape, copies: number, fields: readonly SheetField[]): string {
  const { name, quantity } = shape.piece;
  const some = quantity === 1 ? name : `${copies} of ${quantity} ${name}`;
  switch (reason) {
    case "larger than every sheet":
      return `${name} goes on no sheet: it is ${sizeOf(shape)}, and the largest sheet leaves ${largestOf(fields)} inside its margin.`;
    case "no sheet left":
      return `No sheet is left for ${some}.`;
    case "stopped":
      return `The search was stopped before ${some} had a place.`;
    case "no safe place":
      return `No place far enough from the others was found for ${some}.`;
  }
}

/** The smallest box that the piece has in the turns it may take. */
function sizeOf(shape: CutShape): string {
  const boxes = turnsToTry(shape.region, shape.piece.turns, { grainTurn: 0, freeTurns: 16 }).map(
    (turn) => layShape(shape, turn, false).box,
  );
  const box = boxes.reduce((a, b) => (b.width * b.height < a.width * a.height ? b : a), boxes[0] ?? nothing);
  return formatSize(Math.max(box.width, box.height), Math.min(box.width, box.height), "mm");
}

const nothing = { x: 0, y: 0, width: 0, height: 0 };

function largestOf(fields: readonly SheetField[]): string {
  const { inner } = fields.reduce(
    (a, b) => (b.areaMm2 > a.areaMm2 ? b : a),
    fields[0] ?? { inner: nothing, areaMm2: 0 },
  );
  return formatSize(Math.max(inner.width, inner.height), Math.min(inner.width, inner.height), "mm");
}
