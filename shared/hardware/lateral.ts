import { checked, lengthRange, type Outcome, type Range } from "../units/outcome.ts";

/** K in N/mm² by group of species and specific gravity (Wood Handbook before 1991, table 8-4; from memory). */
const groups = {
  hardwood: [
    { upTo: 0.47, k: 23.17 },
    { upTo: 0.56, k: 31.99 },
    { upTo: 0.74, k: 44.13 },
  ],
  softwood: [
    { upTo: 0.42, k: 23.17 },
    { upTo: 0.47, k: 29.79 },
    { upTo: 0.52, k: 36.4 },
  ],
} as const;

/** Gravities that the table lists. */
export const lateralGravities: Readonly<Record<keyof typeof groups, Range>> = {
  hardwood: { least: 0.33, most: 0.74 },
  softwood: { least: 0.29, most: 0.52 },
};

/** What we divide the tabled load by for the load a fixing may carry (our choice). */
export const lateralSafety = 2;

/** Screw diameters of penetration that the tabled load asks for, and the least that counts (from memory). */
const fullPenetration = 7;
const leastPenetration = 4;

export type LateralLoad = {
  readonly loadN: number;
  /** Whether the screw sits shallower than any edition counts on: under four diameters the load is an estimate. */
  readonly tooShallow: boolean;
};

/**
 * Load in N across a wood screw in side grain at about 0.4 mm of slip: K D² (Wood Handbook before 1991, table 8-4; from
 * memory), D the shank's diameter in mm. Less in proportion where less than 7 D of the screw is in the wood (National
 * Design Specification before 1991; from memory). It counted on no screw under 4 D; since 2001 its yield equations take
 * a shallow screw by how much wood it bears on, which is in proportion too, but want 6 D (American Wood Council, "Does
 * the penetration depth factor apply", 2006). So we go on in proportion under 4 D and say that it is an estimate.
 * Gravities are those of the table, rounded to hundredths as it is.
 */
export function screwLateral(screw: {
  readonly gravity: number;
  readonly hardness: keyof typeof groups;
  readonly diameter: number;
  readonly penetration: number;
}): Outcome<LateralLoad> {
  const { hardness, diameter, penetration } = screw;
  const gravity = Math.round(screw.gravity * 100) / 100;
  return checked(
    {
      gravity: [gravity, lateralGravities[hardness]],
      diameter: [diameter, lengthRange],
      penetration: [penetration, { least: 0, most: 1000 }],
    },
    () => {
      const k = groups[hardness].find(({ upTo }) => gravity <= upTo)?.k ?? 0;
      const depth = penetration / diameter;
      return {
        loadN: k * diameter ** 2 * Math.min(1, depth / fullPenetration),
        tooShallow: depth < leastPenetration,
      };
    },
  );
}

/** Load in N that may be put across a screw: the table's over what the shop divides it by. */
export function allowableLateralN(
  screw: Parameters<typeof screwLateral>[0],
  divisor: number = lateralSafety,
): Outcome<number> {
  const load = screwLateral(screw);
  return load.ok ? { ok: true, value: load.value.loadN / divisor } : load;
}
