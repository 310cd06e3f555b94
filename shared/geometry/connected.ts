import type { Region } from "./path.ts";
import { ringsAround } from "./ring-depths.ts";

/**
 * Splits a region without crossings, as the kernel returns it, into its connected pieces: each an outer ring first and
 * its holes after it. Parts that meet in single points count as separate: nothing would hold them together.
 * Pieces come in the order of their outer rings.
 */
export function connectedPieces(region: Region): Region[] {
  const around = ringsAround(region);
  const pieces = new Map<number, number[]>();
  for (const [index, list] of around.entries()) if (list.length % 2 === 0) pieces.set(index, [index]);
  for (const [index, list] of around.entries()) {
    if (list.length % 2 === 0) continue;
    // A hole belongs to the innermost ring around it: the one that itself lies in the most rings.
    const owner = list.reduce<number | null>((deepest, candidate) => {
      const depth = around[candidate]?.length ?? 0;
      return deepest === null || depth > (around[deepest]?.length ?? 0) ? candidate : deepest;
    }, null);
    if (owner !== null) pieces.get(owner)?.push(index);
  }
  return [...pieces.values()].map((rings) => rings.map((index) => region[index] ?? []));
}
