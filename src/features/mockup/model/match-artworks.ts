import type { ArtworkPiece } from "#shared/artwork/imported-artwork.ts";
import { boxCentre, boxUnion } from "#shared/geometry/box.ts";
import type { Box } from "#shared/geometry/path.ts";
import type { ArtworkToBringIn } from "./commands/bring-in-artwork.ts";

/** How lengths of the new artwork lead to the plane of the one before: first made larger by `scale`, then moved. */
export type Fit = { readonly scale: number; readonly dx: number; readonly dy: number };

/** Which piece of the new artwork takes the place of which before; those left over have come or are gone. */
export type ArtworkMatch = {
  readonly fit: Fit;
  readonly pairs: readonly { readonly before: number; readonly after: number }[];
  readonly gone: readonly number[];
  readonly come: readonly number[];
};

/** Sizes that differ by less, as a share, are one size that was rounded. */
const sameSize = 0.005;

/**
 * The fit of a new artwork to the one before. On a page of the same size it keeps its place on it. Else what is drawn comes middle
 * to middle: as wide as before, or at its own true size.
 */
export function fitArtwork(before: ArtworkToBringIn, after: ArtworkToBringIn, size: "as before" | "its own"): Fit {
  const isNear = (a: number, b: number) => Math.abs(a - b) <= sameSize * Math.max(a, b);
  if (isNear(before.widthMm, after.widthMm) && isNear(before.heightMm, after.heightMm))
    return { scale: 1, dx: 0, dy: 0 };
  const [from, to] = [drawnBox(after.pieces), drawnBox(before.pieces)];
  if (!from || !to || from.width <= 0) return { scale: 1, dx: 0, dy: 0 };
  const scale = size === "as before" ? to.width / from.width : 1;
  const [a, b] = [boxCentre(from), boxCentre(to)];
  return { scale, dx: b.x - a.x * scale, dy: b.y - a.y * scale };
}

/** The box round pieces; null when there are none. */
export const drawnBox = (pieces: readonly { readonly box: Box }[]): Box | null =>
  boxUnion(pieces.map(({ box }) => box));

/**
 * Pairs pieces of two artworks: first those of one colour, then the rest whatever their colour, if they lie closer. Among those that
 * may be pairs the nearest in place and size come first; ties go to the lower index.
 */
export function matchArtworks(
  before: ArtworkToBringIn,
  after: ArtworkToBringIn,
  size: "as before" | "its own",
): ArtworkMatch {
  // A drawing of another scale has the same pieces: they are found at one size, whatever size they come in.
  const alike = fitArtwork(before, after, "as before");
  const placed = after.pieces.map((piece) => ({ ...piece, box: fittedBox(piece.box, alike) }));
  const taken = new Map<number, number>();
  const used = new Set<number>();
  for (const round of ["colour", "any"] as const) {
    const candidates = before.pieces
      .filter(({ index }) => !taken.has(index))
      .flatMap((old) =>
        placed
          .filter(({ index, colour }) => !used.has(index) && (round === "any" || colour === old.colour))
          .flatMap((piece) => {
            const distance = unlikeness(old, piece);
            return distance <= (round === "any" ? 0.3 : 1) ? [{ before: old.index, after: piece.index, distance }] : [];
          }),
      )
      .sort((a, b) => a.distance - b.distance || a.before - b.before || a.after - b.after);
    for (const pair of candidates) {
      if (taken.has(pair.before) || used.has(pair.after)) continue;
      taken.set(pair.before, pair.after);
      used.add(pair.after);
    }
  }
  return {
    fit: fitArtwork(before, after, size),
    pairs: [...taken].map(([old, piece]) => ({ before: old, after: piece })).sort((a, b) => a.before - b.before),
    gone: before.pieces.map(({ index }) => index).filter((index) => !taken.has(index)),
    come: after.pieces.map(({ index }) => index).filter((index) => !used.has(index)),
  };
}

/** A box of the new artwork on the plane of the one before. */
export function fittedBox({ x, y, width, height }: Box, { scale, dx, dy }: Fit): Box {
  return { x: x * scale + dx, y: y * scale + dy, width: width * scale, height: height * scale };
}

/** 0 for the same place and size; 1 where the middles are as far apart as a piece is long, or one is twice as long as the other. */
function unlikeness(a: Pick<ArtworkPiece, "box">, b: Pick<ArtworkPiece, "box">): number {
  const longA = Math.hypot(a.box.width, a.box.height);
  const longB = Math.hypot(b.box.width, b.box.height);
  const longer = Math.max(longA, longB);
  if (longer <= 0) return 1;
  const [from, to] = [boxCentre(a.box), boxCentre(b.box)];
  const apart = Math.hypot(to.x - from.x, to.y - from.y) / longer;
  return apart + Math.abs(Math.log2(Math.max(longA, 1e-9) / Math.max(longB, 1e-9)));
}
