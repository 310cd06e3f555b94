import { type LengthUnit, mmToInches } from "./length.ts";

/** What stands for a length that is no number: an empty cell of a table, never "NaN". */
const noLength = "–";
const sixteenths = 16;

/**
 * A length as a drawing writes it: mm with one decimal at most and no unit, inches as fractions to 1/16 with the inch
 * mark, as 19.5 or 12 3/8″.
 */
export function formatLength(mm: number, unit: LengthUnit): string {
  if (!Number.isFinite(mm)) return noLength;
  return unit === "mm" ? signed(mm, trimmed(Math.abs(mm), 1)) : signed(mm, inchFraction(Math.abs(mm)));
}

/** A length inside a sentence: as formatLength, with mm written out. */
export function formatLengthWithUnit(mm: number, unit: LengthUnit): string {
  const text = formatLength(mm, unit);
  return unit === "mm" && text !== noLength ? `${text} mm` : text;
}

/**
 * A small measure that a sixteenth of an inch is too coarse for (a hole, a web, a play): two decimals of mm at most, or
 * thousandths of an inch.
 */
export function formatFine(mm: number, unit: LengthUnit): string {
  if (!Number.isFinite(mm)) return noLength;
  return unit === "mm"
    ? `${signed(mm, trimmed(Math.abs(mm), 2))} mm`
    : `${signed(mm, mmToInches(Math.abs(mm)).toFixed(3))}″`;
}

/** Two lengths as width by height, as "600 × 400 mm" or "23 5/8″ × 15 3/4″". */
export function formatSize(widthMm: number, heightMm: number, unit: LengthUnit): string {
  return `${formatLength(widthMm, unit)} × ${formatLengthWithUnit(heightMm, unit)}`;
}

/** Whole inches and the fraction in lowest terms, of a length that is not negative. */
function inchFraction(mm: number): string {
  const total = Math.round(mmToInches(mm) * sixteenths);
  const whole = Math.floor(total / sixteenths);
  let part = total % sixteenths;
  if (part === 0) return `${whole}″`;
  let denominator = sixteenths;
  while (part % 2 === 0) {
    part /= 2;
    denominator /= 2;
  }
  return whole === 0 ? `${part}/${denominator}″` : `${whole} ${part}/${denominator}″`;
}

function trimmed(value: number, decimals: number): string {
  // A hair is added so that 2.25, which binary holds as a little less, rounds as people round.
  return String(Number((value + 1e-9).toFixed(decimals)));
}

/** A minus sign only where something is left after rounding. */
function signed(value: number, text: string): string {
  return value < 0 && /[1-9]/.test(text) ? `−${text}` : text;
}
