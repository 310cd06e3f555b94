import type { DisplayList } from "#shared/drawing/display-list.ts";
import { drawSlatPlan } from "#shared/drawing/slat-plan.ts";
import { bestStart } from "#shared/dry-fit/best-start.ts";
import type { Kernel } from "#shared/geometry/kernel.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { StartChoice } from "#shared/slats/choose-start.ts";
import { frameOf, slatsOf } from "#shared/stack/backer.ts";
import type { OutOfRange } from "#shared/units/outcome.ts";

/** A board with slats, a frame or both, without what lies on it. */
export type BareSign = Pick<MockupDocument, "board" | "backer" | "frame">;

export type LaidBoard = {
  /** Why slats or frame can't be made; null when they can, and when there are none. */
  readonly refusals: { readonly slats: OutOfRange | null; readonly frame: OutOfRange | null };
  /** Slats as they lie, and the frame round them; null without slats. */
  readonly plan: DisplayList | null;
  readonly count: number;
  /** What the start leaves and the best there is; null where looking for one would take too long. */
  readonly start: StartChoice | null;
};

/** Paper that the plan is drawn for, mm: its numbers are 12.9 px high at the 288 px that the dialog gives it. */
const planMm = { widthMm: 76, heightMm: 90 } as const;

/** Slats and frame of a board as they lie, or why they can't. */
export function layBoard(sign: BareSign, kernel: Kernel): LaidBoard {
  const slats = slatsOf(sign, kernel);
  const frame = frameOf(sign, kernel);
  const refusals = {
    slats: slats && !slats.ok ? slats.reason : null,
    frame: frame && !frame.ok ? frame.reason : null,
  };
  if (!slats?.ok) return { refusals, plan: null, count: 0, start: null };
  const round = frame?.ok ? frame.value : null;
  return {
    refusals,
    plan: drawSlatPlan({ layout: slats.value, frame: round, numbers: "fitting", ...planMm }),
    count: slats.value.slats.length,
    start: bestStart(sign, kernel),
  };
}
