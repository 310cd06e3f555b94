import { lengthToleranceMm } from "../geometry/tolerance.ts";

/**
 * The rectangle that slats of one direction cover: `reach` out from the spine, `height` along it. Its own axes are x out
 * from the spine and y from the edge that slats rise from. A slat's edge is the line y = x · cot(angle) + c.
 */
export type HalfBoard = {
  readonly reach: number;
  readonly height: number;
  /** Between slat and spine, degrees, over 0 up to 90. */
  readonly angle: number;
  readonly slatWidth: number;
  readonly gap: number;
  /** The c of one slat's lower edge: the slats before and after it follow from it. */
  readonly phase: number;
};

/** One slat of a half board, measured along u = x sin + y cos. All mm. */
export type Strip = {
  /** Counted from the slat whose lower edge is the phase, which is 0. */
  readonly index: number;
  /** The c of its two edges, as far as they run over the half board. */
  readonly from: number;
  readonly to: number;
  /** Where its two ends' long points lie. */
  readonly near: number;
  readonly far: number;
  /** Length of the edge at `from` and of the one at `to`; nothing for one that is only a tip. */
  readonly fromEdge: number;
  readonly toEdge: number;
};

type Slope = { readonly sin: number; readonly cos: number; readonly cot: number };

/** Sine, cosine and cotangent of an angle in degrees; exact at 90, where slats lie square to the spine. */
export function slopeOf(angle: number): Slope {
  if (angle === 90) return { sin: 1, cos: 0, cot: 0 };
  const radians = (angle * Math.PI) / 180;
  const [sin, cos] = [Math.sin(radians), Math.cos(radians)];
  return { sin, cos, cot: cos / sin };
}

/** How far apart along the spine slats repeat: (width + gap)/sin(angle). */
export const pitchMm = ({ slatWidth, gap, angle }: Pick<HalfBoard, "slatWidth" | "gap" | "angle">): number =>
  (slatWidth + gap) / slopeOf(angle).sin;

/** The phase of slats whose first begins in the corner farthest from the spine: −reach · cot(angle). */
export const cornerPhase = ({ reach, angle }: Pick<HalfBoard, "reach" | "angle">): number =>
  -reach * slopeOf(angle).cot;

/**
 * Slats of a half board from the first corner on, in closed form: the index runs over all c between −reach · cot and
 * height; a slat begins at its lowest entry (a V over c with its foot in the spine's corner) and ends at its highest
 * exit (a tent over c with its top in the opposite corner). Slats that would show no more than half a grid step are none.
 * Angle over 0 up to 90, widths over 0, gap 0 or more. Plane geometry.
 */
export function stripsOfHalf(half: HalfBoard): Strip[] {
  const { reach, height, angle, slatWidth, phase } = half;
  const { sin, cos, cot } = slopeOf(angle);
  const pitch = pitchMm(half);
  const face = slatWidth / sin;
  const lowest = -reach * cot;
  const corner = height - reach * cot;
  const entry = (c: number) => (c >= 0 ? c * cos : (-c * sin * sin) / cos);
  const exit = (c: number) => (c <= corner ? reach / sin + c * cos : (height - c * sin * sin) / cos);
  const strips: Strip[] = [];
  const last = Math.ceil((height - phase) / pitch) - 1;
  for (let index = Math.floor((lowest - phase) / pitch); index <= last; index++) {
    const from = Math.max(phase + index * pitch, lowest);
    const to = Math.min(phase + index * pitch + face, height);
    if (to - from <= lengthToleranceMm) continue;
    strips.push({
      index,
      from,
      to,
      near: entry(clamp(0, from, to)),
      far: exit(clamp(corner, from, to)),
      fromEdge: Math.max(0, exit(from) - entry(from)),
      toEdge: Math.max(0, exit(to) - entry(to)),
    });
  }
  return strips;
}

/** From long point to long point, mm: what a slat takes of its stock before the saw's kerf. */
export const stripLengthMm = ({ near, far }: Pick<Strip, "near" | "far">): number => far - near;

/** Which edges of its half board each end of a slat meets: one, or two where a corner lies in it. */
export function stripEnds(strip: Pick<Strip, "from" | "to">, half: Pick<HalfBoard, "reach" | "height" | "angle">) {
  const corner = half.height - half.reach * slopeOf(half.angle).cot;
  const both = <T>(at: number, first: T, second: T): readonly T[] => {
    if (strip.from >= at - lengthToleranceMm) return [second];
    if (strip.to <= at + lengthToleranceMm) return [first];
    return [first, second];
  };
  return { near: both(0, "foot" as const, "spine" as const), far: both(corner, "outer" as const, "head" as const) };
}

const clamp = (value: number, least: number, most: number): number => Math.max(least, Math.min(most, value));
