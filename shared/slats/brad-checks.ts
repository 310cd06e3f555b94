import { distanceToRegionEdgeMm, regionContains } from "../geometry/contains.ts";
import type { Region } from "../geometry/path.ts";
import { isShorter } from "../geometry/tolerance.ts";
import { reachRoom, screwReach } from "../hardware/screw-reach.ts";
import type { Outcome } from "../units/outcome.ts";
import { type Brad, bradSpacing } from "./brad-map.ts";
import { type SlatHold, type SlatsUnder, slatHold, usualHoldMm } from "./slat-hold.ts";

/** A brad too near to the trim line, or beyond it (then its distance is less than 0): the trimming blade would meet it. */
export type BradAtTrim = { readonly brad: Brad; readonly insideMm: number };

/** The brads nearer than `least` mm inside the line that slats are trimmed to, nearest first. Common practice. */
export function bradsAtTrim(brads: readonly Brad[], body: Region, least: number = bradSpacing.trim): BradAtTrim[] {
  return brads
    .map((brad) => {
      const distance = distanceToRegionEdgeMm(body, brad);
      return { brad, insideMm: regionContains(body, brad) ? distance : -distance };
    })
    .filter(({ insideMm }) => isShorter(insideMm, least))
    .toSorted((a, b) => a.insideMm - b.insideMm);
}

export type BradReach = SlatHold & {
  /** What is left under the point before it shows in the back, less the skin; under 0 it comes too near. */
  readonly leftMm: number;
};

/**
 * How far a brad of a length, set under the face, reaches into the substrate, of which `needed`, and what is left behind its
 * point. All mm. Common practice.
 */
export function bradReach(length: number, under: SlatsUnder, needed: number = usualHoldMm.brad): Outcome<BradReach> {
  const reach = screwReach({ kind: "brad", length });
  if (!reach.ok) return reach;
  const room = reachRoom(reach.value, under);
  if (!room.ok) return room;
  const hold = slatHold(reach.value.point, under, needed);
  if (!hold.ok) return hold;
  return { ok: true, value: { ...hold.value, leftMm: room.value.leftMm } };
}
