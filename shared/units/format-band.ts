import type { Banded } from "./banded.ts";
import { formatFine, formatLength } from "./format-length.ts";
import type { LengthUnit } from "./length.ts";

/** How a height is lettered: as it is meant, or with the least and the most that tolerances leave. */
export type BandWording = "nominal" | "with bands";

/** "33.5", or with its band "33.5 (32.6 to 34.4)"; one that is known exactly has none. */
export function formatBand(band: Banded, unit: LengthUnit, wording: BandWording): string {
  const nominal = formatLength(band.nominal, unit);
  const ends = wording === "nominal" ? "" : formatBandEnds(band, unit);
  return ends === "" ? nominal : `${nominal} (${ends})`;
}

/** The least and the most, "32.6 to 34.4"; "" for what is known exactly. */
export function formatBandEnds({ least, most }: Banded, unit: LengthUnit): string {
  if (least === most) return "";
  const fine = (mm: number) => formatFine(mm, unit).replace(/\s*(mm|″)$/u, "");
  return `${fine(least)} to ${fine(most)}`;
}
