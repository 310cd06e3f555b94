import { type FabricObject, Line } from "fabric/es";
import type { Guide } from "../model/catch-guides.ts";

/** The theme's indigo: a canvas has no classes. */
const indigo = "#34416B";
const sheet = "#FFFFFF";

/** Lines that a moved box caught: middles as centre lines, edges and margins as thin ones. They run a little past what they line up. */
export function paintGuides(guides: readonly Guide[], mmPerPx: number): FabricObject[] {
  const px = (count: number) => count * mmPerPx;
  return guides.flatMap(({ axis, at, of, isMiddle, along }) => {
    const [from, to] = [along.from - px(18), along.to + px(18)];
    const ends: [number, number, number, number] = axis === "x" ? [at, from, at, to] : [from, at, to, at];
    const dash = isMiddle ? [14, 4, 2, 4] : of === "margin" ? [6, 4] : null;
    const still = { selectable: false, evented: false, objectCaching: false } as const;
    return [
      new Line(ends, { ...still, stroke: sheet, strokeWidth: px(3), opacity: 0.6 }),
      new Line(ends, {
        ...still,
        stroke: indigo,
        strokeWidth: px(1.25),
        strokeDashArray: dash?.map(px) ?? null,
      }),
    ];
  });
}
