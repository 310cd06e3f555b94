import type { Box, Point } from "#shared/geometry/path.ts";

/** A point of a box: shares of its width from the left and of its height from the top. */
export type Anchor = { readonly across: 0 | 0.5 | 1; readonly down: 0 | 0.5 | 1; readonly words: string };

export const middleAnchor: Anchor = { across: 0.5, down: 0.5, words: "middle" };

/** Where the place of a thing can be measured at. */
export const anchors: readonly Anchor[] = [
  middleAnchor,
  { across: 0, down: 0, words: "upper left corner" },
  { across: 0.5, down: 0, words: "upper edge" },
  { across: 1, down: 0, words: "upper right corner" },
  { across: 0, down: 0.5, words: "left edge" },
  { across: 1, down: 0.5, words: "right edge" },
  { across: 0, down: 1, words: "lower left corner" },
  { across: 0.5, down: 1, words: "lower edge" },
  { across: 1, down: 1, words: "lower right corner" },
];

export function anchorPoint(box: Box, { across, down }: Anchor): Point {
  return { x: box.x + box.width * across, y: box.y + box.height * down };
}
