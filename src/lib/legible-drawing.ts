import type { DisplayList, Item } from "#shared/drawing/display-list.ts";

/** No lettering on a screen is smaller than this (our own floor). */
const leastPx = 12.5;
/** Lettering that grows by more than this runs into its neighbours, so the lesser dimensions step back. */
const mostGrowth = 1.3;

const isNested = (item: Item): item is Extract<Item, { kind: "clip" | "group" }> =>
  item.kind === "clip" || item.kind === "group";

const isLesserDimension = (item: Item): boolean =>
  item.kind === "group" && (item.id?.startsWith("dimension:") ?? false) && item.id !== "dimension:overall";

/** Em size in mm of the smallest lettering, or null for a picture without any. */
export function smallestLetteringMm(items: readonly Item[]): number | null {
  const sizes = items.flatMap((item): number[] => {
    if (item.kind === "text") return [item.sizeMm];
    if (!isNested(item)) return [];
    const within = smallestLetteringMm(item.items);
    return within === null ? [] : [within * (item.kind === "group" ? item.scale : 1)];
  });
  return sizes.length === 0 ? null : Math.min(...sizes);
}

/** Whether all lettering of a picture reaches 12.5 px at `scale` px a mm. */
export function isLegible(list: DisplayList, scale: number): boolean {
  const smallest = smallestLetteringMm(list.items);
  return smallest === null || smallest * scale >= leastPx;
}

/**
 * The picture as it can be read at `scale` px a mm: the same when its lettering is large enough, else with larger
 * lettering. Where that would crowd it only the overall dimensions stay; the others come back at a larger scale.
 */
export function legibleAt(list: DisplayList, scale: number): DisplayList {
  const smallest = smallestLetteringMm(list.items);
  if (smallest === null || smallest * scale >= leastPx) return list;
  const growth = leastPx / (smallest * scale);
  return { ...list, items: enlarged(list.items, growth, { isOverall: false }) };
}

function enlarged(items: readonly Item[], growth: number, { isOverall }: { isOverall: boolean }): Item[] {
  const crowds = growth > mostGrowth;
  return items
    .filter((item) => !(crowds && isLesserDimension(item)))
    .map((item) => {
      if (item.kind === "text") {
        const by = isOverall ? growth : Math.min(growth, mostGrowth);
        return { ...item, sizeMm: item.sizeMm * by };
      }
      if (!isNested(item)) return item;
      const within = isOverall || (item.kind === "group" && item.id === "dimension:overall");
      return { ...item, items: enlarged(item.items, growth, { isOverall: within }) };
    });
}
