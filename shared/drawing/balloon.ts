import type { Point } from "../geometry/path.ts";
import { circlePath } from "../geometry/shapes.ts";
import { fineLineMm, type PaperScale } from "./dimensions.ts";
import type { Item } from "./display-list.ts";
import { graphite, ink, sheetWhite } from "./palette.ts";
import { capHeightShare, smallTextMm } from "./type.ts";

/** Radius on paper of the circle around a key or a number. */
export const balloonRadiusMm = 2.9;

/** A key in a circle, its middle at `at` (ISO 6433: item references in circles, led to the part by a line). */
export function drawBalloon(key: string, at: Point, paperScale: PaperScale, colour = ink): Item[] {
  const size = smallTextMm * paperScale;
  return [
    {
      kind: "path",
      path: circlePath(at, balloonRadiusMm * paperScale),
      fill: sheetWhite,
      stroke: { colour, widthMm: fineLineMm * 1.4 * paperScale },
    },
    {
      kind: "text",
      text: key,
      at: { x: at.x, y: at.y + (size * capHeightShare) / 2 },
      sizeMm: size,
      font: "serif-bold",
      colour,
      align: "middle",
    },
  ];
}

/** A fine line through the points, with a dot at the first: where a leader touches the part it speaks of. */
export function drawLeader(points: readonly Point[], paperScale: PaperScale): Item[] {
  const [foot] = points;
  if (!foot) return [];
  return [
    { kind: "line", points, stroke: { colour: graphite, widthMm: fineLineMm * paperScale } },
    {
      kind: "path",
      path: circlePath(foot, 0.6 * paperScale),
      fill: graphite,
      // Dark parts would swallow a dark dot.
      stroke: { colour: sheetWhite, widthMm: 0.18 * paperScale },
    },
  ];
}
