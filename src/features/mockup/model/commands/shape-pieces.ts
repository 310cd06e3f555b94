import { boxOfPath } from "#shared/geometry/box.ts";
import { placePath } from "#shared/geometry/placement.ts";
import type { Layer, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { nameOfPart } from "#shared/pieces/name-of-part.ts";
import { inReadingOrder } from "#shared/pieces/reading-order.ts";
import type { CutPiece } from "#shared/shaping/cut-away.ts";
import type { Joined } from "#shared/shaping/join-outlines.ts";
import type { WithoutBits } from "#shared/shaping/loose-bits.ts";
import type { Shaped } from "#shared/shaping/shaped.ts";
import { removePieces } from "./pieces.ts";
import { artworkOfPieces, keptOutline, replacePieces } from "./replace-pieces.ts";

/** As much as a piece reads. */
const mostRead = 120;

/** Makes one piece of each group that was joined. It bears the first name among them and reads what they read, in reading order. */
export function joinPieces(
  document: MockupDocument,
  { joined, id }: { joined: readonly Joined[]; id: string },
): MockupDocument {
  return replacePieces(
    document,
    joined.map(({ ids, shaped }, index) => {
      const pieces = piecesOf(document, ids);
      const piece: Piece = {
        id: `${id}-${index + 1}`,
        name: pieces.find(({ name }) => name !== "")?.name ?? "",
        source: { kind: "worked", how: "joined", artworkIds: artworkOfPieces(pieces) },
        ...keptOutline(shaped),
        reads: readTogether(pieces),
      };
      return { ids: pieces.length === ids.length ? ids : [], by: [piece] };
    }),
  );
}

/**
 * Takes what was cut away off each piece; one of which nothing is left goes. With `useUp` the pieces that were cut with go, too.
 * A piece that comes apart has parts with its name, the first of which reads what it read.
 */
export function cutAwayPieces(
  document: MockupDocument,
  { cut, by, useUp, id }: { cut: readonly CutPiece[]; by: readonly string[]; useUp: boolean; id: string },
): MockupDocument {
  const tools = piecesOf(document, by);
  const replacements = cut.flatMap(({ id: pieceId, left }, index) => {
    const [piece] = piecesOf(document, [pieceId]);
    if (!piece) return [];
    const source = {
      kind: "worked" as const,
      how: "cut away" as const,
      artworkIds: artworkOfPieces([piece, ...tools]),
    };
    return [{ ids: [pieceId], by: partsOf(piece, left, source, `${id}-${index + 1}`) }];
  });
  const done = replacePieces(document, replacements);
  if (done === document || !useUp) return done;
  const chosen = new Set(cut.map(({ id: pieceId }) => pieceId));
  return removePieces(done, { pieceIds: by.filter((one) => !chosen.has(one)) });
}

/** Takes loose bits off pieces, and pieces that are nothing else. What stays keeps its id, name and reading. */
export function dropLooseBits(document: MockupDocument, { found }: { found: readonly WithoutBits[] }): MockupDocument {
  return replacePieces(
    document,
    found.flatMap(({ id, left }) => {
      const [piece] = piecesOf(document, [id]);
      if (!piece) return [];
      const source = { kind: "worked" as const, how: "trimmed" as const, artworkIds: artworkOfPieces([piece]) };
      return [{ ids: [id], by: left ? [{ ...piece, source, ...keptOutline(left) }] : [] }];
    }),
  );
}

/** Puts the parts that a piece was split into in its place, named by their number. The first reads what it read. */
export function splitPiece(
  document: MockupDocument,
  { pieceId, parts, id }: { pieceId: string; parts: readonly Shaped[]; id: string },
): MockupDocument {
  const [piece] = piecesOf(document, [pieceId]);
  if (!piece || parts.length < 2) return document;
  const source = { kind: "worked" as const, how: "split" as const, artworkIds: artworkOfPieces([piece]) };
  return replacePieces(document, [{ ids: [pieceId], by: partsOf(piece, parts, source, id) }]);
}

function partsOf(piece: Piece, parts: readonly Shaped[], source: Piece["source"], id: string): Piece[] {
  const [only] = parts;
  if (only && parts.length === 1) return [{ ...piece, source, ...keptOutline(only) }];
  return parts.map((part, index) => ({
    id: `${id}-${index + 1}`,
    name: nameOfPart(piece.name, index + 1, parts.length),
    source,
    ...keptOutline(part),
    reads: index === 0 ? piece.reads : "",
  }));
}

function piecesOf({ layers }: MockupDocument, ids: readonly string[]): Layer["pieces"] {
  const chosen = new Set(ids);
  return layers.flatMap(({ pieces }) => pieces.filter(({ id }) => chosen.has(id)));
}

function readTogether(pieces: readonly Piece[]): string {
  const boxed = pieces.flatMap((piece) => {
    const box = boxOfPath(placePath(piece.path, piece.placement));
    return box && piece.reads !== "" ? [{ box, reads: piece.reads }] : [];
  });
  const lines = inReadingOrder(boxed, ({ box }) => box);
  return lines
    .map((line) => line.map(({ reads }) => reads).join(""))
    .join(" ")
    .slice(0, mostRead)
    .trim();
}
