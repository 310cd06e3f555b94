import { distanceToRegionEdgeMm, regionContains, ringContains } from "../geometry/contains.ts";
import type { Point, Region } from "../geometry/path.ts";
import { isShorter } from "../geometry/tolerance.ts";

/** Something that lies on the panel's face. */
export type OnPanel = { readonly id: string; readonly region: Region };

export type CapFootprint =
  /** The cap lies flat: on the panel (null), or all of it on one thing on the panel. */
  | { readonly kind: "one level"; readonly on: string | null }
  /** Things that the cap would stand on with a part only, with how deep they must be notched to clear it, mm. */
  | { readonly kind: "several levels"; readonly over: readonly { readonly id: string; readonly notchMm: number }[] };

/** How far a notch keeps off the cap all round, mm (common practice). */
export const notchClearanceMm = 0.5;

/**
 * Whether a cap lies on one level. It does when every thing on the panel keeps off its edge by the clearance, or when it
 * lies wholly on one of them and clears the others. A hole that lies wholly under the cap, as the stud's own, is bridged
 * and does not count.
 */
export function capFootprint(
  cap: Point & { readonly diameter: number },
  things: readonly OnPanel[],
  clearanceMm: number = notchClearanceMm,
): CapFootprint {
  const radius = cap.diameter / 2;
  const near: { id: string; notchMm: number }[] = [];
  const under: string[] = [];
  for (const { id, region: drawn } of things) {
    const region = withoutHolesUnder(cap, drawn);
    const edge = distanceToRegionEdgeMm(region, cap);
    const inside = regionContains(region, cap);
    if (inside && !isShorter(edge, radius)) under.push(id);
    else if (inside) near.push({ id, notchMm: radius + clearanceMm + edge });
    else if (isShorter(edge, radius + clearanceMm)) near.push({ id, notchMm: radius + clearanceMm - edge });
  }
  if (near.length === 0 && under.length <= 1) return { kind: "one level", on: under[0] ?? null };
  // Of several things wholly under the cap none is in the way, as they lie on each other.
  return near.length === 0 ? { kind: "one level", on: under.at(-1) ?? null } : { kind: "several levels", over: near };
}

/** Whether all of a cap lies on a thing, holes under it left out. */
export function liesWhollyOn(cap: Point & { readonly diameter: number }, drawn: Region): boolean {
  const region = withoutHolesUnder(cap, drawn);
  return regionContains(region, cap) && !isShorter(distanceToRegionEdgeMm(region, cap), cap.diameter / 2);
}

/** A region without the holes in it that the cap covers all of. */
function withoutHolesUnder(cap: Point & { readonly diameter: number }, region: Region): Region {
  const radius = cap.diameter / 2;
  return region.filter((ring) => {
    const [first] = ring;
    if (!first || ring.some(({ x, y }) => Math.hypot(x - cap.x, y - cap.y) > radius)) return true;
    // A ring that lies in an odd number of others bounds a hole.
    return region.filter((other) => other !== ring && ringContains(other, first)).length % 2 === 0;
  });
}
