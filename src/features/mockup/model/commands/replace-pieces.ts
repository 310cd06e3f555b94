import { regionContains } from "#shared/geometry/contains.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Path, Point } from "#shared/geometry/path.ts";
import { placeRegion } from "#shared/geometry/placement.ts";
import { segmentMap } from "#shared/geometry/transform.ts";
import { artworkOf } from "#shared/mockup/artwork-used.ts";
import type { Layer, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { withoutUnusedLettering } from "#shared/mockup/without-unused-lettering.ts";
import type { Shaped } from "#shared/shaping/shaped.ts";
import { exactCoordinateOf, mostPieces } from "../limits.ts";
import { changeLayers } from "./change-layer.ts";
import { withFixed } from "./pieces.ts";

/** Pieces of one layer, and what comes in their place: where the first of them stood in the list. */
export type Replacement = { readonly ids: readonly string[]; readonly by: readonly Piece[] };

/**
 * Puts pieces in the place of others of the same layer. A standoff's hole that lay in one of them stays as long as it lies in
 * a piece of the layer, else it goes. Words of which no piece is left go, too. Nothing happens to locked layers, nor where a
 * layer would have more pieces than it takes or one would lie out of reach.
 */
export function replacePieces(document: MockupDocument, replacements: readonly Replacement[]): MockupDocument {
  const replaced = changeLayers(document, (layer) => {
    const here = new Set(layer.pieces.map(({ id }) => id));
    const own = replacements.filter(({ ids }) => ids.length > 0 && ids.every((id) => here.has(id)));
    return own.length === 0 ? layer : withReplacements(layer, own);
  });
  return replaced === document ? document : withoutUnusedLettering(replaced);
}

function withReplacements(layer: Layer, replacements: readonly Replacement[]): Layer {
  const gone = new Set(replacements.flatMap(({ ids }) => ids));
  const byFirst = new Map(replacements.map(({ ids, by }) => [ids[0], by]));
  const pieces = layer.pieces.flatMap((piece) => (gone.has(piece.id) ? (byFirst.get(piece.id) ?? []) : [piece]));
  const isHeld = pieces.every(
    ({ placement: { x, y } }) => exactCoordinateOf(x) !== null && exactCoordinateOf(y) !== null,
  );
  if (pieces.length > mostPieces || !isHeld) return layer;
  if (layer.hold.kind !== "standoff") return { ...layer, pieces };
  const was = liesIn(layer.pieces.filter(({ id }) => gone.has(id)));
  const is = liesIn(pieces);
  const holes = withFixed(layer.hold.holes.filter((hole) => !was(hole) || is(hole)));
  return { ...layer, pieces, hold: { ...layer.hold, holes } };
}

function liesIn(pieces: readonly Piece[]): (point: Point) => boolean {
  const regions = pieces.map(({ path, placement }) => placeRegion(flattenPath(path), placement));
  return (point) => regions.some((region) => regionContains(region, point));
}

/** Path and placement of a piece as a document keeps them: to a millionth of a mm. */
export function keptOutline({ path, placement }: Shaped): Pick<Piece, "path" | "placement"> {
  const { x, y } = placement;
  return {
    path: keptPath(path),
    placement: { ...placement, x: exactCoordinateOf(x) ?? x, y: exactCoordinateOf(y) ?? y },
  };
}

const keptPath = (path: Path): Piece["path"] =>
  path.map(({ start, segments }) => ({
    start: kept(start),
    segments: segments.map((segment) => segmentMap(segment, kept)),
  }));

const kept = ({ x, y }: Point): Point => ({ x: Math.round(x * 1e6) / 1e6 || 0, y: Math.round(y * 1e6) / 1e6 || 0 });

/** As many artworks as one outline goes back to. */
const mostArtworks = 50;

/** The artwork that pieces go back to, each once. */
export function artworkOfPieces(pieces: readonly Pick<Piece, "source">[]): string[] {
  return [...new Set(pieces.flatMap(({ source }) => artworkOf(source)))].slice(0, mostArtworks);
}
