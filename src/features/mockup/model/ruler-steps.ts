import { inchesToMm, type LengthUnit } from "#shared/units/length.ts";

/** Steps of a ruler, finest first, mm: 1, 2 and 5 with every power of ten; inches by halves to an inch, then to feet. */
const steps: Readonly<Record<LengthUnit, readonly number[]>> = {
  mm: [0.1, 0.2, 0.5, 1, 2, 5, 10, 20, 50, 100, 200, 500, 1000, 2000, 5000],
  in: [1 / 16, 1 / 8, 1 / 4, 1 / 2, 1, 3, 6, 12, 24, 60, 120, 240].map(inchesToMm),
};

/** Figures stand so far apart at least, and lines so far, px. */
const figuresPx = 58;
const linesPx = 5;

/** How a ruler is divided at a scale in px a mm: a figure every `figureMm`, a line every `lineMm`; the first is a multiple of the second. */
export function rulerSteps(scale: number, unit: LengthUnit): { readonly figureMm: number; readonly lineMm: number } {
  const all = steps[unit];
  const widest = all.at(-1) ?? 1;
  const figureMm = all.find((step) => step * scale >= figuresPx) ?? widest;
  const lineMm = all.find((step) => step * scale >= linesPx && isMultiple(figureMm, step)) ?? figureMm;
  return { figureMm, lineMm };
}

export type RulerLine = { readonly at: number; readonly kind: "figure" | "middle" | "line" };

/** The lines of a ruler between two places, mm, sorted. Halfway between figures a line is a middle one where there is one. */
export function rulerLines(from: number, to: number, scale: number, unit: LengthUnit): RulerLine[] {
  const { figureMm, lineMm } = rulerSteps(scale, unit);
  const each = Math.round(figureMm / lineMm);
  const first = Math.ceil(from / lineMm);
  const count = Math.max(0, Math.floor(to / lineMm) - first + 1);
  return Array.from({ length: count }, (_, index): RulerLine => {
    const number = first + index;
    const past = ((number % each) + each) % each;
    return { at: number * lineMm, kind: past === 0 ? "figure" : past * 2 === each ? "middle" : "line" };
  });
}

/** The spacing of a grid as it is drawn: so many times its own that lines are at least `leastPx` apart. */
export function seenSpacingMm(spacingMm: number, scale: number, leastPx: number): number {
  const times = [1, 2, 5, 10, 20, 50, 100, 200, 500, 1000];
  return spacingMm * (times.find((count) => count * spacingMm * scale >= leastPx) ?? 1000);
}

function isMultiple(length: number, step: number): boolean {
  const count = length / step;
  return Math.abs(count - Math.round(count)) < 1e-6;
}
