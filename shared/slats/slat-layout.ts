import type { Point, Polygon, Region } from "../geometry/path.ts";

/** A board that slats are laid on: its body without the frame, from its upper left corner, y down. */
export type SlatBoard = {
  readonly width: number;
  readonly height: number;
  /** Its outline, flattened; null for a rectangle of that width and height. */
  readonly outline: Region | null;
};

/** How the slats are meant to lie. Lengths mm. */
export type SlatDesign = {
  /** Mitred to a spine, mitred to each other on a middle line, or all in one direction. */
  readonly pattern: "spine" | "mitred" | "single";
  /** Between slat and spine (the upright, where there is none), degrees, 15 to 90. */
  readonly angle: number;
  readonly slatWidth: number;
  readonly gap: number;
  /** Width of the spine; not read where there is none. */
  readonly spineWidth: number;
  /** How far the spine, or the line where slats meet, lies right of the board's middle; not read for one direction. */
  readonly spineOffset: number;
  /**
   * Where the first slat begins: in the corner farthest from the spine, or with its first edge that high over the edge that
   * slats rise from, measured at the spine (at the board's left edge for one direction).
   */
  readonly start: { readonly kind: "corner" } | { readonly kind: "height"; readonly height: number };
  /** Slats rise outwards (to the right, for one direction), or fall. `down` is `up` mirrored, its start too. */
  readonly direction: "up" | "down";
  /** How far slats are laid past the board's edge, to be trimmed flush. */
  readonly overhang: number;
};

/** An edge that a slat's end meets. `outline` is the edge of a board that is no rectangle. */
export type SlatEdge = "spine" | "left" | "right" | "upper" | "lower" | "outline";

/** One cut of a slat's end. */
export type SlatCut = {
  readonly edge: SlatEdge;
  /** Saw setting in degrees off a square cut, 0 to 90. */
  readonly setting: number;
  /** Whether the cut shows in the end: at the spine, and where nothing is left over for trimming. */
  readonly mustFit: boolean;
};

/** One slat: one piece of wood, in one side of the board. */
export type Slat = {
  /** Place in the laying order, from 1: from the start on, then back from it; left before right. */
  readonly order: number;
  /** Counted from the slat at the start, which is 0. Several slats share a number where a notch parts them. */
  readonly strip: number;
  readonly side: "left" | "right" | "whole";
  /** As it is cut and laid, and what is left of it after trimming: several parts where the board has notches. */
  readonly untrimmed: Polygon;
  readonly trimmed: Region;
  readonly isTrimmed: boolean;
  /** Middle line of the full slat from its near end, at the spine or left, to its far end: the grain runs along it. */
  readonly axis: { readonly from: Point; readonly to: Point };
  /** As cut: from long point to long point, and the shorter of its two long edges (0 where that is only a tip). */
  readonly longPoint: number;
  readonly shortPoint: number;
  /** From long point to long point after trimming. */
  readonly trimmedLongPoint: number;
  /** Width of what shows of it, across its grain. */
  readonly trimmedWidth: number;
  /** One cut at each end, or two where a corner of the board lies in it. */
  readonly near: readonly SlatCut[];
  readonly far: readonly SlatCut[];
};

export type Spine = { readonly untrimmed: Polygon; readonly trimmed: Region; readonly length: number };

export type SlatLayout = {
  readonly design: SlatDesign;
  /** The board's outline as a region, also for a rectangle. */
  readonly body: Region;
  /** In laying order. */
  readonly slats: readonly Slat[];
  readonly spine: Spine | null;
  /** The start as a height, whichever way it was given. */
  readonly startHeight: number;
  /** How far apart slats repeat along the spine. */
  readonly pitch: number;
};
