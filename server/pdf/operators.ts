import {
  appendBezierCurve,
  closePath,
  LineCapStyle,
  LineJoinStyle,
  lineTo,
  moveTo,
  PDFArray,
  type PDFDocument,
  PDFHexString,
  PDFNumber,
  PDFOperator,
  PDFOperatorNames,
  popGraphicsState,
  pushGraphicsState,
  rgb,
  setDashPattern,
  setFillingColor,
  setLineCap,
  setLineJoin,
  setLineWidth,
  setStrokingColor,
  stroke as strokePath,
} from "pdf-lib";
import type { Colour, Item, Stroke } from "#shared/drawing/display-list.ts";
import { colourChannels } from "#shared/drawing/palette.ts";
import type { Path } from "#shared/geometry/path.ts";
import type { SetGlyph } from "./fonts.ts";

/** A display list's colour as pdf-lib takes it. */
export const colourOf = (colour: Colour) => {
  const [red, green, blue] = colourChannels(colour);
  return rgb(red / 255, green / 255, blue / 255);
};

/** Rings as path operators, not yet filled, stroked or clipped with. */
export function pathOperators(path: Path): PDFOperator[] {
  return path.flatMap((ring) => [
    moveTo(ring.start.x, ring.start.y),
    ...ring.segments.map((segment) =>
      segment.kind === "line"
        ? lineTo(segment.to.x, segment.to.y)
        : appendBezierCurve(segment.c1.x, segment.c1.y, segment.c2.x, segment.c2.y, segment.to.x, segment.to.y),
    ),
    closePath(),
  ]);
}

function strokeOperators(stroke: Stroke): PDFOperator[] {
  return [
    setStrokingColor(colourOf(stroke.colour)),
    setLineWidth(stroke.widthMm),
    setLineCap(stroke.cap === "round" ? LineCapStyle.Round : LineCapStyle.Butt),
    setLineJoin(LineJoinStyle.Round),
    ...(stroke.dashMm === undefined ? [] : [setDashPattern([...stroke.dashMm], 0)]),
  ];
}

/** Operators that leave the graphics state as it was. */
export const saved = (operators: readonly PDFOperator[]) => [pushGraphicsState(), ...operators, popGraphicsState()];

/** A path item without its opacity: filled by the even-odd rule, then stroked. */
export function pathItemOperators(item: Extract<Item, { kind: "path" }>): PDFOperator[] {
  const outline = pathOperators(item.path);
  const fill =
    item.fill === undefined
      ? []
      : [setFillingColor(colourOf(item.fill)), ...outline, PDFOperator.of(PDFOperatorNames.FillEvenOdd)];
  const line = item.stroke === undefined ? [] : [...strokeOperators(item.stroke), ...outline, strokePath()];
  return [...fill, ...line];
}

/** An open line; fewer than two points draw nothing. */
export function lineItemOperators(item: Extract<Item, { kind: "line" }>): PDFOperator[] {
  const points = item.points.map((point, index) => (index === 0 ? moveTo(point.x, point.y) : lineTo(point.x, point.y)));
  return points.length < 2 ? [] : [...strokeOperators(item.stroke), ...points, strokePath()];
}

/** One TJ: the glyphs four hexadecimal digits each, with the kerning between them in thousandths of the em. */
export function showGlyphs(document: PDFDocument, encoded: PDFHexString, glyphs: readonly SetGlyph[]): PDFOperator {
  const codes = encoded.asString();
  const array = PDFArray.withContext(document.context);
  let together = "";
  for (const [index, { kern }] of glyphs.entries()) {
    together += codes.slice(index * 4, index * 4 + 4);
    if (Math.abs(kern) < 0.5 && index < glyphs.length - 1) continue;
    array.push(PDFHexString.of(together));
    if (index < glyphs.length - 1) array.push(PDFNumber.of(-Math.round(kern)));
    together = "";
  }
  return PDFOperator.of(PDFOperatorNames.ShowTextAdjusted, [array]);
}
