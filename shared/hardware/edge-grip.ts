import { distanceToRegionEdgeMm, regionContains } from "../geometry/contains.ts";
import type { Point, Region } from "../geometry/path.ts";
import type { Banded } from "../units/banded.ts";

/**
 * How much wider the slot of an edge grip is than the sheet, mm: at its thickest, where less than nothing does not go
 * in, and at its thinnest, where it must still hold. Arithmetic.
 */
export function slotPlayMm(slotWidth: number, sheet: Banded): { readonly thickest: number; readonly thinnest: number } {
  return { thickest: slotWidth - sheet.most, thinnest: slotWidth - sheet.least };
}

/**
 * How far a holder reaches over the panel's edge at that place, mm; less than nothing when it does not reach it. The
 * holder is round, its middle usually outside the panel.
 */
export function edgeOverlapMm(barrelDiameter: number, region: Region, place: Point): number {
  const distance = distanceToRegionEdgeMm(region, place);
  return barrelDiameter / 2 + (regionContains(region, place) ? distance : -distance);
}
