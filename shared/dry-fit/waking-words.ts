import { formatFine } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import type { BoundFinding } from "./set-aside.ts";

/** Why a finding that was set aside stands again, in a sentence: what it was then and what it is now. */
export function wakingWords(then: BoundFinding, now: BoundFinding, unit: LengthUnit): string {
  if (then.severity !== now.severity) return `It was a ${then.severity} then, it is a ${now.severity} now.`;
  const sentences = (["value", "limit"] as const).flatMap((what) => {
    const [was, is] = [measureWords(then[what], then.unit, unit), measureWords(now[what], now.unit, unit)];
    return was === null || is === null || was === is ? [] : [`The ${what} was ${was} then, it is ${is} now.`];
  });
  return sentences[0] ?? "What the dry fit says of it has changed since.";
}

/** A measured value that does not break from its unit, lengths as the shop writes them; null for none. */
export function measureWords(value: number | null, valueUnit: string | null, unit: LengthUnit): string | null {
  if (value === null) return null;
  const number = String(Math.round(value * 100) / 100);
  const words = valueUnit === "mm" ? formatFine(value, unit) : valueUnit === null ? number : `${number} ${valueUnit}`;
  return words.replaceAll(" ", "\u00a0");
}
