import { type Matrix, matrixMultiply, scaleMatrix, translateMatrix } from "../../geometry/transform.ts";
import type { PageWalk } from "./draw-operations.ts";
import { paintArea } from "./draw-path.ts";
import type { GraphicsState } from "./graphics-state.ts";
import { isRecord, matrixOf, numberAt } from "./operands.ts";
import { pathData } from "./path-data.ts";
import type { PdfFont, PdfOperation } from "./pdf-page.ts";
import type { Outline } from "./svg-writer.ts";

type Draw = (walk: PageWalk, operations: readonly PdfOperation[]) => void;

/** Text showing modes (ISO 32000-1, table 106): the last two bits say what is painted, the third that it becomes a clip. */
const invisible = 3;
const addsToClip = 4;

/** Follows one text operator, if it is one. `draw` paints the glyphs of fonts that are drawn by operators of their own. */
export function drawText(walk: PageWalk, name: string, args: readonly unknown[], draw: Draw): void {
  const { state } = walk;
  switch (name) {
    case "beginText":
      state.textMatrix = { a: 1, b: 0, c: 0, d: 1, e: 0, f: 0 };
      state.at = state.line = { x: 0, y: 0 };
      break;
    case "endText":
      if (walk.textClip.length > 0) state.clip = walk.writer.clipTo(state.clip, walk.textClip);
      walk.textClip = [];
      break;
    case "setCharSpacing":
      state.characterSpacing = numberAt(args, 0);
      break;
    case "setWordSpacing":
      state.wordSpacing = numberAt(args, 0);
      break;
    case "setHScale":
      state.stretch = numberAt(args, 0, 100) / 100;
      break;
    case "setLeading":
      state.leading = numberAt(args, 0);
      break;
    case "setTextRise":
      state.rise = numberAt(args, 0);
      break;
    case "setTextRenderingMode":
      state.textMode = numberAt(args, 0);
      break;
    case "setFont":
      state.font = typeof args[0] === "string" ? walk.page.font(args[0]) : null;
      state.fontSize = numberAt(args, 1);
      break;
    case "setTextMatrix":
      state.textMatrix = matrixOf(args[0]) ?? state.textMatrix;
      state.at = state.line = { x: 0, y: 0 };
      break;
    case "moveText":
      moveLine(state, numberAt(args, 0), numberAt(args, 1));
      break;
    case "setLeadingMoveText":
      state.leading = -numberAt(args, 1);
      moveLine(state, numberAt(args, 0), numberAt(args, 1));
      break;
    case "nextLine":
      moveLine(state, 0, -state.leading);
      break;
    case "showText":
      if (Array.isArray(args[0])) showGlyphs(walk, args[0], draw);
      break;
  }
}

function moveLine(state: GraphicsState, x: number, y: number): void {
  state.line = { x: state.line.x + x, y: state.line.y + y };
  state.at = state.line;
}

/** Paints glyphs and moves on (ISO 32000-1, 9.4.4). Numbers between them are thousandths of an em to move back by. */
function showGlyphs(walk: PageWalk, glyphs: readonly unknown[], draw: Draw): void {
  const { font, fontSize } = walk.state;
  if (!font || fontSize === 0) {
    if (!font && glyphs.length > 0 && walk.state.textMode !== invisible) walk.warnings.add("pdf.font-missing");
    return;
  }
  for (const glyph of glyphs) {
    if (typeof glyph === "number") advance(walk.state, font, (-glyph / 1000) * fontSize);
    else if (isRecord(glyph)) showGlyph(walk, font, glyph, draw);
  }
}

