import type { DisplayList } from "#shared/drawing/display-list.ts";

type Spot = { readonly x: number; readonly y: number };
type Placed = { readonly list: DisplayList /** Where the board's upper left corner lies. */; readonly origin: Spot };

export type AlignedPair = {
  readonly before: DisplayList;
  readonly after: DisplayList;
  /** Where the board's upper left corner lies on both. */
  readonly origin: Spot;
};

/** Two pictures laid so that their boards' upper left corners coincide, both as large as they need together. Lengths in mm. */
export function alignPictures(before: Placed, after: Placed): AlignedPair {
  const origin = {
    x: Math.max(before.origin.x, after.origin.x),
    y: Math.max(before.origin.y, after.origin.y),
  };
  const shift = (one: Placed) => ({ x: origin.x - one.origin.x, y: origin.y - one.origin.y });
  const reach = (side: "x" | "y", length: "widthMm" | "heightMm") =>
    Math.max(shift(before)[side] + before.list[length], shift(after)[side] + after.list[length]);
  const size = { widthMm: reach("x", "widthMm"), heightMm: reach("y", "heightMm") };
  const moved = (one: Placed): DisplayList => ({
    ...size,
    items: [{ kind: "group", ...shift(one), scale: 1, items: one.list.items }],
  });
  return { before: moved(before), after: moved(after), origin };
}
