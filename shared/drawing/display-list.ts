import type { Box, Path, Point } from "../geometry/path.ts";

/** Colour as #RRGGBB. Opacity is a field of its own, 0 to 1. */
export type Colour = string;

export type Stroke = {
  readonly colour: Colour;
  readonly widthMm: number;
  readonly dashMm?: readonly number[];
  readonly cap?: "butt" | "round";
};

/**
 * Lengths are mm on the drawing's own plane, x right and y down. Painters know nothing of signs: they draw these items in order.
 * `id` names what the item shows (a piece, a layer, a hole, a note) so that a touch on the picture finds it.
 */
export type Item =
  /** Closed rings, even-odd. */
  | {
      readonly kind: "path";
      readonly id?: string;
      readonly path: Path;
      readonly fill?: Colour;
      readonly stroke?: Stroke;
      readonly opacity?: number;
    }
  /** An open line. */
  | { readonly kind: "line"; readonly id?: string; readonly points: readonly Point[]; readonly stroke: Stroke }
  /** `at` is the baseline point, left, middle or right by `align`; `sizeMm` is the em size; turned clockwise about `at`. */
  | {
      readonly kind: "text";
      readonly id?: string;
      readonly text: string;
      readonly at: Point;
      readonly sizeMm: number;
      readonly font: Font;
      readonly colour: Colour;
      readonly align: "left" | "middle" | "right";
      readonly turn?: number;
    }
  /** A PNG with alpha, stretched over `box`. Shadows and textures come as images, made once for all painters. */
  | {
      readonly kind: "image";
      readonly id?: string;
      readonly box: Box;
      readonly pngBase64: string;
      readonly opacity?: number;
    }
  /** Items drawn only inside `clip` (even-odd). */
  | { readonly kind: "clip"; readonly clip: Path; readonly items: readonly Item[] }
  /** Items moved by (x, y) and then scaled by `scale` about that point: how a view is set on a sheet. Stroke widths and text scale too. */
  | {
      readonly kind: "group";
      readonly id?: string;
      readonly x: number;
      readonly y: number;
      readonly scale: number;
      readonly items: readonly Item[];
    };

export type Font = "serif" | "serif-bold" | "serif-black" | "sans" | "sans-semibold";

/** A picture `widthMm` by `heightMm` with its origin at the upper left. */
export type DisplayList = { readonly widthMm: number; readonly heightMm: number; readonly items: readonly Item[] };

/** A page of a drawing set, in true millimetres of paper. */
export type DrawingSheet = DisplayList & { readonly name: string };
