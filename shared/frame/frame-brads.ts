import type { Point } from "../geometry/path.ts";
import { isShorter } from "../geometry/tolerance.ts";
import { screwReach } from "../hardware/screw-reach.ts";
import { checked, lengthRange, type Outcome } from "../units/outcome.ts";
import type { Frame } from "./lay-out-frame.ts";

/** Where brads go in a frame, mm: off its corners, and no farther apart. Common practice. */
export const frameBradSpacing = { corner: 25, apart: 150 } as const;
/** How far a brad must go into the board's edge, mm. Common practice. */
export const frameBradNeededMm = 10;

export type FrameBrads = {
  /** On the board's edge, where they enter it, by the frame's piece. */
  readonly brads: readonly (Point & { readonly member: number })[];
  /** Over the board's back: the middle of the substrate's edge. */
  readonly heightMm: number;
  readonly intoEdgeMm: number;
  /** Whether they go far enough into the edge. */
  readonly holds: boolean;
};

/** The brads that hold a frame to a board's edge. Lengths mm. */
export function frameBrads(
  frame: Pick<Frame, "members">,
  {
    length,
    frameWidth,
    substrate,
  }: { readonly length: number; readonly frameWidth: number; readonly substrate: number },
): Outcome<FrameBrads> {
  const reach = screwReach({ kind: "brad", length });
  if (!reach.ok) return reach;
  return checked({ frameWidth: [frameWidth, lengthRange], substrate: [substrate, lengthRange] }, () => {
    const intoEdgeMm = reach.value.point.least - frameWidth;
    return {
      brads: frame.members.flatMap(({ from, to }, member) =>
        placesAlong(from, to).map((point) => ({ ...point, member })),
      ),
      heightMm: substrate / 2,
      intoEdgeMm,
      holds: !isShorter(intoEdgeMm, frameBradNeededMm),
    };
  });
}

function placesAlong(from: Point, to: Point): Point[] {
  const length = Math.hypot(to.x - from.x, to.y - from.y);
  const at = (share: number): Point => ({ x: from.x + share * (to.x - from.x), y: from.y + share * (to.y - from.y) });
  const open = length - 2 * frameBradSpacing.corner;
  if (open <= 0) return [at(0.5)];
  const steps = Math.max(1, Math.ceil(open / frameBradSpacing.apart));
  return Array.from({ length: steps + 1 }, (_, step) => at((frameBradSpacing.corner + (step * open) / steps) / length));
}
