import type { Kernel } from "../geometry/kernel.ts";
import type { Point } from "../geometry/path.ts";
import { rectanglePath } from "../geometry/shapes.ts";
import type { MockupDocument } from "../mockup/document.ts";
import { frameOf } from "../stack/backer.ts";
import { boardPath } from "../stack/board-outline.ts";
import type { Figures } from "../stack/figures.ts";
import { signBox } from "../stack/sign-box.ts";
import type { LengthUnit } from "../units/length.ts";
import { drawBoardFace } from "./board-face.ts";
import type { PaperScale } from "./dimensions.ts";
import type { DisplayList, Item } from "./display-list.ts";
import { dimensionMargins, drawElevationDimensions } from "./elevation-dimensions.ts";
import { drawSolids, drawWallShadow } from "./elevation-pieces.ts";
import { drawFrameFace } from "./frame-face.ts";
import { placedStandoffs } from "./hardware.ts";
import { shadowOffsetMm } from "./light.ts";
import { sheetWhite } from "./palette.ts";

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
export function bareMarginMm({ document, figures }: Pick<ElevationInput, "document" | "figures">): number {
  const { hanging, presentation } = document;
  const { width, height } = signBox(document);
  const longer = Math.max(width, height);
  const fall = shadowOffsetMm(
    Math.max(figures.backerTop.nominal, document.frame?.depth ?? 0) + hanging.gap,
    presentation.light,
  );
  return Math.max(longer * bareMargin, Math.min(fall * 1.35, longer / 2));
}

/** Where the board's upper left corner lies in a picture made by `drawElevation` or `drawSection`; null in any other. */
export function boardOriginOf(list: DisplayList): Point | null {
  const plane = list.items.find((item) => item.kind === "group" && item.id === boardPlaneId);
  return plane?.kind === "group" ? { x: plane.x, y: plane.y } : null;
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
  const whole = signBox(document);
  const bare = bareMarginMm(input);
  const margins = dimensions
    ? dimensionMargins(input)
    : {
        left: bare - whole.x,
        top: bare - whole.y,
        right: bare + whole.x + whole.width - width,
        bottom: bare + whole.y + whole.height - height,
      };
  const frame = frameOf(document, kernel);
  const widthMm = margins.left + width + margins.right;
  const heightMm = margins.top + height + margins.bottom;
  const sign = {
    document,
    figures,
    kernel,
    standoffs: placedStandoffs(document, figures),
    lineMm: 0.16 * paperScale,
    frame: frame?.ok
      ? {
          region: frame.value.members.map(({ outline }) => outline),
          items: drawFrameFace({ document, frame: frame.value, kernel, box: whole, paperScale }),
        }
      : null,
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
    ...drawSolids(sign, { box, outline, items: drawBoardFace(input, box, outline) }),
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
