import type { Coat, MockupDocument, Wood } from "#shared/mockup/document.ts";

import { leastBoardMm, longestMm } from "#shared/mockup/schema-parts.ts";
import { lengthOf } from "../limits.ts";
import { withFields } from "../same.ts";
import { movePieces } from "./pieces.ts";

export type BoardFields = {
  readonly width?: number;
  readonly height?: number;
  readonly stock?: Wood;
  readonly thickness?: number;
  readonly grainTurn?: number;
  readonly finish?: readonly Coat[];
  readonly hanging?: MockupDocument["hanging"];
  readonly quantity?: number;
  readonly wall?: string;
  readonly light?: MockupDocument["presentation"]["light"];
  readonly viewingDistance?: number;
};

/**
 * Sets what is given of the board, its backer, hanging and showing. A value that a document can't hold is left as it was.
 * A board of another size grows or shrinks about its middle: what is centred on it stays so.
 */
export function setBoard(document: MockupDocument, fields: BoardFields): MockupDocument {
  const changed = withBoardFields(document, fields);
  return movePieces(changed, {
    pieceIds: document.layers.flatMap(({ pieces }) => pieces.map(({ id }) => id)),
    dx: (changed.board.width - document.board.width) / 2,
    dy: (changed.board.height - document.board.height) / 2,
  });
}

function withBoardFields(document: MockupDocument, fields: BoardFields): MockupDocument {
  const { board, backer, hanging, presentation, quantity } = document;
  return withFields(document, {
    board: withFields(board, {
      width: lengthOf(fields.width ?? board.width, longestMm, leastBoardMm) ?? board.width,
      height: lengthOf(fields.height ?? board.height, longestMm, leastBoardMm) ?? board.height,
    }),
    backer: withFields(backer, {
      stock: fields.stock ?? backer.stock,
      thickness: lengthOf(fields.thickness ?? backer.thickness, 200) ?? backer.thickness,
      grainTurn: isWithin(fields.grainTurn ?? -1, 0, 180) ? (fields.grainTurn ?? backer.grainTurn) : backer.grainTurn,
      finish: fields.finish ? [...fields.finish].slice(0, 12) : backer.finish,
    }),
    hanging: fields.hanging && isWithin(fields.hanging.gap, 0, 500) ? fields.hanging : hanging,
    quantity:
      fields.quantity !== undefined && Number.isInteger(fields.quantity) && isWithin(fields.quantity, 1, 1000)
        ? fields.quantity
        : quantity,
    presentation: withFields(presentation, {
      wall: fields.wall && /^#[0-9A-F]{6}$/.test(fields.wall) ? fields.wall : presentation.wall,
      light: fields.light && isLight(fields.light) ? fields.light : presentation.light,
      viewingDistance:
        lengthOf(fields.viewingDistance ?? presentation.viewingDistance, 200_000) ?? presentation.viewingDistance,
    }),
  });
}

function isLight({ azimuth, elevation, angularSize }: MockupDocument["presentation"]["light"]): boolean {
  return isWithin(azimuth, 0, 360) && isWithin(elevation, 10, 90) && isWithin(angularSize, 0, 1);
}

/** False for what is no number, too. */
function isWithin(value: number, least: number, most: number): boolean {
  return value >= least && value <= most;
}
