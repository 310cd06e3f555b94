import type { LaidShape } from "./cut-shape.ts";
import type { SheetField } from "./sheet-field.ts";

/** One copy of a piece that is to be cut; `index` counts all copies, `shape` the pieces. */
export type Item = { readonly index: number; readonly shape: number; readonly copy: number };

/** A field of one of the sheets that are used. */
export type OpenField = { readonly field: SheetField; readonly sheet: number };

/** A copy in its place. */
export type LaidCopy = {
  readonly item: Item;
  /** Index into the open fields. */
  readonly on: number;
  readonly laid: LaidShape;
  /** Upper left corner of the box around it, on the sheet. */
  readonly x: number;
  readonly y: number;
};

export type Filling = { readonly laid: readonly LaidCopy[]; readonly left: readonly Item[] };

export type FillControl = {
  /** Looks after which the search ends; 0 lays everything once. A look is the same on every machine. */
  readonly probes: number;
  readonly seed: number;
  readonly shouldStop: () => boolean;
  /** The share of the search that is done and the best filling so far: when there is a better one, and now and then. */
  readonly onProgress: (done: number, best: Filling) => void;
};

/** A way of filling fields: cell by cell for any shapes, along a skyline for rectangles. */
export type Filler = {
  /** Lays items on the fields, from the first field on, and searches for a layout that loses less. */
  readonly fill: (items: readonly Item[], open: readonly OpenField[], control: FillControl) => Filling;
  /** Looks that take a workshop's computer about a second. */
  readonly probesPerSecond: number;
  /** Whether a piece goes on an empty field. */
  readonly fits: (shape: number, field: SheetField) => boolean;
};
