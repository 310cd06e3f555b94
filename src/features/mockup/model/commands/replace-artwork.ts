import type { ArtworkPiece } from "#shared/artwork/imported-artwork.ts";
import { boxCentre, boxOfPath } from "#shared/geometry/box.ts";
import type { Path } from "#shared/geometry/path.ts";
import { placePoint } from "#shared/geometry/placement.ts";
import { matrixMultiply, pathTransform, scaleMatrix, translateMatrix } from "#shared/geometry/transform.ts";
import type { Layer, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { coordinateOf, mostPieces } from "../limits.ts";
import { type ArtworkMatch, type Fit, fittedBox } from "../match-artworks.ts";
import { withFields } from "../same.ts";
import { withoutOpenings } from "../without-openings.ts";
import type { ArtworkToBringIn } from "./bring-in-artwork.ts";

export type Replacement = {
  readonly before: ArtworkToBringIn;
  readonly after: ArtworkToBringIn;
  readonly match: ArtworkMatch;
  /** To which layer pieces go that have come, by their index; those not named are left out. */
  readonly come: ReadonlyMap<number, string>;
};

/**
 * Lets a new artwork take the place of another whose pieces are in the mockup. A piece with a counterpart takes its outline and keeps
 * its id, name, turn, size and mirroring; it moves as the counterpart lies elsewhere in the drawing. Pieces without one go; what has come
 * is laid in the layer named for it, beside a piece that was there. Layers keep stock, hold, hardware, offset and holes, also
 * when they lose all their pieces. Locked layers stay as they are. Ids of what has come are made from `id`.
 */
export function replaceArtwork(
  document: MockupDocument,
  { id, ...replacement }: Replacement & { id: string },
): MockupDocument {
  const anchor = anchorOf(document, replacement);
  const layers = document.layers.map((layer) => {
    if (layer.locked) return layer;
    const pieces = layer.pieces.flatMap((piece): Piece[] => {
      if (!isOf(piece, replacement.before)) return [piece];
      const next = replacedPiece(piece, replacement);
      return next ? [next] : [];
    });
    const near = anchorOf({ ...document, layers: [layer] }, replacement) ?? anchor;
    const come = near
      ? [...replacement.come]
          .filter(([, key]) => key === layer.key)
          .flatMap(([index]) => comePiece(index, { near, replacement, id: `${id}-${index + 1}` }))
      : [];
    const room = Math.max(0, mostPieces - pieces.length);
    const isSame = come.length === 0 && pieces.every((piece, at) => piece === layer.pieces[at]);
    return isSame && pieces.length === layer.pieces.length
      ? layer
      : { ...layer, pieces: [...pieces, ...come.slice(0, room)] };
  });
  return layers.every((layer, at) => layer === document.layers[at]) ? document : { ...document, layers };
}

/** A piece of the artwork before, with what it was drawn from there and how much larger the mockup holds it. */
type Anchor = { readonly piece: Piece; readonly old: ArtworkPiece; readonly scale: number };

const isOf = ({ source }: Piece, { artworkId }: ArtworkToBringIn): boolean =>
  source.kind === "artwork" && source.artworkId === artworkId;

function anchorOf({ layers }: { readonly layers: readonly Layer[] }, { before, match }: Replacement): Anchor | null {
  const paired = new Set(match.pairs.map((pair) => pair.before));
  for (const layer of layers)
    for (const piece of layer.pieces) {
      const anchor = isOf(piece, before) ? anchorAt(piece, before) : null;
      if (anchor && paired.has(anchor.old.index)) return anchor;
    }
  return null;
}

function anchorAt(piece: Piece, before: ArtworkToBringIn): Anchor | null {
  const { source } = piece;
  const old = source.kind === "artwork" ? before.pieces.find(({ index }) => index === source.index) : undefined;
  const box = boxOfPath(piece.path);
  if (!old || !box) return null;
  const longer = Math.max(old.box.width, old.box.height);
  // The true size of an artwork may be set anew after its pieces were brought in: they keep theirs.
  return { piece, old, scale: longer > 0 ? Math.max(box.width, box.height) / longer : 1 };
}

function replacedPiece(piece: Piece, { before, after, match }: Replacement): Piece | null {
  const anchor = anchorAt(piece, before);
  const pair = anchor && match.pairs.find((one) => one.before === anchor.old.index);
  const next = pair && after.pieces.find(({ index }) => index === pair.after);
  if (!anchor || !next) return null;
  const isClosed = piece.path.length < anchor.old.path.length;
  const path = isClosed ? (withoutOpenings([next])[0]?.path ?? next.path) : next.path;
  return laid(piece, { ...next, path }, { anchor, artworkId: after.artworkId, fit: match.fit });
}

function comePiece(
  index: number,
  { near, replacement, id }: { near: Anchor; replacement: Replacement; id: string },
): Piece[] {
  const { after, match } = replacement;
  const piece = after.pieces.find((one) => one.index === index);
  if (!piece) return [];
  const own: Piece = { ...near.piece, id, name: "", reads: "" };
  const next = laid(own, piece, { anchor: near, artworkId: after.artworkId, fit: match.fit });
  return next ? [next] : [];
}

/** A piece with the outline of another artwork's, as far from the anchor as it lies from what the anchor was drawn from. */
function laid(
  piece: Piece,
  next: ArtworkPiece,
  { anchor, artworkId, fit }: { anchor: Anchor; artworkId: string; fit: Fit },
): Piece | null {
  const [from, to] = [boxCentre(anchor.old.box), boxCentre(fittedBox(next.box, fit))];
  const shift = { x: (to.x - from.x) * anchor.scale, y: (to.y - from.y) * anchor.scale };
  const place = placePoint(shift, anchor.piece.placement);
  const x = coordinateOf(place.x);
  const y = coordinateOf(place.y);
  if (x === null || y === null) return null;
  return withFields(piece, {
    source: { kind: "artwork", artworkId, index: next.index, colour: next.colour },
    path: aboutItsMiddle(next, fit.scale * anchor.scale).map(({ start, segments }) => ({
      start,
      segments: [...segments],
    })),
    placement: { ...piece.placement, x, y },
  });
}

function aboutItsMiddle({ path, box }: ArtworkPiece, scale: number): Path {
  const { x, y } = boxCentre(box);
  return pathTransform(path, matrixMultiply(scaleMatrix(scale), translateMatrix(-x, -y)));
}
