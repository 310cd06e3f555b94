import type { Point } from "../geometry/path.ts";

/** Azimuth in degrees clockwise from the top, elevation in degrees over the wall plane (90 is head-on), angular size in radians. */
export type Light = { readonly azimuth: number; readonly elevation: number; readonly angularSize: number };

const radians = (degrees: number) => (degrees * Math.PI) / 180;

/** The direction shadows fall on the board, a unit vector with y down: away from where the light stands. */
export function shadowDirection({ azimuth }: Light): Point {
  return { x: -Math.sin(radians(azimuth)), y: Math.cos(radians(azimuth)) };
}

/** How far the shadow of an edge falls from it, for an edge `heightMm` above what receives it: h / tan ε. Similar triangles. */
export function shadowOffsetMm(heightMm: number, { elevation }: Light): number {
  return elevation >= 90 ? 0 : heightMm / Math.tan(radians(elevation));
}

/**
 * Widths of the half-shadow of an edge `heightMm` above what receives it, for a disc source of small angular size:
 * h·σ / sin² ε along the fall, h·σ / sin ε across it (geometrical optics).
 */
export function penumbraMm(heightMm: number, { elevation, angularSize }: Light): { along: number; across: number } {
  const sine = Math.sin(radians(elevation));
  return { along: (heightMm * angularSize) / sine ** 2, across: (heightMm * angularSize) / sine };
}

/** The Gaussian sigma whose spread equals that of an even half-shadow of this width. */
export const sigmaOfWidth = (widthMm: number): number => widthMm / Math.sqrt(12);
