import { lengthsEqual } from "../geometry/tolerance.ts";
import { formatFine } from "../units/format-length.ts";
import { type Change, type ChangeKind, countOf, sameThing, type Wording } from "./change.ts";
import type { Layer, MockupDocument, Piece } from "./document.ts";
import { layerWords } from "./layer-changes.ts";

type Placed = { readonly piece: Piece; readonly layer: Layer };
type Said = { readonly kind: ChangeKind; readonly words: string };

/** What changed about pieces, matched by id wherever they are. Pieces of a layer with the same change are one entry. */
export function listPieceChanges(before: MockupDocument, after: MockupDocument, wording: Wording): Change[] {
  const old = piecesById(before);
  const now = piecesById(after);
  const groups = new Map<string, Said & { layer: Layer; pieces: Piece[] }>();
  const add = ({ piece, layer }: Placed, said: Said) => {
    const key = JSON.stringify([layer.key, said.kind, said.words]);
    const group = groups.get(key) ?? { ...said, layer, pieces: [] };
    group.pieces.push(piece);
    groups.set(key, group);
  };
  for (const [id, is] of now) {
    const was = old.get(id);
    if (!was) {
      if (before.layers.some((layer) => layer.key === is.layer.key)) add(is, { kind: "come", words: "added" });
      continue;
    }
    for (const said of changesOfPiece(was, is, wording)) add(is, said);
  }
  // With a layer that is gone its pieces are gone too: the layer's entry counts them.
  for (const [id, was] of old) {
    if (now.has(id) || !after.layers.some((layer) => layer.key === was.layer.key)) continue;
    add(was, { kind: "gone", words: "taken out" });
  }
  return [...groups.values()].map(({ kind, words, layer, pieces }) => ({
    kind,
    text: `${layerWords(layer)}: ${namesOf(pieces)} ${words}`,
    layerKey: layer.key,
    pieceIds: pieces.map((piece) => piece.id),
    where: pieces[0] ? { x: pieces[0].placement.x, y: pieces[0].placement.y } : null,
  }));
}

function piecesById(document: MockupDocument): Map<string, Placed> {
  return new Map(
    document.layers.flatMap((layer) => layer.pieces.map((piece) => [piece.id, { piece, layer }] as const)),
  );
}

function changesOfPiece(was: Placed, is: Placed, { unit }: Wording): Said[] {
  const changes: Said[] = [];
  const [from, to] = [was.piece.placement, is.piece.placement];
  if (was.layer.key !== is.layer.key)
    changes.push({ kind: "layer", words: `moved over from ${layerWords(was.layer)}` });
  if (!sameThing(was.piece.path, is.piece.path)) changes.push({ kind: "redrawn", words: "redrawn" });
  if (from.scale !== to.scale) {
    changes.push({ kind: "resized", words: `resized to ${percent(to.scale / from.scale)} of what it was` });
  }
  if (from.mirrored !== to.mirrored) changes.push({ kind: "turned", words: "mirrored" });
  if (from.turn !== to.turn) changes.push({ kind: "turned", words: turnWords(to.turn - from.turn) });
  if (from.x !== to.x || from.y !== to.y) {
    const way = [along(to.x - from.x, "right", "left", unit), along(to.y - from.y, "down", "up", unit)];
    changes.push({ kind: "moved", words: `moved ${way.filter(Boolean).join(" and ") || "by a hair"}` });
  }
  if (was.piece.name !== is.piece.name) {
    changes.push({ kind: "layer", words: `called ${was.piece.name || "nothing"} before` });
  }
  if (!sameThing(was.piece.source, is.piece.source))
    changes.push({ kind: "redrawn", words: "taken from other artwork" });
  return changes;
}

function along(mm: number, ahead: string, back: string, unit: Wording["unit"]): string {
  // Less than a hundredth shows as 0: not worth saying beside the other direction.
  return lengthsEqual(mm, 0, 0.005) ? "" : `${formatFine(Math.abs(mm), unit)} ${mm > 0 ? ahead : back}`;
}

function turnWords(degrees: number): string {
  const turn = (((degrees % 360) + 540) % 360) - 180;
  const amount = `${Number(Math.abs(turn).toFixed(2))}°`;
  if (turn === 0 || turn === -180) return turn === 0 ? "turned full circle" : "turned 180°";
  return `turned ${amount} ${turn > 0 ? "clockwise" : "anticlockwise"}`;
}

const percent = (ratio: number): string => `${Number((ratio * 100).toPrecision(4))} %`;

function namesOf(pieces: readonly Piece[]): string {
  const [only] = pieces;
  return pieces.length === 1 && only?.name ? only.name : countOf(pieces.length, "piece");
}
