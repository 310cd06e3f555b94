import { useMemo } from "react";
import { pathToText } from "#shared/geometry/path-text.ts";
import { placePath } from "#shared/geometry/placement.ts";
import type { MockupDocument, Piece } from "#shared/mockup/document.ts";

type StepOffPictureProps = {
  readonly before: MockupDocument;
  readonly after: MockupDocument;
  readonly pieceIds: readonly string[];
};

/** Room round the board, as a share of its larger side. */
const marginShare = 0.06;

/** Outlines of the sign as it would be: what comes or moves is filled, the rest thin. */
export function StepOffPicture({ before, after, pieceIds }: StepOffPictureProps) {
  const { width, height } = after.board;
  const margin = Math.max(width, height) * marginShare;
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
      viewBox={`${-margin} ${-margin} ${width + 2 * margin} ${height + 2 * margin}`}
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
