import { roundMm } from "./limits.ts";

/** A depth that a layer let in catches on, mm, and what it is called. */
export type PocketCatch = { readonly depth: number; readonly what: "half in" | "flush" | "deepest" };

/** Two depths nearer than this are one for the hand, mm. */
const alikeMm = 0.05;

/**
 * Depths that mean something for a piece of `thickness` let into what takes a pocket of `deepest` at most (rule 19; null
 * where that is not known), mm, shallowest first: half of it in, its face flush, and the deepest. None is deeper than that.
 */
export function pocketCatches({
  thickness,
  deepest,
}: {
  readonly thickness: number;
  readonly deepest: number | null;
}): PocketCatch[] {
  const most = deepest ?? Number.POSITIVE_INFINITY;
  const wanted: PocketCatch[] = [
    { depth: roundMm(thickness / 2), what: "half in" },
    { depth: roundMm(thickness), what: "flush" },
    { depth: most, what: "deepest" },
  ];
  return wanted
    .filter(({ depth }) => Number.isFinite(depth) && depth > 0 && depth <= most)
    .filter(({ depth }, index, all) => all.findIndex((other) => Math.abs(other.depth - depth) < alikeMm) === index)
    .toSorted((a, b) => a.depth - b.depth);
}

/** The nearest catch within `reachMm` of a depth, else the depth to a tenth of a mm. */
export function catchDepth(depth: number, catches: readonly PocketCatch[], reachMm: number): number {
  let nearest: number | null = null;
  for (const { depth: at } of catches)
    if (Math.abs(at - depth) <= reachMm && (nearest === null || Math.abs(at - depth) < Math.abs(nearest - depth)))
      nearest = at;
  return nearest ?? Math.round(depth * 10) / 10;
}

/** The next catch deeper or shallower than a depth, for steps by key; undefined past the last one. */
export function nextDepth(
  depth: number,
  catches: readonly PocketCatch[],
  direction: "deeper" | "shallower",
): number | undefined {
  const depths = catches.map((one) => one.depth);
  return direction === "deeper" ? depths.find((at) => at > depth + 0.001) : depths.findLast((at) => at < depth - 0.001);
}
