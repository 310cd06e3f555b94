import { flattenPath } from "../geometry/flatten.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { MockupDocument, Slats } from "../mockup/document.ts";
import { chooseStart, type StartChoice } from "../slats/choose-start.ts";
import { sliversOf } from "../slats/slivers.ts";
import { slatsOf } from "../stack/backer.ts";
import { boardPath } from "../stack/board-outline.ts";

/** Starts on an outline are looked for on one that is flattened as coarsely, mm: what is found is tried on the true one. */
const coarseMm = 0.5;
/** With more slats on an outline looking for a start takes seconds. Our choice. */
const mostSlatsOnOutline = 400;

/**
 * The best start of a sign's slats, and whether it leaves no sliver on the very board. Null where slats can't be laid, or
 * are so many on an outline that looking for one would take too long.
 */
export function bestStart(
  { board, backer }: Pick<MockupDocument, "board" | "backer">,
  kernel: Kernel,
): StartChoice | null {
  const { slats } = backer;
  const laid = slatsOf({ board, backer, frame: null }, kernel);
  if (!slats || !laid?.ok) return null;
  const isRectangle = board.outline.kind === "rectangle";
  if (!isRectangle && laid.value.slats.length > mostSlatsOnOutline) return null;
  return remembered(kernel, [board, slats], "best start", () => {
    const outline = isRectangle ? null : kernel.union(flattenPath(boardPath(board), coarseMm), "evenodd");
    const choice = chooseStart({ width: board.width, height: board.height, outline }, slats, kernel);
    if (!choice.ok) return null;
    const current = { ...choice.value.current, ...shortestOf(laid.value) };
    const begun = slatsOf(
      { board, backer: { ...backer, slats: startedAt(slats, choice.value.best.height) }, frame: null },
      kernel,
    );
    if (!begun?.ok) return null;
    const best = { ...choice.value.best, ...shortestOf(begun.value) };
    return { current, best, isSliverFree: choice.value.isSliverFree && best.slivers === 0 };
  });
}

/** Slats that begin so high at the spine. */
export const startedAt = (slats: Slats, height: number): Slats => ({ ...slats, start: { kind: "height", height } });

function shortestOf(layout: Parameters<typeof sliversOf>[0]): {
  readonly shortestMm: number;
  readonly slivers: number;
} {
  const lengths = layout.slats.map(({ trimmedLongPoint }) => trimmedLongPoint);
  return { shortestMm: lengths.length === 0 ? 0 : Math.min(...lengths), slivers: sliversOf(layout).length };
}
