import type { Point } from "../geometry/path.ts";
import { polygonRing } from "../geometry/shapes.ts";
import type { Colour, Item } from "./display-list.ts";
import { graphite, ink } from "./palette.ts";
import { capHeightShare, smallTextMm, textWidthMm } from "./type.ts";

/** Millimetres of the drawn plane that make one on paper: 5 at a scale of 1:5. Everything lettered or ruled is sized by it. */
export type PaperScale = number;

/** Line widths on paper in mm (ISO 128 pairs a wide line with one half as wide). */
export const outlineMm = 0.5;
export const fineLineMm = 0.25;

/** Room on paper between rows of dimensions, and from the thing to the first row. */
export const dimensionRowMm = 8;

const arrowMm = 2.6;
const arrowHalfMm = 0.65;
/** Extension lines start this far from the thing and run this far past the dimension line. */
const extensionGapMm = 1.2;
const extensionPastMm = 1.6;
const textGapMm = 1.1;
const dimensionFont = "serif";

export type Dimension = {
  /** "x" measures from left to right with the line above or below, "y" downwards with the line left or right. */
  readonly axis: "x" | "y";
  readonly from: number;
  readonly to: number;
  /** Where the dimension line lies on the other axis. */
  readonly at: number;
  /** Where the extension lines start on the other axis; the thing's edge or a hole's centre. */
  readonly thing: number;
  readonly text: string;
  /** Where the lettering goes when it does not fit between the arrows: before `from`, after `to`, or on the line's other side. */
  readonly overflow: "before" | "after" | "under";
};

/** Whether the lettering and both arrows have room between the extension lines. */
export function dimensionFits(
  { from, to, text }: Pick<Dimension, "from" | "to" | "text">,
  paperScale: PaperScale,
): boolean {
  return Math.abs(to - from) >= (textWidthMm(text, dimensionFont, smallTextMm) + 1.6) * paperScale;
}

type DrawnDimension = { readonly lines: readonly Item[]; readonly lettering: readonly Item[] };

/** One dimension with its extension lines, arrows and lettering (ISO 129-1: read from below and from the right, above the line). */
function layDimension(dimension: Dimension, paperScale: PaperScale, ground: Colour): DrawnDimension {
  const { axis, from, to, at: across, thing, text, overflow } = dimension;
  const mm = (paper: number) => paper * paperScale;
  const place = (along: number, across: number): Point =>
    axis === "x" ? { x: along, y: across } : { x: across, y: along };
  const stroke = { colour: graphite, widthMm: mm(fineLineMm) };
  const line = (...points: Point[]): Item => ({ kind: "line", points, stroke });
  const away = Math.sign(across - thing) || 1;
  const extensions = [from, to].map((along) =>
    line(place(along, thing + away * mm(extensionGapMm)), place(along, across + away * mm(extensionPastMm))),
  );
  const fits = dimensionFits(dimension, paperScale);
  const roomForArrows = Math.abs(to - from) >= mm(2 * arrowMm + 0.6);
  const arrow = (tip: number, direction: number) =>
    line(
      place(tip - direction * mm(arrowMm), across - mm(arrowHalfMm)),
      place(tip, across),
      place(tip - direction * mm(arrowMm), across + mm(arrowHalfMm)),
    );
  const arrows = roomForArrows ? [arrow(from, -1), arrow(to, 1)] : [arrow(from, 1), arrow(to, -1)];
  const tail = roomForArrows ? 0 : mm(arrowMm + 1);
  const lettering = textWidthMm(text, dimensionFont, smallTextMm) * paperScale;
  const middle = (from + to) / 2;
  const beside = tail + mm(roomForArrows ? 1.4 : 0.8) + lettering / 2;
  const outside = { before: from - beside, after: to + beside, under: middle };
  const along = fits ? middle : outside[overflow];
  // Text outside the arrows stands on a line drawn out to it, so that it is seen to belong.
  const reach = fits || overflow === "under" ? tail : tail + mm(0.8) + lettering + mm(0.6);
  const ends = {
    before: [from - reach, to + tail],
    after: [from - tail, to + reach],
    under: [from - tail, to + tail],
  }[overflow];
  const under = !fits && overflow === "under";
  const lift = under ? mm(textGapMm + smallTextMm * capHeightShare) : -mm(textGapMm);
  const at = place(along, across + lift);
  const half = lettering / 2 + mm(0.5);
  const [upper, lower] = [lift - mm(smallTextMm * capHeightShare + 0.25), lift + mm(0.25)];
  return {
    lines: [...extensions, line(place(ends[0] ?? from, across), place(ends[1] ?? to, across)), ...arrows],
    lettering: [
      {
        kind: "path",
        path: [
          polygonRing([
            place(along - half, across + upper),
            place(along + half, across + upper),
            place(along + half, across + lower),
            place(along - half, across + lower),
          ]),
        ],
        fill: ground,
      },
      {
        kind: "text",
        text,
        at,
        sizeMm: mm(smallTextMm),
        font: dimensionFont,
        colour: ink,
        align: "middle",
        ...(axis === "y" ? { turn: -90 } : {}),
      },
    ],
  };
}

/**
 * Dimensions of one view in a group that carries `id`. Where a line of one would run through the lettering of another, the line is
 * broken: `ground` is the colour of the paper or wall behind.
 */
export function drawDimensions(
  dimensions: readonly Dimension[],
  { id, paperScale, ground }: { readonly id: string; readonly paperScale: PaperScale; readonly ground: Colour },
): Item {
  const laid = dimensions.map((dimension) => layDimension(dimension, paperScale, ground));
  const items = [...laid.flatMap(({ lines }) => lines), ...laid.flatMap(({ lettering }) => lettering)];
  return { kind: "group", id, x: 0, y: 0, scale: 1, items };
}
