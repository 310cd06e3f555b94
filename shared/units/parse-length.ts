import { inchesToMm, type LengthUnit } from "./length.ts";

const number = String.raw`\d+(?:[.,]\d+)?|[.,]\d+`;
const pattern = new RegExp(
  String.raw`^([-−])?\s*(?:(\d+)\s*[- ]\s*(\d+)\s*[/⁄]\s*(\d+)|(\d+)\s*[/⁄]\s*(\d+)|(${number}))\s*(mm|cm|in|inch|inches|"|″|'')?$`,
);

/**
 * Reads what a person typed into a length field: "600", "12,5", "60 cm", "12 3/8", "3/4″", "−1 1/2 in". A number
 * without a unit is in `unit`. Gives mm, or null when it is no length.
 */
export function parseLength(text: string, unit: LengthUnit): number | null {
  const found = pattern.exec(text.trim().toLowerCase());
  if (!found) return null;
  const [, minus, whole, over, under, soleOver, soleUnder, decimal, suffix] = found;
  let value: number;
  if (over !== undefined && under !== undefined) value = Number(whole) + Number(over) / Number(under);
  else if (soleOver !== undefined && soleUnder !== undefined) value = Number(soleOver) / Number(soleUnder);
  else value = Number((decimal ?? "").replace(",", "."));
  if (!Number.isFinite(value)) return null;
  const mm =
    suffix === "mm" || (suffix === undefined && unit === "mm")
      ? value
      : suffix === "cm"
        ? value * 10
        : inchesToMm(value);
  return minus === undefined || mm === 0 ? mm : -mm;
}
