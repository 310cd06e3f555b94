import { type Frame, layOutFrame } from "../frame/lay-out-frame.ts";
import { type Kernel, remembered } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { usualWood } from "../hardware/screw-reach.ts";
import type { Backer, MockupDocument, Wood } from "../mockup/document.ts";
import { layOutSlats } from "../slats/lay-out-slats.ts";
import type { SlatLayout } from "../slats/slat-layout.ts";
import type { Outcome } from "../units/outcome.ts";
import { boardPath } from "./board-outline.ts";
import { boardRegion } from "./piece-region.ts";

type Sign = Pick<MockupDocument, "board" | "backer" | "frame">;

/** From the back of the board to its face, mm: the plank, or substrate and slats less what sanding takes off them. */
export function backerThicknessMm({ thickness, slats }: Backer): number {
  return slats ? thickness + Math.max(0, slats.thickness - usualWood.sanding) : thickness;
}

/** The wood that is seen from the front. */
export const faceStock = ({ stock, slats }: Backer): Wood => slats?.stock ?? stock;

/** The slats of a sign as they lie; null without slats, the measure that is out of range when they can't be laid. */
export function slatsOf({ board, backer }: Sign, kernel: Kernel): Outcome<SlatLayout> | null {
  const { slats } = backer;
  if (!slats) return null;
  const { width, height, outline } = board;
  return remembered(kernel, [board, slats], "slats", () =>
    layOutSlats(
      { width, height, outline: outline.kind === "rectangle" ? null : boardRegion(board, kernel) },
      slats,
      kernel,
    ),
  );
}

/** The frame of a sign; null without one, the measure that is out of range when it can't be made. */
export function frameOf({ board, frame }: Sign, kernel: Kernel): Outcome<Frame> | null {
  if (!frame) return null;
  return remembered(kernel, [board, frame], "frame", () => layOutFrame(boardPath(board), frame, kernel));
}

/** What of the board's face is wood: all of it, or slats and spine without the gaps between them. */
export function faceRegion(sign: Sign, kernel: Kernel): Region {
  const slats = slatsOf(sign, kernel);
  if (!slats?.ok || slats.value.design.gap === 0) return boardRegion(sign.board, kernel);
  const { slats: laid, spine } = slats.value;
  return remembered(kernel, [sign.board, slats.value], "face", () =>
    kernel.union([...laid.flatMap(({ trimmed }) => trimmed), ...(spine?.trimmed ?? [])], "nonzero"),
  );
}
