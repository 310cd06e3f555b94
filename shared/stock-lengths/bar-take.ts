import { checked, lengthRange, type Outcome, type Range, shareRange } from "../units/outcome.ts";

/** Angles between blade and bar that are reckoned with, degrees; whether a saw can be set to them is another matter. */
export const bladeAngleRange: Range = { least: 1, most: 90 };
/** Blades: nothing up to 20 mm. */
export const kerfRange: Range = { least: 0, most: 20 };
/** What is cut off to square an end, mm. */
export const squaringRange: Range = { least: 0, most: 500 };
/** Widths of bars, mm. */
export const barWidthRange: Range = { least: 0.1, most: 1_000 };

const radians = (degrees: number): number => (degrees * Math.PI) / 180;
/** 0 for a square cut, where rounding would leave a hair. */
const cotangent = (angle: number): number => (angle === 90 ? 0 : 1 / Math.tan(radians(angle)));

/** What a cut takes along the bar: kerf / sin(angle between blade and bar). Trigonometry: 3 mm at 45 degrees are 4.24. */
export function kerfAlongMm(kerfMm: number, bladeAngle: number): Outcome<number> {
  return checked({ kerfMm: [kerfMm, kerfRange], bladeAngle: [bladeAngle, bladeAngleRange] }, () =>
    bladeAngle === 90 ? kerfMm : kerfMm / Math.sin(radians(bladeAngle)),
  );
}

/** How far a cut runs along a bar `widthMm` wide: width · cot(angle between blade and bar). 0 for a square cut. */
export function cutRunMm(widthMm: number, bladeAngle: number): Outcome<number> {
  return checked(
    { widthMm: [widthMm, barWidthRange], bladeAngle: [bladeAngle, bladeAngleRange] },
    () => widthMm * cotangent(bladeAngle),
  );
}

/**
 * What of a bar can be cut from: its length less the share that knots take, less what squares its end. Not below 0.
 * The share is common practice (a shop knows its timber), no source.
 */
export function usableLengthMm(bar: {
  readonly lengthMm: number;
  readonly squaringMm: number;
  readonly rejectShare: number;
}): Outcome<number> {
  const { lengthMm, squaringMm, rejectShare } = bar;
  return checked(
    {
      lengthMm: [lengthMm, lengthRange],
      squaringMm: [squaringMm, squaringRange],
      rejectShare: [rejectShare, shareRange],
    },
    () => Math.max(0, lengthMm * (1 - rejectShare) - squaringMm),
  );
}

/**
 * What `count` equal parts with parallel cuts take when they lie in each other: each a / sin θ + kerf / sin θ, and once
 * w · cot θ. Here a / sin θ is the part's length, long point to long point, less w · cot θ. Geometry of the parallelogram.
 */
export function nestedRunMm(run: {
  readonly count: number;
  readonly lengthMm: number;
  readonly widthMm: number;
  readonly bladeAngle: number;
  readonly kerfMm: number;
}): Outcome<number> {
  const { count, lengthMm, widthMm, bladeAngle, kerfMm } = run;
  return checked(
    {
      count: [count, { least: 1, most: 10_000 }],
      lengthMm: [lengthMm, lengthRange],
      widthMm: [widthMm, barWidthRange],
      bladeAngle: [bladeAngle, bladeAngleRange],
      kerfMm: [kerfMm, kerfRange],
    },
    () => {
      const cutRun = widthMm * cotangent(bladeAngle);
      return count * (lengthMm - cutRun + kerfMm / Math.sin(radians(bladeAngle))) + cutRun;
    },
  );
}
