import { boxesOverlap, boxOfPath } from "../geometry/box.ts";
import { flattenPath } from "../geometry/flatten.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Path } from "../geometry/path.ts";

/** Letters nearer to each other than this touch, mm: no saw and no beam leaves two of them. Our choice. */
const touchMm = 0.05;

/** Which of some outlines run into each other or touch, by their places in the list: pairs, each once, in order. */
export function touchingLetters(outlines: readonly Path[], kernel: Kernel): readonly (readonly [number, number])[] {
  const letters = outlines.map((path) => {
    const box = boxOfPath(path);
    return box && { path, box: { ...box, width: box.width + touchMm, height: box.height + touchMm } };
  });
  const pairs: (readonly [number, number])[] = [];
  for (const [a, first] of letters.entries()) {
    if (!first) continue;
    for (let b = a + 1; b < letters.length; b++) {
      const second = letters[b];
      if (!second || !boxesOverlap(first.box, second.box)) continue;
      const grown = kernel.offset(flattenPath(first.path), touchMm, "round");
      if (kernel.intersect(grown, flattenPath(second.path)).length > 0) pairs.push([a, b]);
    }
  }
  return pairs;
}
