import { boxContains, boxUnion } from "../geometry/box.ts";
import type { Box } from "../geometry/path.ts";
import type { MockupDocument } from "../mockup/document.ts";
import type { Figures } from "../stack/figures.ts";
import { signBox } from "../stack/sign-box.ts";
import { formatLength } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { type Dimension, dimensionFits, dimensionRowMm, drawDimensions, type PaperScale } from "./dimensions.ts";
import type { Colour, Item } from "./display-list.ts";
import { smallTextMm, textWidthMm } from "./type.ts";

type DimensionInput = {
  readonly document: MockupDocument;
  readonly figures: Figures;
  readonly unit: LengthUnit;
  readonly paperScale: PaperScale;
};

type Measured = { readonly key: string; readonly box: Box };

/** Layers a chain of dimensions is drawn for: the largest, and the next that does not lie within it. */
const mostChains = 2;

/** What the chains below and at the right place on the board: the layers that a hand must find room for, largest first. */
function measuredLayers({ document, figures }: DimensionInput): Measured[] {
  const layers = document.layers.flatMap((layer): Measured[] => {
    if (layer.hidden) return [];
    const box = boxUnion(figures.pieces.filter(({ layerKey }) => layerKey === layer.key).map((piece) => piece.box));
    return box ? [{ key: layer.key, box }] : [];
  });
  const bySize = layers.sort(
    (a, b) => b.box.width * b.box.height - a.box.width * a.box.height || (a.key < b.key ? -1 : 1),
  );
  const chosen: Measured[] = [];
  for (const layer of bySize) {
    if (chosen.length < mostChains && !chosen.some(({ box }) => boxContains(box, layer.box))) chosen.push(layer);
  }
  return chosen;
}

/** The outermost hole centres of the first standoff layer, on one axis; null for fewer than two or when they fall together. */
function holeSpread({ document }: DimensionInput, axis: "x" | "y"): { key: string; from: number; to: number } | null {
  for (const { hold, key, hidden } of document.layers) {
    if (hold.kind !== "standoff" || hidden || hold.holes.length < 2) continue;
    const places = hold.holes.map((hole) => hole[axis]);
    const from = Math.min(...places);
    const to = Math.max(...places);
    return to - from > 0.05 ? { key, from, to } : null;
  }
  return null;
}

/** The length with what it measures before it; the length alone where only that has room. */
function letteringOf({ from, to }: { from: number; to: number }, named: string, input: DimensionInput): string {
  const length = formatLength(to - from, input.unit);
  const whole = `${named}${length}`;
  return dimensionFits({ from, to, text: whole }, input.paperScale) ? whole : length;
}

/** The lower or right edge of the whole sign, outside which these dimensions stand. */
function farEdge({ document }: DimensionInput, axis: "x" | "y"): number {
  const { x, y, width, height } = signBox(document);
  return axis === "x" ? y + height : x + width;
}

/** Edge of the board to the layer, the layer, the layer to the other edge. Steps of nothing are left out. */
function chainDimensions(layer: Measured, axis: "x" | "y", at: number, input: DimensionInput): Dimension[] {
  const { board } = input.document;
  const end = axis === "x" ? board.width : board.height;
  const thing = farEdge(input, axis);
  const from = layer.box[axis];
  const to = from + (axis === "x" ? layer.box.width : layer.box.height);
  const steps = [
    { from: 0, to: from, named: "", overflow: "before" as const },
    { from, to, named: `${layer.key}  `, overflow: "under" as const },
    { from: to, to: end, named: "", overflow: "after" as const },
  ];
  return steps
    .filter((step) => step.to - step.from > 0.05)
    .map((step) => ({
      axis,
      from: step.from,
      to: step.to,
      at,
      thing,
      text: letteringOf(step, step.named, input),
      overflow: step.overflow,
    }));
}

