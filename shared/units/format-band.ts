import type { Banded } from "./banded.ts";
import { formatFine, formatLength } from "./format-length.ts";
import type { LengthUnit } from "./length.ts";

/** How a height is lettered: as it is meant, or with the least and the most that tolerances leave. */
export type BandWording = "nominal" | "with bands";

/** "33.5", or with its band "33.5 (32.6 to 34.4)"; one that is known exactly has none. */
export function formatBand(band: Banded, unit: LengthUnit, wording: BandWording): string {
  const nominal = formatLength(band.nominal, unit);
  if (wording === "nominal" || band.least === band.most) return nominal;
  const fine = (mm: number) => formatFine(mm, unit).replace(/\s*(mm|″)$/u, "");
  return `${nominal} (${fine(band.least)} to ${fine(band.most)})`;
}
