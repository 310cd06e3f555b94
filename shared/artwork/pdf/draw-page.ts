import type { Box } from "../../geometry/path.ts";
import { type Matrix, matrixMultiply } from "../../geometry/transform.ts";
import type { WarningCode } from "../warnings.ts";
import { drawOperations, type PageWalk } from "./draw-operations.ts";
import { type GraphicsState, startOfState } from "./graphics-state.ts";
import type { PdfPage } from "./pdf-page.ts";
import { SvgWriter } from "./svg-writer.ts";

const mmPerPoint = 25.4 / 72;

/**
 * A page of a PDF as an SVG text of paths, clips, masks and groups in true size, and what it does not show as the page
 * does. Same page, same text. Throws ArtworkRefused when the page holds more than artwork may.
 */
export function drawPage(page: PdfPage): { readonly svg: string; readonly warnings: ReadonlySet<WarningCode> } {
  const [left, bottom, right, top] = page.box;
  const { matrix, width, height } = placed({ left, bottom, width: right - left, height: top - bottom }, page);
  const bounds: Box = { x: 0, y: 0, width, height };
  const warnings = new Set<WarningCode>();
  const writer = new SvgWriter();
  const state: GraphicsState = startOfState(matrix, { id: null, bounds });
  const walk: PageWalk = {
    page,
    pageBox: bounds,
    writer,
    warnings,
    state,
    saved: [],
    groups: [],
    content: [],
    clipRule: null,
    textClip: [],
    pendingMask: null,
    depth: 0,
  };
  drawOperations(walk, page.operations);
  const size = `width="${width * mmPerPoint}mm" height="${height * mmPerPoint}mm"`;
  const root = `<svg xmlns="http://www.w3.org/2000/svg" ${size} viewBox="0 0 ${width} ${height}">`;
  return { svg: writer.finish(root), warnings };
}

/** The page's size in points as it is shown, and the way from user space to it, y down (ISO 32000-1, 8.3.2.3 and 14.11.2). */
function placed(
  { left, bottom, width, height }: { left: number; bottom: number; width: number; height: number },
  { turn, unit }: PdfPage,
): { readonly matrix: Matrix; readonly width: number; readonly height: number } {
  const upright: Matrix = { a: unit, b: 0, c: 0, d: -unit, e: -left * unit, f: (bottom + height) * unit };
  const [w, h] = [width * unit, height * unit];
  switch (((turn % 360) + 360) % 360) {
    case 90:
      return { matrix: matrixMultiply({ a: 0, b: 1, c: -1, d: 0, e: h, f: 0 }, upright), width: h, height: w };
    case 180:
      return { matrix: matrixMultiply({ a: -1, b: 0, c: 0, d: -1, e: w, f: h }, upright), width: w, height: h };
    case 270:
      return { matrix: matrixMultiply({ a: 0, b: -1, c: 1, d: 0, e: 0, f: w }, upright), width: h, height: w };
    default:
      return { matrix: upright, width: w, height: h };
  }
}
