import { inchesToMm, type LengthUnit } from "./length.ts";

const number = String.raw`\d+(?:[.,]\d+)?|[.,]\d+`;
const signed = /^([-−])?\s*(.*)$/;
const measure = new RegExp(
  String.raw`^(?:(\d+)\s*[- ]\s*(\d+)\s*[/⁄]\s*(\d+)|(\d+)\s*[/⁄]\s*(\d+)|(${number}))\s*(mm|cm|m|in|inch|inches|"|″|'')?$`,
);
/** Feet, and inches after them if there are any. Two apostrophes are an inch mark and no feet. */
const feetAndMore = new RegExp(String.raw`^(${number})\s*(?:'(?!')|′|ft|foot|feet)\s*-?\s*(.*)$`);
const mmOf: Readonly<Record<string, number>> = { mm: 1, cm: 10, m: 1000 };

/**
 * Reads what a person typed into a length field: "600", "12,5", "60 cm", "12 3/8", "3/4″", "2'6 1/2", "−1 1/2 in". A
 * number without a unit is in `unit`, a fraction without one in inches: nobody writes 3/8 of a millimetre. Gives mm, or
 * null when it is no length.
 */
export function parseLength(text: string, unit: LengthUnit): number | null {
  const [, minus, size = ""] = signed.exec(text.trim().toLowerCase()) ?? [];
  const mm = parseFeet(size) ?? parseMeasure(size, unit);
  if (mm === null) return null;
  return minus === undefined || mm === 0 ? mm : -mm;
}

function parseFeet(text: string): number | null {
  const found = feetAndMore.exec(text);
  if (!found) return null;
  const [, feet = "", rest = ""] = found;
  const inches = rest === "" ? 0 : /m$/.test(rest) ? null : parseMeasure(rest, "in");
  return inches === null ? null : inchesToMm(decimal(feet) * 12) + inches;
}

function parseMeasure(text: string, unit: LengthUnit): number | null {
  const found = measure.exec(text);
  if (!found) return null;
  const [, whole = "0", over, under, soleOver, soleUnder, plain, suffix] = found;
  const value =
    plain === undefined ? Number(whole) + Number(over ?? soleOver) / Number(under ?? soleUnder) : decimal(plain);
  if (!Number.isFinite(value)) return null;
  const meant = suffix ?? (plain === undefined ? "in" : unit);
  return mmOf[meant] === undefined ? inchesToMm(value) : value * mmOf[meant];
}

const decimal = (text: string): number => Number(text.replace(",", "."));
