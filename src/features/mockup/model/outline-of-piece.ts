import { boxOfPath } from "#shared/geometry/box.ts";
import type { Box, Path } from "#shared/geometry/path.ts";
import { placePath } from "#shared/geometry/placement.ts";
import { matrixMultiply, pathTransform, scaleMatrix, translateMatrix } from "#shared/geometry/transform.ts";
import type { Board, MockupDocument } from "#shared/mockup/document.ts";
import { roundMm } from "./limits.ts";
import { nameOfPiece } from "./piece-name.ts";

/** The outer ring of a piece where it lies on the board, and its box. */
export type PieceOutline = { readonly path: Path; readonly box: Box };

export type OutlineChoice = { readonly pieceId: string; readonly name: string } & Pick<Box, "width" | "height">;

/** A list that a person still reads; what is smaller is hardly a board. */
const mostChoices = 40;

/** The largest pieces of the sign, whose outline a board could take; largest first. */
export function outlineChoices(document: MockupDocument): readonly OutlineChoice[] {
  return document.layers
    .flatMap((layer) =>
      layer.pieces.flatMap((piece, index): OutlineChoice[] => {
        const outline = outlineOfPiece(document, piece.id);
        const name = `${layer.key}, ${nameOfPiece(piece, index)}`;
        return outline ? [{ pieceId: piece.id, name, width: outline.box.width, height: outline.box.height }] : [];
      }),
    )
    .toSorted((a, b) => b.width * b.height - a.width * a.height)
    .slice(0, mostChoices);
}

/** null for a piece that there isn't, or that has no ring with a width and a height. */
export function outlineOfPiece(document: MockupDocument, pieceId: string): PieceOutline | null {
  const piece = document.layers.flatMap(({ pieces }) => pieces).find(({ id }) => id === pieceId);
  if (!piece) return null;
  let outer: PieceOutline | null = null;
  for (const ring of placePath(piece.path, piece.placement)) {
    const box = boxOfPath([ring]);
    if (!box || box.width === 0 || box.height === 0) continue;
    if (outer === null || box.width * box.height > outer.box.width * outer.box.height) outer = { path: [ring], box };
  }
  return outer;
}

/** As the outline of a board of that size: from its upper left corner, stretched to its measures. */
export function boardOutline({ path, box }: PieceOutline, size: Pick<Board, "width" | "height">): Board["outline"] {
  const stretch = scaleMatrix(size.width / box.width, size.height / box.height);
  const placed = pathTransform(path, matrixMultiply(stretch, translateMatrix(-box.x, -box.y)));
  const round = ({ x, y }: { x: number; y: number }) => ({ x: roundMm(x), y: roundMm(y) });
  return {
    kind: "path",
    path: placed.map(({ start, segments }) => ({
      start: round(start),
      segments: segments.map((segment) =>
        segment.kind === "line"
          ? { kind: "line", to: round(segment.to) }
          : { kind: "cubic", c1: round(segment.c1), c2: round(segment.c2), to: round(segment.to) },
      ),
    })),
  };
}
