import type { DisplayList, Item } from "#shared/drawing/display-list.ts";
import { boxOfPath, boxOfPoints, boxUnion } from "#shared/geometry/box.ts";
import type { Box } from "#shared/geometry/path.ts";

/** No lettering on a screen is smaller than this (our own floor). */
const leastPx = 12.5;
/** Lettering that grows by more than this runs into its neighbours, so the lesser dimensions step back. */
const mostGrowth = 1.3;

const isNested = (item: Item): item is Extract<Item, { kind: "clip" | "group" }> =>
  item.kind === "clip" || item.kind === "group";

const isOverall = (item: Item): boolean => item.kind === "group" && item.id === "dimension:overall";

const isLesserDimension = (item: Item): boolean =>
  item.kind === "group" && (item.id?.startsWith("dimension:") ?? false) && !isOverall(item);

const holdsOverall = (items: readonly Item[]): boolean =>
  items.some((item) => isOverall(item) || (isNested(item) && holdsOverall(item.items)));

/** Em size in mm of the smallest lettering, or null for a picture without any. */
function smallestLetteringMm(items: readonly Item[]): number | null {
  const sizes = items.flatMap((item): number[] => {
    if (item.kind === "text") return [item.sizeMm];
    if (!isNested(item)) return [];
    const within = smallestLetteringMm(item.items);
    return within === null ? [] : [within * (item.kind === "group" ? item.scale : 1)];
  });
  return sizes.length === 0 ? null : Math.min(...sizes);
}

/** By how much the smallest lettering has to grow to be read at `scale` px a mm; 1 or less where it is large enough. */
function growthAt({ items }: DisplayList, scale: number): number {
  const smallest = smallestLetteringMm(items);
  return smallest === null ? 0 : leastPx / (smallest * scale);
}

/** Whether all lettering of a picture reaches 12.5 px at `scale` px a mm. */
export const isLegible = (list: DisplayList, scale: number): boolean => growthAt(list, scale) <= 1;

/** Whether lettering large enough to read at `scale` px a mm would run together, and lesser dimensions can be left out. */
export const isCrowded = (list: DisplayList, scale: number): boolean =>
  growthAt(list, scale) > mostGrowth && holdsOverall(list.items);

/** The picture with its overall dimensions alone. With `cropped` it ends at the right and below where its items end. */
export function withOverallAlone(list: DisplayList, { cropped }: { readonly cropped: boolean }): DisplayList {
  const items = withoutLesser(list.items);
  const extent = cropped ? extentOf(items) : null;
  if (extent === null) return { ...list, items };
  const edge = smallestLetteringMm(items) ?? 0;
  return {
    items,
    widthMm: Math.min(list.widthMm, extent.x + extent.width + edge),
    heightMm: Math.min(list.heightMm, extent.y + extent.height + edge),
  };
}

const withoutLesser = (items: readonly Item[]): Item[] =>
  items
    .filter((item) => !isLesserDimension(item))
    .map((item) => (isNested(item) ? { ...item, items: withoutLesser(item.items) } : item));

/** What the items cover; lettering is left out, since it stands at lines that are counted. */
const extentOf = (items: readonly Item[]): Box | null => boxUnion(items.map(extentOfItem));

function extentOfItem(item: Item): Box | null {
  switch (item.kind) {
    case "path":
      return boxOfPath(item.path);
    case "line":
      return boxOfPoints(item.points);
    case "image":
      return item.box;
    case "clip":
      return boxOfPath(item.clip);
    case "text":
      return null;
    case "group": {
      const box = extentOf(item.items);
      if (box === null) return null;
      const { x, y, scale } = item;
      return { x: x + box.x * scale, y: y + box.y * scale, width: box.width * scale, height: box.height * scale };
    }
  }
}

/**
 * The picture with lettering that can be read at `scale` px a mm; the same where it is large enough. Overall dimensions
 * stand free and grow as they need, all else by three tenths at most.
 */
export function legibleAt(list: DisplayList, scale: number): DisplayList {
  const growth = growthAt(list, scale);
  if (growth <= 1) return list;
  return { ...list, items: grown(list.items, Math.min(growth, mostGrowth), growth) };
}

const grown = (items: readonly Item[], by: number, overallBy: number): Item[] =>
  items.map((item) => {
    if (item.kind === "text") return { ...item, sizeMm: item.sizeMm * by };
    if (!isNested(item)) return item;
    return { ...item, items: grown(item.items, isOverall(item) ? overallBy : by, overallBy) };
  });
