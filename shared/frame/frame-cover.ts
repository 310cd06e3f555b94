import { checked, lengthRange, type Outcome, spanRange } from "../units/outcome.ts";

export type FrameCover = {
  /** What of the substrate's edge stays bare at the back, and what of the slats' at the front, mm. */
  readonly bareSubstrateMm: number;
  readonly bareSlatsMm: number;
  /** How far the frame's front stands above the slats' face; under 0 it lies below. */
  readonly proudMm: number;
  /** The depth at which the front is level with the slats' face. */
  readonly flushDepthMm: number;
};

/**
 * What a frame covers of a backer's edges. Its back is level with the substrate's back, so its depth must be the substrate's
 * thickness at least; the slats' face has been sanded. All mm. Arithmetic.
 */
export function frameCover(
  depth: number,
  backer: { readonly substrate: number; readonly slats: number; readonly sanding: number },
): Outcome<FrameCover> {
  const { substrate, slats, sanding } = backer;
  return checked(
    {
      frameDepth: [depth, lengthRange],
      substrate: [substrate, lengthRange],
      slats: [slats, spanRange],
      sanding: [sanding, { least: 0, most: slats }],
    },
    () => {
      const flushDepthMm = substrate + slats - sanding;
      return {
        bareSubstrateMm: Math.max(0, substrate - depth),
        bareSlatsMm: Math.max(0, flushDepthMm - Math.max(depth, substrate)),
        proudMm: depth - flushDepthMm,
        flushDepthMm,
      };
    },
  );
}