function rowsOf(input: DimensionInput, axis: "x" | "y"): Dimension[] {
  const thing = farEdge(input, axis);
  const holes = holeSpread(input, axis);
  const row = (index: number) => thing + dimensionRowMm * (index + 1) * input.paperScale;
  const inner: Dimension[] =
    holes === null
      ? []
      : [
          {
            axis,
            from: holes.from,
            to: holes.to,
            at: row(0),
            thing,
            text: letteringOf(holes, `${holes.key}  holes `, input),
            overflow: "after",
          },
        ];
  const chains = measuredLayers(input).flatMap((layer, index) =>
    chainDimensions(layer, axis, row(index + inner.length), input),
  );
  return [...inner, ...chains];
}

/** The whole sign's measures above and at the left; inside a frame the body's too, in a row nearer to it. */
function overallDimensions(input: DimensionInput): Dimension[] {
  const { document, unit, paperScale } = input;
  const { board, frame } = document;
  const whole = signBox(document);
  const away = (edge: number, rows: number) => edge - dimensionRowMm * rows * paperScale;
  const framed = frame !== null && whole.width > board.width;
  const measure = (axis: "x" | "y", from: number, to: number, rows: number): Dimension => {
    const thing = axis === "x" ? whole.y : whole.x;
    return { axis, from, to, at: away(thing, rows), thing, text: formatLength(to - from, unit), overflow: "after" };
  };
  const body = (axis: "x" | "y", to: number): Dimension => {
    const plain = measure(axis, 0, to, 1);
    return { ...plain, text: letteringOf(plain, "body ", input) };
  };
  const rows = framed ? 2 : 1;
  return [
    ...(framed ? [body("x", board.width), body("y", board.height)] : []),
    measure("x", whole.x, whole.x + whole.width, rows),
    measure("y", whole.y, whole.y + whole.height, rows),
  ];
}

/** Room around the board that a frame and the dimensions need, in mm of the sign: rows, and lettering that stands beside a short step. */
export function dimensionMargins(input: DimensionInput): { left: number; top: number; right: number; bottom: number } {
  const { paperScale } = input;
  const rows = (axis: "x" | "y") => new Set(rowsOf(input, axis).map(({ at }) => at)).size;
  const below = rowsOf(input, "x");
  const right = rowsOf(input, "y");
  /** The longest lettering that may stand outside the board's edges, on one axis and side. */
  const beside = (dimensions: readonly Dimension[], side: Dimension["overflow"]) =>
    dimensions
      .filter((dimension) => dimension.overflow === side && !dimensionFits(dimension, paperScale))
      .reduce((most, { text }) => Math.max(most, textWidthMm(text, "serif", smallTextMm) + 7), 0);
  const under = (dimensions: readonly Dimension[]) =>
    dimensions.some((dimension) => dimension.overflow === "under" && !dimensionFits(dimension, paperScale)) ? 3.2 : 0;
  const { x, y, width, height } = signBox(input.document);
  const { board, frame } = input.document;
  const first = dimensionRowMm * (frame !== null && width > board.width ? 2 : 1) + 5;
  const past = 2.5;
  return {
    left: Math.max(first, beside(below, "before")) * paperScale - x,
    top: Math.max(first, beside(right, "before")) * paperScale - y,
    right:
      Math.max(dimensionRowMm * rows("y") + past + under(right), beside(below, "after")) * paperScale +
      (x + width - board.width),
    bottom:
      Math.max(dimensionRowMm * rows("x") + past + under(below), beside(right, "after")) * paperScale +
      (y + height - board.height),
  };
}

/** Overall width above and height at the left; holes and the placing of the chief layers below and at the right. */
export function drawElevationDimensions(input: DimensionInput & { readonly ground: Colour }): Item[] {
  const { paperScale, ground } = input;
  const views = [
    { id: "dimension:overall", dimensions: overallDimensions(input) },
    { id: "dimension:across", dimensions: rowsOf(input, "x") },
    { id: "dimension:down", dimensions: rowsOf(input, "y") },
  ];
  return views.map(({ id, dimensions }) => drawDimensions(dimensions, { id, paperScale, ground }));
}
