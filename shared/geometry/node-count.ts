import type { Path } from "./path.ts";

/**
 * Nodes of a path: the points that its segments start and end at, each counted once. A ring that returns to its start by
 * itself has no extra one. What a cutter's file holds, and what makes outlines slow to draw.
 */
export function nodeCount(path: Path): number {
  return path.reduce((count, { start, segments }) => {
    const last = segments.at(-1)?.to;
    const returns = last !== undefined && last.x === start.x && last.y === start.y;
    return count + segments.length + (returns ? 0 : 1);
  }, 0);
}
