import { checkedSlats } from "./check-slats.ts";
import { pitchMm } from "./half-board.ts";
import { startHeightMm } from "./sides.ts";
import type { SlatDesign } from "./slat-layout.ts";

/** From where to where a slat lies along a line down the board, mm from the upper edge. */
export type SlatCrossing = { readonly strip: number; readonly from: number; readonly to: number };

/**
 * The slats that a line down the board meets right beside the spine, or at the left edge of slats that have none, from the upper edge down:
 * each takes slat width / sin of the angle. Empty for slats that can't be laid.
 */
export function slatsAtSpine(
  board: { readonly width: number; readonly height: number },
  design: SlatDesign,
): SlatCrossing[] {
  const crossings = checkedSlats({ ...board, outline: null }, design, () => {
    const start = startHeightMm(board, design);
    const pitch = pitchMm(design);
    const taken = design.slatWidth / Math.sin((design.angle * Math.PI) / 180);
    const first = Math.floor((-taken - start) / pitch);
    const last = Math.ceil((board.height - start) / pitch);
    return Array.from({ length: last - first + 1 }, (_, index): SlatCrossing => {
      const strip = first + index;
      const low = start + strip * pitch;
      const [from, to] =
        design.direction === "up" ? [board.height - low - taken, board.height - low] : [low, low + taken];
      return { strip, from: Math.max(0, from), to: Math.min(board.height, to) };
    })
      .filter(({ from, to }) => to - from > 1e-6)
      .sort((a, b) => a.from - b.from);
  });
  return crossings.ok ? crossings.value : [];
}
