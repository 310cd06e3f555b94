import type { Kernel } from "../geometry/kernel.ts";
import type { Box, Path, Point } from "../geometry/path.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import type { MockupDocument } from "../mockup/document.ts";
import { faceStock } from "../stack/backer.ts";
import { boardPath } from "../stack/board-outline.ts";
import type { Figures } from "../stack/figures.ts";
import type { LengthUnit } from "../units/length.ts";
import { outlineMm, type PaperScale } from "./dimensions.ts";
import type { DisplayList, Item } from "./display-list.ts";
import { dimensionMargins, drawElevationDimensions } from "./elevation-dimensions.ts";
import { drawSolids, drawWallShadow } from "./elevation-pieces.ts";
import { faceColour } from "./face-colour.ts";
import { placedStandoffs } from "./hardware.ts";
import { shadowOffsetMm } from "./light.ts";
import { mixColours, sheetWhite } from "./palette.ts";
import { woodGrain } from "./wood-grain.ts";

export type ElevationInput = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly kernel: Kernel;
  readonly unit: LengthUnit;
  /** Dimension lines outside the board, or the sign alone. */
  readonly dimensions: boolean;
  /** Millimetres of the sign that make one on paper: 5 at 1:5. Lettering and lines are sized by it. */
  readonly paperScale: PaperScale;
  /** The wall around the board, with the shadow the board throws on it; without it the sign stands on bare paper. */
  readonly wall: boolean;
  /** A PNG of the board's face in place of the generated grain. */
  readonly texture?: { readonly pngBase64: string };
};

/** Name of the group whose plane is the board's own: x right and y down from its upper left corner. */
export const boardPlaneId = "board-plane";

/** Share of the longer side that is left around a sign without dimensions. */
const bareMargin = 0.09;

/** Room around a sign without dimensions: a share of its longer side, or what the board's shadow on the wall needs if that is more. */
function bareMarginMm({ document, figures }: Pick<ElevationInput, "document" | "figures">): number {
  const { board, hanging, presentation } = document;
  const longer = Math.max(board.width, board.height);
  const fall = shadowOffsetMm(figures.backerTop.nominal + hanging.gap, presentation.light);
  return Math.max(longer * bareMargin, Math.min(fall * 1.35, longer / 2));
}

/** Where the board's upper left corner lies in a picture made by `drawElevation` or `drawSection`; null in any other. */
export function boardOriginOf(list: DisplayList): Point | null {
  const plane = list.items.find((item) => item.kind === "group" && item.id === boardPlaneId);
  return plane?.kind === "group" ? { x: plane.x, y: plane.y } : null;
}

function drawBoard({ document, texture, paperScale }: ElevationInput, box: Box, outline: Path): Item[] {
  const { name } = faceStock(document.backer);
  const colour = faceColour(document.backer);
  const seed = [...name].reduce((sum, character) => (sum * 31 + (character.codePointAt(0) ?? 0)) % 9973, 17);
  const face: Item = texture
    ? { kind: "image", box, pngBase64: texture.pngBase64 }
    : woodGrain(box, colour, seed, document.backer.grainTurn);
  return [
    { kind: "path", id: "board", path: outline, fill: colour },
    { kind: "clip", clip: outline, items: [face] },
    {
      kind: "path",
      path: outline,
      stroke: { colour: mixColours(colour, "#2A1E0C", 0.68), widthMm: outlineMm * 0.9 * paperScale },
    },
  ];
}

/**
 * The sign from the front, 1:1 in mm of the sign: board, layers lowest first with their shadows, caps, dimensions outside.
 * Pieces carry their ids, standoffs `hole:` and their hole's id, layers `layer:` and their key, the backer `board`.
 * Hidden layers are left out.
 */
export function drawElevation(input: ElevationInput): DisplayList {
  const { document, figures, kernel, dimensions, paperScale, wall } = input;
  const { width, height } = document.board;
  const box = { x: 0, y: 0, width, height };
  const outline = boardPath(document.board);
  const bare = bareMarginMm(input);
  const margins = dimensions ? dimensionMargins(input) : { left: bare, top: bare, right: bare, bottom: bare };
  const widthMm = margins.left + width + margins.right;
  const heightMm = margins.top + height + margins.bottom;
  const sign = {
    document,
    figures,
    kernel,
    standoffs: placedStandoffs(document, figures),
    lineMm: 0.16 * paperScale,
  };
  const wallBox = { x: -margins.left, y: -margins.top, width: widthMm, height: heightMm };
  const ground: Item[] = wall
    ? [
        { kind: "path", path: rectanglePath(wallBox), fill: document.presentation.wall },
        ...drawWallShadow(sign, outline, wallBox),
      ]
    : [];
  const items = [
    ...ground,
    ...drawSolids(sign, { box, outline, items: drawBoard(input, box, outline) }),
    ...(dimensions
      ? drawElevationDimensions({ ...input, ground: wall ? document.presentation.wall : sheetWhite })
      : []),
  ];
  return {
    widthMm,
    heightMm,
    items: [{ kind: "group", id: boardPlaneId, x: margins.left, y: margins.top, scale: 1, items }],
  };
}
