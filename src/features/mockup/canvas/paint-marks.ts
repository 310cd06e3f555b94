import { Circle, type FabricObject, Rect } from "fabric/es";
import { boxUnion } from "#shared/geometry/box.ts";
import type { Box } from "#shared/geometry/path.ts";
import type { Marks } from "./marks.ts";
import { paintCovers } from "./paint-covers.ts";
import { paintGuides } from "./paint-guides.ts";
import { paintMeasures } from "./paint-measures.ts";
import { paintSweep } from "./paint-sweep.ts";

/** The theme's indigo (what is chosen) and oxblood (what a finding points at): a canvas has no classes. */
const indigo = "#34416B";
const oxblood = "#7A1F2B";

const still = { selectable: false, evented: false, objectCaching: false, fill: "transparent" } as const;

/**
 * Marks over the picture. Their lines keep their width on the screen: `mmPerPx` is what a pixel is on the board, `window` what is seen of its
 * plane.
 */
export function paintMarks(marks: Marks, mmPerPx: number, window: Box): FabricObject[] {
  const { chosen, hole, covers, guides, measures, sweep, spot } = marks;
  const px = (count: number) => count * mmPerPx;
  const dashed = { ...still, stroke: indigo, strokeWidth: px(1.5), strokeDashArray: [px(6), px(4)] };
  const around = boxUnion(chosen);
  const ring = (at: { x: number; y: number }, radius: number, stroke: string) =>
    new Circle({ ...still, left: at.x, top: at.y, radius, stroke, strokeWidth: px(2) });
  return [
    ...(around
      ? [
          new Rect({
            ...dashed,
            left: around.x + around.width / 2,
            top: around.y + around.height / 2,
            width: around.width + px(4),
            height: around.height + px(4),
          }),
        ]
      : []),
    ...paintCovers(covers, mmPerPx),
    ...paintGuides(guides, mmPerPx),
    ...paintMeasures(measures, window, mmPerPx),
    ...(sweep ? paintSweep(sweep, mmPerPx) : []),
    ...(hole ? [ring(hole, hole.diameter / 2 + px(4), indigo)] : []),
    ...(spot ? [ring(spot, px(18), oxblood), ring(spot, px(3), oxblood)] : []),
  ];
}
