import { inchesToMm, type LengthUnit, mmToInches } from "./length.ts";

/** The finest fraction of an inch on a steel rule (common practice, no source). */
const finest = 64;
/** A fraction is written where it says the length to within half a thousandth of a millimetre. */
const nearMm = 0.0005;

/**
 * A length as it is set out, for a field that is typed in: mm with up to three decimals, inches as a fraction to 1/64
 * where one says it, else with up to four decimals and the inch mark. What is no number is an empty text.
 */
export function formatExact(mm: number, unit: LengthUnit): string {
  if (!Number.isFinite(mm)) return "";
  if (unit === "mm") return signed(mm, plain(Math.abs(mm), 3));
  const parts = Math.round(mmToInches(Math.abs(mm)) * finest);
  if (Math.abs(inchesToMm(parts / finest) - Math.abs(mm)) <= nearMm) return signed(mm, `${fraction(parts)}″`);
  return signed(mm, `${plain(mmToInches(Math.abs(mm)), 4)}″`);
}

/** A step of the arrow keys or a pitch, with its unit: "0.5 mm", "1/64 inch", "1 inch". */
export function formatExactWithUnit(mm: number, unit: LengthUnit): string {
  const text = formatExact(mm, unit);
  return unit === "mm" ? `${text} mm` : text.replace("″", " inch");
}

function fraction(parts: number): string {
  const whole = Math.floor(parts / finest);
  let over = parts % finest;
  let under = finest;
  while (over > 0 && over % 2 === 0) {
    over /= 2;
    under /= 2;
  }
  if (over === 0) return String(whole);
  return whole === 0 ? `${over}/${under}` : `${whole} ${over}/${under}`;
}

const plain = (value: number, decimals: number): string => String(Number((value + 1e-9).toFixed(decimals)));

const signed = (value: number, text: string): string => (value < 0 && /[1-9]/.test(text) ? `−${text}` : text);
