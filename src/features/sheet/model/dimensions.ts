import type { DisplayList, Item } from "#shared/drawing/display-list.ts";

const isDimension = (item: Item): boolean => "id" in item && (item.id?.startsWith("dimension:") ?? false);

const isNested = (item: Item): item is Extract<Item, { kind: "clip" | "group" }> =>
  item.kind === "clip" || item.kind === "group";

const holdsDimension = (item: Item): boolean =>
  isDimension(item) || (isNested(item) && item.items.some(holdsDimension));

/** Whether the drawing names its dimensions, so that they can be left out. */
export const hasDimensions = (list: DisplayList): boolean => list.items.some(holdsDimension);

const without = (items: readonly Item[]): Item[] =>
  items
    .filter((item) => !isDimension(item))
    .map((item) =>
      isNested(item) && item.items.some(holdsDimension) ? { ...item, items: without(item.items) } : item,
    );

/** The same picture without its dimensions; everything else keeps its place. */
export function withoutDimensions(list: DisplayList): DisplayList {
  return hasDimensions(list) ? { ...list, items: without(list.items) } : list;
}
