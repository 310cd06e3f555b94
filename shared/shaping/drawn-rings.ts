import { signedRingArea } from "../geometry/area.ts";
import { fitRing } from "../geometry/fit-ring.ts";
import { flattenRing } from "../geometry/flatten.ts";
import type { Path, Point, Polygon, Ring } from "../geometry/path.ts";
import { placePath } from "../geometry/placement.ts";
import { fitMm, flatMm, type Outline } from "./shaped.ts";

type DrawnRing = { readonly ring: Ring; readonly corners: ReadonlySet<string>; readonly areaMm2: number };

/** Tells which rings of a worked-out region are rings as they were drawn, so that those keep their own curves. */
export type Tracer = (region: readonly Polygon[]) => Path;

const gridText = ({ x, y }: Point): string => `${Math.round(x * 1000)} ${Math.round(y * 1000)}`;

/**
 * Traces regions that were made of outlines: a ring with no corner but those of a drawn one, and its area, is that very ring
 * on the board; any other is fitted again.
 */
export function tracerOf(outlines: readonly Outline[]): Tracer {
  const drawn = outlines
    .flatMap(({ path, placement }) => placePath(path, placement))
    .map((ring): DrawnRing => {
      const polygon = flattenRing(ring, flatMm);
      return { ring, corners: new Set(polygon.map(gridText)), areaMm2: Math.abs(signedRingArea(polygon)) };
    });
  return (region) => region.map((polygon) => drawnAs(polygon, drawn) ?? fitRing(polygon, fitMm));
}

function drawnAs(polygon: Polygon, drawn: readonly DrawnRing[]): Ring | null {
  const areaMm2 = Math.abs(signedRingArea(polygon));
  // The grid moves each corner by half a step at most.
  const slackMm2 = 0.001 * perimeterMm(polygon) + 1e-6;
  const like = drawn.find(
    (one) => Math.abs(one.areaMm2 - areaMm2) <= slackMm2 && polygon.every((point) => one.corners.has(gridText(point))),
  );
  return like?.ring ?? null;
}

function perimeterMm(polygon: Polygon): number {
  return polygon.reduce((sum, { x, y }, index) => {
    const next = polygon[(index + 1) % polygon.length] ?? { x, y };
    return sum + Math.hypot(next.x - x, next.y - y);
  }, 0);
}
