import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Box } from "../geometry/path.ts";
import { pathOfRegion } from "../geometry/path-of-region.ts";
import type { MockupDocument } from "../mockup/document.ts";
import { frameOf } from "../stack/backer.ts";
import { boardPath } from "../stack/board-outline.ts";
import type { Figures } from "../stack/figures.ts";
import { signBox } from "../stack/sign-box.ts";
import type { LengthUnit } from "../units/length.ts";
import { drawBoardFace } from "./board-face.ts";
import type { DisplayList, Item } from "./display-list.ts";
import { bareMarginMm, boardPlaneId } from "./elevation.ts";
import { drawLevels, drawWallShadow } from "./elevation-pieces.ts";
import { faceColour } from "./face-colour.ts";
import { drawFrameFace } from "./frame-face.ts";
import { placedStandoffs } from "./hardware.ts";
import { ink, mixColours } from "./palette.ts";

/** One plane of the picture and how far it stands off the wall. */
export type WallPlane = { readonly offWallMm: number; readonly list: DisplayList };

/**
 * The sign without its wall, in planes that a camera sees apart: the shadow on the wall first, then the board's body
 * in slices, its face, and each level that stands before it. All planes have the same size, and `box` is what they show, mm on the board.
 */
export type OnWall = { readonly box: Box; readonly planes: readonly WallPlane[] };

export type OnWallInput = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly kernel: Kernel;
  readonly unit: LengthUnit;
};

/** Slices through the board's body: close enough to run together at any slant that a sign is looked at from. */
const bodySlices = 8;
/** The edge of a board in its own shade. */
const edgeShade = 0.38;

/** A line is fine on a wall, whatever the size of the sign: a share of its longer side. */
const lineShare = 0.0004;

/** The sign on its wall, in planes. Hidden layers are left out. */
export function drawOnWall({ document, figures, kernel, unit }: OnWallInput): OnWall {
  const { board, hanging } = document;
  const face = { x: 0, y: 0, width: board.width, height: board.height };
  const outline = boardPath(board);
  const whole = signBox(document);
  const margin = bareMarginMm({ document, figures });
  const box = {
    x: whole.x - margin,
    y: whole.y - margin,
    width: whole.width + 2 * margin,
    height: whole.height + 2 * margin,
  };
  const frame = frameOf(document, kernel);
  const members = frame?.ok ? frame.value.members.map((member) => member.outline) : [];
  const paperScale = (lineShare * Math.max(whole.width, whole.height)) / 0.16;
  const sign = {
    document,
    figures,
    kernel,
    standoffs: placedStandoffs(document, figures),
    lineMm: 0.16 * paperScale,
    frame: frame?.ok
      ? {
          region: members,
          items: drawFrameFace({ document, frame: frame.value, kernel, box: whole, paperScale }),
        }
      : null,
  };
  const view = { document, figures, kernel, unit, dimensions: false, paperScale, wall: false };
  const plane = (offWallMm: number, items: readonly Item[]): WallPlane => ({
    offWallMm,
    list: {
      widthMm: box.width,
      heightMm: box.height,
      items: [{ kind: "group", id: boardPlaneId, x: -box.x, y: -box.y, scale: 1, items }],
    },
  });
  const body = pathOfRegion(kernel.union([...flattenPath(outline), ...members], "nonzero"));
  const edge: Item = { kind: "path", path: body, fill: mixColours(faceColour(document.backer), ink, edgeShade) };
  const top = figures.backerTop.nominal;
  return {
    box,
    planes: [
      plane(0, drawWallShadow(sign, outline, box)),
      ...Array.from({ length: bodySlices }, (_, index) => plane(hanging.gap + (top * index) / bodySlices, [edge])),
      ...drawLevels(sign, { box: face, outline, items: drawBoardFace(view, face, outline) }).map(({ topMm, items }) =>
        plane(hanging.gap + topMm, items),
      ),
    ],
  };
}
