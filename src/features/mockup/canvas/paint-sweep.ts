import { type FabricObject, Rect } from "fabric/es";
import type { Box } from "#shared/geometry/path.ts";
import type { Sweep } from "./marks.ts";

/** The theme's indigo: a canvas has no classes. */
const indigo = "#34416B";

/** The box that a hand draws round pieces, and those that lie wholly in it. */
export function paintSweep({ box, within }: Sweep, mmPerPx: number): FabricObject[] {
  const px = (count: number) => count * mmPerPx;
  const rectangle = (of: Box, look: { readonly fill: string; readonly strokeDashArray: number[] | null }) =>
    new Rect({
      selectable: false,
      evented: false,
      objectCaching: false,
      left: of.x + of.width / 2,
      top: of.y + of.height / 2,
      width: of.width,
      height: of.height,
      stroke: indigo,
      strokeWidth: px(1.25),
      ...look,
    });
  return [
    rectangle(box, { fill: "rgba(52, 65, 107, 0.1)", strokeDashArray: null }),
    ...within.map((one) => rectangle(one, { fill: "transparent", strokeDashArray: [px(6), px(4)] })),
  ];
}
