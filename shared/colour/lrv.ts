import { checked, type Outcome, type Range } from "../units/outcome.ts";

const percentRange: Range = { least: 0, most: 100 };

/**
 * Light reflectance value in percent from CIELAB lightness: 100 · ((L* + 16)/116)³, under L* 8 100 · L* · 27/24389
 * (CIE 15). From sRGB, whose observer sees 2 degrees where the value's sees 10, it is an estimate, good to about a point.
 */
export function lrvOfLightness(lightness: number): Outcome<number> {
  return checked({ lightness: [lightness, percentRange] }, () =>
    lightness > 8 ? 100 * ((lightness + 16) / 116) ** 3 : (100 * lightness * 27) / 24389,
  );
}

export type LuminanceContrast = {
  /** (B1 − B2)/B1 in percent, B1 the lighter; 70 % was advised (ADAAG 1991, appendix A4.30.5). */
  readonly percent: number;
  /** B1 − B2 in points; 30 are taken for adequate (BS 8300-2). */
  readonly points: number;
  /** (B1 − B2)/(B1 + B2), 0 to 1, after Michelson. */
  readonly michelson: number;
};

/** Contrast of two light reflectance values in percent, the same in both orders; nothing between two blacks. */
export function luminanceContrast(one: number, other: number): Outcome<LuminanceContrast> {
  return checked({ one: [one, percentRange], other: [other, percentRange] }, () => {
    const lighter = Math.max(one, other);
    const points = lighter - Math.min(one, other);
    if (points === 0) return { percent: 0, points: 0, michelson: 0 };
    return { percent: (points / lighter) * 100, points, michelson: points / (one + other) };
  });
}
