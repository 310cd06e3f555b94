import { connectedPieces } from "../../geometry/connected.ts";
import { type CutLine, cutPath } from "../../geometry/cut-path.ts";
import { flattenRing } from "../../geometry/flatten.ts";
import { remembered } from "../../geometry/kernel.ts";
import type { Path, Point } from "../../geometry/path.ts";
import { unplacePoint } from "../../geometry/placement.ts";
import type { MockupDocument, Piece } from "../../mockup/document.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import type { Finding } from "../finding.ts";
import type { Mend } from "../mend.ts";
import type { RuleInput } from "../rule.ts";
import { layersWithFigures } from "../words.ts";

/** A cut that would run through a node is moved aside by one of these, mm. */
const asideMm = [0, 0.013, -0.017, 0.031, -0.037, 0.059, -0.061, 0.11, -0.13];

/**
 * Splits a piece that is too large for the bed along a straight cut through its middle, across its longer side. What the cut
 * leaves apart becomes pieces of its own.
 */
export function splitPieceMends({ pieceIds }: Finding, input: RuleInput): Mend[] {
  const found = layersWithFigures(input)
    .flatMap(({ pieces }) => pieces)
    .find(({ piece }) => piece.id === pieceIds[0]);
  if (!found) return [];
  const { piece, figures } = found;
  const paths = remembered(input.kernel, [piece.path, piece.placement], "split", () => splitAcross(piece, figures));
  if (!paths) return [];
  const ids = freeIds(piece.id, paths.length, input.document);
  const parts = paths.map((path, index) => ({ id: ids[index] ?? piece.id, path: changeable(path) }));
  const label = parts.length === 2 ? "Split it in two" : `Split it, into ${parts.length} parts`;
  return [{ label, steps: [{ kind: "split piece", pieceId: piece.id, parts }] }];
}

/** The parts of a piece cut in the middle of its length; null when no cut divides it. */
function splitAcross(piece: Piece, { region, smallestBox }: PieceFigures): Path[] | null {
  const radians = ((smallestBox?.turn ?? 0) * Math.PI) / 180;
  const [cosine, sine] = [Math.cos(radians), Math.sin(radians)];
  const along = region.flat().map(({ x, y }) => x * cosine + y * sine);
  const middle =
    (along.reduce((a, b) => Math.min(a, b), Infinity) + along.reduce((a, b) => Math.max(a, b), -Infinity)) / 2;
  for (const aside of asideMm) {
    const at = middle + aside;
    const through = { x: at * cosine, y: at * sine };
    const line = lineThrough(through, { x: through.x - sine, y: through.y + cosine }, piece);
    const cut = cutPath(piece.path, line);
    if (!cut) continue;
    const parts =
      looseParts(piece.path).length === 1 ? [cut.left, cut.right].flatMap(looseParts) : [cut.left, cut.right];
    return cut.left.length > 0 && cut.right.length > 0 ? parts : null;
  }
  return null;
}

/** A line through two points of the board, in a piece's own plane. */
function lineThrough(one: Point, other: Point, { placement }: Piece): CutLine {
  const [through, towards] = [unplacePoint(one, placement), unplacePoint(other, placement)];
  const length = Math.hypot(towards.x - through.x, towards.y - through.y);
  return { through, along: { x: (towards.x - through.x) / length, y: (towards.y - through.y) / length } };
}

/** The rings of a path, those that hang together in one part. */
function looseParts(path: Path): Path[] {
  const flat = path.map((ring) => ({ ring, polygon: flattenRing(ring) }));
  const ringOf = new Map(flat.map(({ ring, polygon }) => [polygon, ring]));
  return connectedPieces(flat.map(({ polygon }) => polygon)).map((part) =>
    part.flatMap((polygon) => ringOf.get(polygon) ?? []),
  );
}

/** Ids like a piece's own that nothing in the document has. */
function freeIds(id: string, count: number, { layers }: MockupDocument): string[] {
  const taken = new Set(
    layers.flatMap(({ pieces, hold }) =>
      [...pieces, ...(hold.kind === "standoff" ? hold.holes : [])].map((one) => one.id),
    ),
  );
  const free: string[] = [];
  for (let number = 1; free.length < count; number++) {
    const next = `${id.slice(0, 56)}-${number}`;
    if (!taken.has(next)) free.push(next);
  }
  return free;
}

const changeable = (path: Path): Piece["path"] =>
  path.map(({ start, segments }) => ({ start, segments: [...segments] }));
