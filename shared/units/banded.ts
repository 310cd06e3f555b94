/** A value with the band it can lie in, from the tolerances of the sheets. All mm. */
export type Banded = { readonly nominal: number; readonly least: number; readonly most: number };

/** A value that is known exactly. */
export const exactly = (nominal: number): Banded => ({ nominal, least: nominal, most: nominal });

/** One thing on top of another: nominal to nominal, least to least, most to most. */
export function bandSum(...bands: readonly Banded[]): Banded {
  return bands.reduce(
    (sum, band) => ({
      nominal: sum.nominal + band.nominal,
      least: sum.least + band.least,
      most: sum.most + band.most,
    }),
    exactly(0),
  );
}

/** The highest of several bands; null for none. What lies on them all lies on this. */
export function bandHighest(bands: readonly Banded[]): Banded | null {
  return bands.reduce<Banded | null>((highest, band) => (highest ? combine(Math.max, highest, band) : band), null);
}

/** The lowest of several bands; null for none. */
export function bandLowest(bands: readonly Banded[]): Banded | null {
  return bands.reduce<Banded | null>((lowest, band) => (lowest ? combine(Math.min, lowest, band) : band), null);
}

function combine(pick: (a: number, b: number) => number, a: Banded, b: Banded): Banded {
  return { nominal: pick(a.nominal, b.nominal), least: pick(a.least, b.least), most: pick(a.most, b.most) };
}
