import { type Banded, bandSum, exactly } from "../units/banded.ts";
import { checked, lengthRange, type Outcome, spanRange } from "../units/outcome.ts";

/** How a screw's head sits on the floor of a barrel or holder. */
export type HeadSeat = "flat in a countersunk floor" | "flat on a plain floor" | "pan or round";

/** What goes into the wood. All mm. */
export type Driven =
  | {
      readonly kind: "capStud" | "edgeGrip";
      /** Over all for a flat head, from under the head for a pan or round one. */
      readonly length: number;
      readonly floor: number;
      readonly seat: HeadSeat;
      readonly headHeight: number;
    }
  | {
      readonly kind: "throughScrew";
      readonly length: number;
      readonly washer: number;
      /** The sheets under the head. */
      readonly panel: Banded;
      readonly spacer: number;
    }
  /** `length` from the panel's back. */
  | { readonly kind: "blindStud"; readonly length: number; readonly offset: number }
  | { readonly kind: "brad"; readonly length: number };

export type Reach = {
  /** How deep the point comes below the wood's face; less than nothing when it does not get there. */
  readonly point: Banded;
  /** How deep the wood is opened: the point, or the bottom of a hole drilled for a stud. */
  readonly opened: Banded;
};

/** A stud's hole is drilled this much deeper than the stud, and a brad is set this far under the face (common practice). */
const studRoomMm = 1;
const bradSetMm = 0.5;

/** How deep a fixing comes into the wood it is driven in, from the wood's face. Arithmetic. */
export function screwReach(driven: Driven): Outcome<Reach> {
  switch (driven.kind) {
    case "capStud":
    case "edgeGrip": {
      const { length, floor, seat, headHeight } = driven;
      return checked(
        { length: [length, lengthRange], floor: [floor, spanRange], headHeight: [headHeight, spanRange] },
        () => opening(exactly(length - floor - (seat === "flat on a plain floor" ? headHeight : 0))),
      );
    }
    case "throughScrew": {
      const { length, washer, panel, spacer } = driven;
      return checked(
        {
          length: [length, lengthRange],
          washer: [washer, spanRange],
          thinnestPanel: [panel.least, spanRange],
          panel: [panel.nominal, spanRange],
          thickestPanel: [panel.most, spanRange],
          spacer: [spacer, spanRange],
        },
        () => opening(bandSum(exactly(length - washer - spacer), under(panel))),
      );
    }
    case "blindStud": {
      const { length, offset } = driven;
      return checked({ length: [length, lengthRange], offset: [offset, spanRange] }, () =>
        opening(exactly(length - offset), studRoomMm),
      );
    }
    case "brad":
      return checked({ length: [driven.length, lengthRange] }, () => opening(exactly(driven.length + bradSetMm)));
  }
}

function opening(point: Banded, deeper = 0): Reach {
  return { point, opened: bandSum(point, exactly(deeper)) };
}

/** The thickest sheet leaves the least of a screw. */
function under({ nominal, least, most }: Banded): Banded {
  return { nominal: -nominal, least: -most, most: -least };
}

/** What a fixing is driven into. All mm. */
export type WoodUnder = {
  /** Slats over the substrate; 0 for a plain plank. */
  readonly slat: number;
  readonly substrate: number;
  /** What sanding takes off the face. */
  readonly sanding: number;
  /** Wood that must be left under the point. */
  readonly skin: number;
};

/** The usual allowances: 0.3 mm for sanding, 2 mm left under the point (common practice). */
export const usualWood = { sanding: 0.3, skin: 2 } as const;

/** Least depth past the slats, mm (common practice). */
export const leastHoldMm = { screw: 6, brad: 5, "frame brad": 10 } as const;

export type ReachRoom = {
  /** How deep the wood may be opened. */
  readonly mostMm: number;
  /** Left between the deepest opening and that; less than nothing breaks through. */
  readonly leftMm: number;
  /** How far the point comes past the slats at the least; less than nothing when only the slat holds it. */
  readonly pastSlatMm: number;
};

/**
 * What room a reach leaves in the wood: opened ≤ slat + substrate − sanding − skin at its deepest, and the point past the
 * slat at its least. Arithmetic; allowances are common practice.
 */
export function reachRoom(reach: Reach, wood: WoodUnder): Outcome<ReachRoom> {
  const { slat, substrate, sanding, skin } = wood;
  return checked(
    {
      slat: [slat, spanRange],
      substrate: [substrate, lengthRange],
      sanding: [sanding, spanRange],
      skin: [skin, spanRange],
    },
    () => {
      const mostMm = slat + substrate - sanding - skin;
      // A slat that was not sanded takes the most of the screw, so sanding does not count here.
      return { mostMm, leftMm: mostMm - reach.opened.most, pastSlatMm: reach.point.least - slat };
    },
  );
}

/** The longest of a shop's screws that a test lets pass, as "the next screw down"; null when none does. */
export function longestScrew<T extends { readonly length: number }>(
  screws: readonly T[],
  fits: (screw: T) => boolean,
): T | null {
  return screws.reduce<T | null>(
    (longest, screw) => (fits(screw) && (!longest || screw.length > longest.length) ? screw : longest),
    null,
  );
}