function showGlyph(walk: PageWalk, font: PdfFont, glyph: Readonly<Record<string, unknown>>, draw: Draw): void {
  const { state } = walk;
  const { fontSize } = state;
  const perUnit = font.matrix[0] ?? 0.001;
  const width = numberAt([glyph.width], 0);
  const spacing = state.characterSpacing + (glyph.isSpace === true ? state.wordSpacing : 0);
  let origin = { x: 0, y: 0 };
  let along = width * perUnit * fontSize + spacing;
  if (font.isVertical) {
    const [w1, vx, vy] = verticalMetrics(glyph, font, width);
    origin = { x: -vx * perUnit * fontSize, y: -vy * perUnit * fontSize };
    along = w1 * perUnit * fontSize + spacing;
  }
  const start = matrixMultiply(
    matrixMultiply(state.matrix, state.textMatrix),
    matrixMultiply(
      translateMatrix(state.at.x, state.at.y + state.rise),
      matrixMultiply(scaleMatrix(state.stretch, 1), translateMatrix(origin.x, origin.y)),
    ),
  );
  if (font.drawn) drawGlyph(walk, font, { glyph, start }, draw);
  else paintGlyph(walk, font, glyph, start);
  advance(walk.state, font, along);
}

/** Advance and origin of a glyph set downwards; without figures of its own it hangs from the middle of its top. */
function verticalMetrics(
  glyph: Readonly<Record<string, unknown>>,
  font: PdfFont,
  width: number,
): readonly [number, number, number] {
  const own = Array.isArray(glyph.vmetric) ? glyph.vmetric : null;
  const given = own ?? font.verticalDefaults;
  return [numberAt(given, 0, -1000), own ? numberAt(own, 1) : width / 2, numberAt(given, 2, 880)];
}

function advance(state: GraphicsState, font: PdfFont, by: number): void {
  const { x, y } = state.at;
  state.at = font.isVertical ? { x, y: y + by } : { x: x + by * state.stretch, y };
}

function drawGlyph(
  walk: PageWalk,
  font: PdfFont,
  { glyph, start }: { glyph: Readonly<Record<string, unknown>>; start: Matrix },
  draw: Draw,
): void {
  const { state } = walk;
  if (state.textMode === invisible) return;
  const operations = font.drawn?.(String(glyph.operatorListId)) ?? null;
  const own = matrixOf(font.matrix);
  if (!operations || !own) {
    walk.warnings.add("text.lost");
    return;
  }
  const depth = walk.saved.length;
  walk.saved.push({ ...state });
  walk.state = {
    ...state,
    matrix: matrixMultiply(matrixMultiply(start, scaleMatrix(state.fontSize)), own),
  };
  draw(walk, operations);
  walk.state = walk.saved[depth] ?? state;
  walk.saved.length = depth;
}

function paintGlyph(walk: PageWalk, font: PdfFont, glyph: Readonly<Record<string, unknown>>, start: Matrix): void {
  const { state } = walk;
  const isBlank = typeof glyph.unicode === "string" && glyph.unicode.trim() === "";
  if (state.textMode === invisible || isBlank || !walk.content.every(Boolean)) return;
  if (font.isMissing || glyph.isInFont === false) {
    walk.warnings.add(font.isMissing ? "pdf.font-missing" : "text.lost");
    return;
  }
  const matrix = matrixMultiply(start, scaleMatrix(state.fontSize));
  paintOutline(walk, font, String(glyph.fontChar), matrix);
  if (!isRecord(glyph.accent) || !isRecord(glyph.accent.offset)) return;
  const { x, y } = glyph.accent.offset;
  const shift = translateMatrix(numberAt([x], 0), numberAt([y], 0));
  paintOutline(walk, font, String(glyph.accent.fontChar), matrixMultiply(matrix, shift));
}

function paintOutline(walk: PageWalk, font: PdfFont, name: string, matrix: Matrix): void {
  const { state, warnings } = walk;
  const packed = font.outline(name);
  if (packed === null) return;
  // Ems: a glyph of a metre still needs its hundredths of a mm.
  const data = packed === undefined ? null : pathData(packed, 7);
  if (data === null) {
    warnings.add("text.lost");
    return;
  }
  if (data === "") return;
  const outline: Outline = { data, rule: "nonzero", matrix };
  const paints = state.textMode % addsToClip;
  const textScale = Math.hypot(state.textMatrix.a, state.textMatrix.b) * Math.abs(state.fontSize);
  paintArea(walk, outline, {
    fill: paints === 0 || paints === 2 ? state.fill : null,
    stroke: paints === 1 || paints === 2 ? state.stroke : null,
    penScale: textScale > 0 ? 1 / textScale : 1,
  });
  if (state.textMode >= addsToClip) walk.textClip.push(outline);
}
