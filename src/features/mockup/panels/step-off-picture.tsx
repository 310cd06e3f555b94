import { useMemo } from "react";
import { boxGrow, boxUnion } from "#shared/geometry/box.ts";
import { pathToText } from "#shared/geometry/path-text.ts";
import { placePath } from "#shared/geometry/placement.ts";
import type { MockupDocument, Piece } from "#shared/mockup/document.ts";
import { boxOfPieces } from "../model/commands/pieces.ts";

type StepOffPictureProps = {
  readonly before: MockupDocument;
  readonly after: MockupDocument;
  readonly pieceIds: readonly string[];
};

/** Room round all that is there, as a share of the larger side of the board. */
const marginShare = 0.06;

/** Outlines of the sign as it would be: what comes or moves is filled, the rest thin. */
export function StepOffPicture({ before, after, pieceIds }: StepOffPictureProps) {
  const { width, height } = after.board;
  const ground = useMemo(() => {
    const ids = piecesOf(after).map(({ id }) => id);
    const box = boxUnion([{ x: 0, y: 0, width, height }, boxOfPieces(after, ids)]);
    return box && boxGrow(box, Math.max(width, height) * marginShare);
  }, [after, width, height]);
  const drawn = useMemo(() => {
    const was = new Map(piecesOf(before).map((piece) => [piece.id, piece.placement]));
    const chosen = new Set(pieceIds);
    return piecesOf(after).map((piece) => ({
      id: piece.id,
      isMoved: chosen.has(piece.id) || was.get(piece.id) !== piece.placement,
      text: pathToText(placePath(piece.path, piece.placement), 1),
    }));
  }, [before, after, pieceIds]);
  return (
    <svg
      role="img"
      aria-label="The sign as it would be"
      viewBox={ground ? `${ground.x} ${ground.y} ${ground.width} ${ground.height}` : undefined}
      className="max-h-80 w-full border border-rule bg-linen"
    >
      <rect
        width={width}
        height={height}
        className="fill-sheet stroke-graphite"
        strokeWidth="1"
        vectorEffect="non-scaling-stroke"
      />
      {drawn.map(({ id, isMoved, text }) => (
        <path
          key={id}
          d={text}
          fillRule="evenodd"
          strokeWidth={isMoved ? 1.5 : 1}
          vectorEffect="non-scaling-stroke"
          className={isMoved ? "fill-indigo/25 stroke-indigo" : "fill-none stroke-rule"}
        />
      ))}
    </svg>
  );
}

const piecesOf = ({ layers }: MockupDocument): Piece[] => layers.flatMap(({ pieces }) => pieces);
