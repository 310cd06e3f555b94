import { regionAreaMm2 } from "../geometry/area.ts";
import { boxesOverlap, boxOfRegion } from "../geometry/box.ts";
import { connectedPieces } from "../geometry/connected.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { tracerOf } from "./drawn-rings.ts";
import { coveredBy, type Outline, type Shaped, shapedFromRegion } from "./shaped.ts";

export type Named<T> = T & { readonly id: string };

/** Pieces that become one; at least two. */
export type Joined = { readonly ids: readonly string[]; readonly shaped: Shaped };

/** What lies over each other by less than this only meets in a point, mm². */
export const leastOverlapMm2 = 1e-4;

/**
 * Joins outlines where they overlap or lie edge to edge. Each group that hangs together becomes one outline; what touches
 * no other is not among them. Groups come in the order of their first outline.
 */
export function joinOutlines(outlines: readonly Named<Outline>[], kernel: Kernel): Joined[] {
  const covered = outlines.map((outline) => ({ id: outline.id, region: coveredBy(outline, kernel) }));
  const all = kernel.union(
    covered.flatMap(({ region }) => region),
    "nonzero",
  );
  // An outline of several parts holds the parts together that it lies in.
  let groups: { ids: string[]; region: Region }[] = connectedPieces(all).map((region) => ({ ids: [], region }));
  for (const { id, region } of covered) {
    const [own, others] = parted(groups, (group) => overlaps(group.region, region, kernel));
    const ids = [...own.flatMap((group) => group.ids), id];
    groups = [...others, { ids, region: own.flatMap((group) => group.region) }];
  }
  const trace = tracerOf(outlines);
  const order = new Map(outlines.map(({ id }, index) => [id, index]));
  return groups
    .filter(({ ids }) => ids.length > 1)
    .map(({ ids, region }) => ({ ids: ids.toSorted((a, b) => (order.get(a) ?? 0) - (order.get(b) ?? 0)), region }))
    .toSorted((a, b) => (order.get(a.ids[0] ?? "") ?? 0) - (order.get(b.ids[0] ?? "") ?? 0))
    .flatMap(({ ids, region }) => {
      const shaped = shapedFromRegion(region, trace);
      return shaped ? [{ ids, shaped }] : [];
    });
}

/** Whether two regions share ground, not only an edge. */
export function overlaps(a: Region, b: Region, kernel: Kernel): boolean {
  const [boxA, boxB] = [boxOfRegion(a), boxOfRegion(b)];
  if (!boxA || !boxB || !boxesOverlap(boxA, boxB)) return false;
  return regionAreaMm2(kernel.intersect(a, b)) > leastOverlapMm2;
}

function parted<T>(list: readonly T[], is: (one: T) => boolean): readonly [T[], T[]] {
  const yes: T[] = [];
  const no: T[] = [];
  for (const one of list) (is(one) ? yes : no).push(one);
  return [yes, no];
}
