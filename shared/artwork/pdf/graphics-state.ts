import type { Matrix } from "../../geometry/transform.ts";
import type { PdfFont } from "./pdf-page.ts";
import type { Clip } from "./svg-writer.ts";

/** What is painted with: a colour, nothing, or one colour in place of a gradient or a pattern. */
export type PdfPaint = { readonly colour: string; readonly alpha: number } | null;

/** The graphics state of a page's content (ISO 32000-1, 8.4), with its text state (9.3), as far as outlines and colours need it. */
export type GraphicsState = {
  matrix: Matrix;
  clip: Clip;
  /** The mask everything is painted through; null for none. */
  mask: string | null;
  fill: PdfPaint;
  stroke: PdfPaint;
  fillAlpha: number;
  strokeAlpha: number;
  isBlended: boolean;
  lineWidth: number;
  cap: number;
  join: number;
  mitreLimit: number;
  dashes: readonly number[];
  dashOffset: number;
  font: PdfFont | null;
  /** Negative where the text runs backwards. */
  fontSize: number;
  characterSpacing: number;
  wordSpacing: number;
  stretch: number;
  leading: number;
  rise: number;
  textMode: number;
  textMatrix: Matrix;
  /** Where the next glyph and the present line begin, in text space. */
  at: { readonly x: number; readonly y: number };
  line: { readonly x: number; readonly y: number };
};

const black: PdfPaint = { colour: "#000000", alpha: 1 };

/** The state a page begins with (ISO 32000-1, tables 52 and 104). */
export function startOfState(matrix: Matrix, clip: Clip): GraphicsState {
  return {
    matrix,
    clip,
    mask: null,
    fill: black,
    stroke: black,
    fillAlpha: 1,
    strokeAlpha: 1,
    isBlended: false,
    lineWidth: 1,
    cap: 0,
    join: 0,
    mitreLimit: 10,
    dashes: [],
    dashOffset: 0,
    font: null,
    fontSize: 0,
    characterSpacing: 0,
    wordSpacing: 0,
    stretch: 1,
    leading: 0,
    rise: 0,
    textMode: 0,
    textMatrix: { a: 1, b: 0, c: 0, d: 1, e: 0, f: 0 },
    at: { x: 0, y: 0 },
    line: { x: 0, y: 0 },
  };
}
