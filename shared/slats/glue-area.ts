import { regionAreaMm2 } from "../geometry/area.ts";
import { checked, type Outcome } from "../units/outcome.ts";
import type { SlatLayout } from "./slat-layout.ts";

export type GlueArea = {
  /** Wood on the substrate after trimming, spine and slats; open joints take none. */
  readonly areaMm2: number;
  /** Glue for what is laid, overhang and all, since it is spread before trimming. */
  readonly massG: number;
};

/** Wood glue spread on one face, g/m²: common practice, the maker's sheet goes before it. */
export const usualSpreadGPerM2 = 200;

/** What of the slats and the spine is glued to the substrate, and the glue it takes. Arithmetic. */
export function glueArea(layout: Pick<SlatLayout, "slats" | "spine">, spread = usualSpreadGPerM2): Outcome<GlueArea> {
  return checked({ spread: [spread, { least: 0, most: 2_000 }] }, () => {
    const pieces = layout.spine ? [layout.spine, ...layout.slats] : layout.slats;
    const sum = (areas: readonly number[]) => areas.reduce((all, area) => all + area, 0);
    const areaMm2 = sum(pieces.map(({ trimmed }) => regionAreaMm2(trimmed)));
    const laidMm2 = sum(pieces.map(({ untrimmed }) => regionAreaMm2([untrimmed])));
    return { areaMm2, massG: (laidMm2 / 1e6) * spread };
  });
}
