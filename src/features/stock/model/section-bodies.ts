import type { WrittenScrew } from "./written.ts";

/** What a body of the drawing is made of. `hollow` is air within metal. */
export type Matter = "wood" | "panel" | "metal" | "hollow" | "screw";
export type Body = { readonly matter: Matter; readonly outline: readonly (readonly [number, number])[] };

export type Place =
  | { readonly way: "along"; readonly from: number; readonly to: number }
  | { readonly way: "across"; readonly at: number; readonly from: number; readonly to: number };
export type Parts = { readonly bodies: readonly Body[]; readonly at: Readonly<Record<string, Place>> };

export const along = (from: number, to: number): Place => ({ way: "along", from, to });
export const across = (at: number, width: number): Place => ({ way: "across", at, from: -width / 2, to: width / 2 });

/** A body around the axis. */
export const turned = (matter: Matter, from: number, to: number, width: number): Body => ({
  matter,
  outline: [
    [from, -width / 2],
    [to, -width / 2],
    [to, width / 2],
    [from, width / 2],
  ],
});

/** A length that can be drawn beside the others. */
export const drawable = (mm: number | null, instead: number): number =>
  mm === null || !Number.isFinite(mm) || mm < 0 ? instead : Math.min(mm, 500);

/** Wood shown where nothing reaches deeper, mm. */
export const woodDepth = 6;

const usualScrew = { length: 16, diameter: 3.5, headDiameter: 7, headHeight: 2 };

export const drawnScrew = (screw: WrittenScrew) => ({
  length: drawable(screw.length, usualScrew.length),
  diameter: drawable(screw.diameter, usualScrew.diameter),
  headDiameter: drawable(screw.headDiameter, usualScrew.headDiameter),
  headHeight: drawable(screw.headHeight, usualScrew.headHeight),
});

/** Wood enough to show where the screw ends. */
export function woodUnder(screw: WrittenScrew, floor: number): number {
  return Math.max(woodDepth, drawnScrew(screw).length - floor + 2);
}

/** A wood screw whose head sits on or in what ends at `seat`; with `tip` its length is broken off there. */
export function screwBodies(
  screw: WrittenScrew,
  { seat, countersunk, tip }: { readonly seat: number; readonly countersunk: boolean; readonly tip?: number },
): Body[] {
  const { length, diameter, headDiameter, headHeight } = drawnScrew(screw);
  const isFlat = screw.head === "flat";
  const top = isFlat && countersunk ? seat : seat + headHeight;
  const under = top - headHeight;
  const end = tip ?? (isFlat ? top : under) - length;
  const head = headDiameter / 2;
  const shank = diameter / 2;
  return [
    {
      matter: "screw",
      outline: [
        [top, -head],
        [top, head],
        [under, isFlat ? shank : head],
        [under, shank],
        [end + diameter, shank],
        [end, 0],
        [end + diameter, -shank],
        [under, -shank],
        [under, isFlat ? -shank : -head],
      ],
    },
  ];
}
