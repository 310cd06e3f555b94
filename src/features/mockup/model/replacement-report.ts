import { boxOfPath } from "#shared/geometry/box.ts";
import { pathToText } from "#shared/geometry/path-text.ts";
import { artworkOf } from "#shared/mockup/artwork-used.ts";
import type { MockupDocument, Piece } from "#shared/mockup/document.ts";
import { type Replacement, replaceArtwork } from "./commands/replace-artwork.ts";

export type PieceChange = "recoloured" | "moved" | "of another size" | "redrawn";

/** What replacing an artwork does to the mockup, for words before it happens. */
export type ReplacementReport = {
  readonly layers: readonly {
    readonly key: string;
    readonly name: string;
    readonly same: number;
    readonly changed: readonly { readonly piece: Piece; readonly how: readonly PieceChange[] }[];
    readonly gone: readonly Piece[];
    readonly come: readonly Piece[];
    /** The layer is locked: its pieces of the artwork before stay as they are. */
    readonly isLocked: boolean;
  }[];
  /** Pieces of the new artwork that have come and go to no layer. */
  readonly leftOut: number;
  /** Margin plates and pieces made of others, which keep the outline they were made with. */
  readonly madeFrom: number;
};

/** Tells what `replaceArtwork` would do, layer by layer, by doing it; layers it doesn't touch are not listed. */
export function reportReplacement(document: MockupDocument, replacement: Replacement): ReplacementReport {
  const { before, match, come } = replacement;
  const next = replaceArtwork(document, { ...replacement, id: "come" });
  const layers = document.layers.flatMap((layer, at) => {
    const concerned = layer.pieces.filter(({ source }) => isFrom(source, before.artworkId));
    const after = next.layers[at]?.pieces ?? [];
    const byId = new Map(after.map((piece) => [piece.id, piece]));
    const known = new Set(layer.pieces.map(({ id }) => id));
    const arrived = after.filter(({ id }) => !known.has(id));
    if (concerned.length === 0 && arrived.length === 0) return [];
    const gone = layer.locked ? [] : concerned.filter(({ id }) => !byId.has(id));
    const stayed = concerned.flatMap((piece) => {
      const now = byId.get(piece.id);
      return now ? [{ piece, how: changesOf(piece, now) }] : [];
    });
    const changed = stayed.filter(({ how }) => how.length > 0);
    return [
      {
        key: layer.key,
        name: layer.name,
        same: stayed.length - changed.length,
        changed,
        gone,
        come: arrived,
        isLocked: layer.locked,
      },
    ];
  });
  const arrived = layers.reduce((sum, layer) => sum + layer.come.length, 0);
  const madeFrom = document.layers
    .flatMap(({ pieces }) => pieces)
    .filter(({ source }) => source.kind !== "artwork" && artworkOf(source).includes(before.artworkId)).length;
  return { layers, leftOut: match.come.length - Math.min(arrived, come.size), madeFrom };
}

const isFrom = (source: Piece["source"], artworkId: string): boolean =>
  source.kind === "artwork" && source.artworkId === artworkId;

/** Less than this, in mm, nobody cuts and nobody sees. */
const slightMm = 0.05;

function changesOf(before: Piece, after: Piece): PieceChange[] {
  const changes: PieceChange[] = [];
  if (colourOf(before) !== colourOf(after)) changes.push("recoloured");
  const apart = Math.hypot(after.placement.x - before.placement.x, after.placement.y - before.placement.y);
  if (apart > slightMm) changes.push("moved");
  const [a, b] = [boxOfPath(before.path), boxOfPath(after.path)];
  const isResized = a && b && Math.max(Math.abs(a.width - b.width), Math.abs(a.height - b.height)) > slightMm;
  if (isResized) changes.push("of another size");
  else if (pathToText(before.path, 1) !== pathToText(after.path, 1)) changes.push("redrawn");
  return changes;
}

const colourOf = ({ source }: Piece): string => (source.kind === "artwork" ? source.colour.toUpperCase() : "");

/** For each piece that has come, the layer that holds most of the pieces of its colour of the artwork before; none for a new colour. */
export function layersForCome(
  document: MockupDocument,
  { before, after, match }: Omit<Replacement, "come">,
): Map<number, string> {
  const come = new Map<number, string>();
  for (const index of match.come) {
    const colour = after.pieces.find((piece) => piece.index === index)?.colour;
    const counts = document.layers
      .filter(({ locked }) => !locked)
      .map(({ key, pieces }) => ({
        key,
        count: pieces.filter(
          (piece) => isFrom(piece.source, before.artworkId) && colourOf(piece) === colour?.toUpperCase(),
        ).length,
      }))
      .filter(({ count }) => count > 0)
      .sort((a, b) => b.count - a.count);
    const [most] = counts;
    if (most) come.set(index, most.key);
  }
  return come;
}
