/** Pixels row by row from the upper left, four bytes each: red, green, blue and how opaque. */
export type Picture = {
  readonly width: number;
  readonly height: number;
  readonly data: Uint8Array | Uint8ClampedArray;
};

/** A colour of a picture: red, green, blue, opacity, each from 0 to 255. Opacity 0 is "no colour". */
export type Rgb = { readonly red: number; readonly green: number; readonly blue: number; readonly alpha: number };

/** No colour at all: what a transparent pixel shows. */
export const nothing: Rgb = { red: 0, green: 0, blue: 0, alpha: 0 };
