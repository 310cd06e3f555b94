import type { Box } from "../geometry/path.ts";

/** Which of its edges, or which of its middles, a thing is lined up by. */
export const linedUpBy = ["left", "centre", "right", "top", "middle", "bottom"] as const;
export type LinedUpBy = (typeof linedUpBy)[number];

/** How far a box goes, mm, so that this edge or middle of it lies on the same of another box. */
export function lineUpShift(box: Box, other: Box, by: LinedUpBy): { readonly dx: number; readonly dy: number } {
  switch (by) {
    case "left":
      return { dx: other.x - box.x, dy: 0 };
    case "centre":
      return { dx: other.x + other.width / 2 - (box.x + box.width / 2), dy: 0 };
    case "right":
      return { dx: other.x + other.width - (box.x + box.width), dy: 0 };
    case "top":
      return { dx: 0, dy: other.y - box.y };
    case "middle":
      return { dx: 0, dy: other.y + other.height / 2 - (box.y + box.height / 2) };
    case "bottom":
      return { dx: 0, dy: other.y + other.height - (box.y + box.height) };
  }
}
