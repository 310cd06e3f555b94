/** One step of a page's content: an operator under pdf.js' name for it, with operands as pdf.js resolved them. */
export type PdfOperation = { readonly name: string; readonly args: readonly unknown[] };

/** A font of the file as far as its outlines are needed. */
export type PdfFont = {
  /** The file doesn't hold the font itself, so there are no outlines. */
  readonly isMissing: boolean;
  readonly isVertical: boolean;
  /** From glyph space to text space; the first number scales widths. */
  readonly matrix: readonly number[];
  /** Where a vertical font puts a glyph that says nothing of its own: advance, x and y, in glyph space. */
  readonly verticalDefaults: readonly number[];
  /** The outline of a glyph in ems, drawn as path numbers are; null for a blank one, undefined when it can't be read. */
  readonly outline: (glyph: string) => ArrayLike<number> | null | undefined;
  /** Glyphs that are drawn by operators of their own (Type 3); null in every other font. */
  readonly drawn: ((glyph: string) => readonly PdfOperation[] | null) | null;
};

/** One page of a PDF, ready to be drawn: nothing in it runs, and nothing has to be fetched any more. */
export type PdfPage = {
  /** The part of the page that shows: left, bottom, right, top in user space units. */
  readonly box: readonly [number, number, number, number];
  /** Degrees clockwise by which the page is turned when it is shown. */
  readonly turn: number;
  /** Points in one unit of user space. */
  readonly unit: number;
  readonly operations: readonly PdfOperation[];
  readonly font: (id: string) => PdfFont | null;
  /** A shading as pdf.js describes it; undefined when it can't be read. */
  readonly shading: (id: string) => unknown;
  /** Whether content of an optional group (a drawing program's layer) shows. */
  readonly isVisible: (group: unknown) => boolean;
};
