import { Circle, type FabricObject, type FabricObjectProps, Rect } from "fabric/es";
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
/** Under the dashes, so that they are seen on dark pieces. */
const sheet = "#FFFFFF";

const still = { selectable: false, evented: false, objectCaching: false, fill: "transparent" } as const;

/**
 * Marks over the picture. Their lines keep their width on the screen: `mmPerPx` is what a pixel is on the board, `window` what is seen of its
 * plane.
 */
export function paintMarks(marks: Marks, mmPerPx: number, window: Box): FabricObject[] {
  const { chosen, hole, covers, guides, measures, sweep, spot } = marks;
  const px = (count: number) => count * mmPerPx;
  const rectangle = (box: Box, look: Partial<FabricObjectProps>) =>
    new Rect({
      ...still,
      left: box.x + box.width / 2,
      top: box.y + box.height / 2,
      width: box.width + px(4),
      height: box.height + px(4),
      ...look,
    });
  const around = boxUnion(chosen);
  const ring = (at: { x: number; y: number }, radius: number, stroke: string) =>
    new Circle({ ...still, left: at.x, top: at.y, radius, stroke, strokeWidth: px(2) });
  return [
    ...(around
      ? [
          rectangle(around, { stroke: sheet, strokeWidth: px(3), opacity: 0.6 }),
          rectangle(around, { stroke: indigo, strokeWidth: px(1.5), strokeDashArray: [px(6), px(4)] }),
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
