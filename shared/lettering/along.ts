import type { Point } from "../geometry/path.ts";
import type { Lettering } from "../mockup/document.ts";

/** Where a letter stands: the foot of its middle about the lettering's own origin, mm, and its turn in degrees clockwise. */
export type Foot = Point & { readonly turn: number };

type Along = Lettering["along"];

/** Radius of the arc that a line of words stands on: the lines follow each other downwards as on a page. */
export const radiusOfLine = ({ radius, side }: Extract<Along, { kind: "arc" }>, down: number): number =>
  side === "over" ? radius - down : radius + down;

/**
 * The place `across` mm along a line that lies `down` mm under the first: on an arc, measured along the arc of that line. The
 * origin is where the middle of the words stands on the first line: the highest point of an arc that they go over, the
 * lowest of one that they hang in. There the letters stand upright.
 */
export function footAlong(along: Along, { across, down }: { readonly across: number; readonly down: number }): Foot {
  if (along.kind === "line") return { x: across, y: down, turn: 0 };
  const radius = radiusOfLine(along, down);
  const angle = across / radius;
  const degrees = (angle * 180) / Math.PI;
  return along.side === "over"
    ? { x: radius * Math.sin(angle), y: along.radius - radius * Math.cos(angle), turn: degrees }
    : { x: radius * Math.sin(angle), y: radius * Math.cos(angle) - along.radius, turn: -degrees };
}

/**
 * The other way: how far along and how far down a point about the lettering's origin lies, as if the words stood on a straight
 * line. Along an arc it is measured on the first line's radius, up to half way round to either side.
 */
export function unrolled(along: Along, { x, y }: Point): { readonly across: number; readonly down: number } {
  if (along.kind === "line") return { across: x, down: y };
  const { radius } = along;
  const up = along.side === "over" ? radius - y : radius + y;
  const away = Math.hypot(x, up);
  return { across: Math.atan2(x, up) * radius, down: along.side === "over" ? radius - away : away - radius };
}
