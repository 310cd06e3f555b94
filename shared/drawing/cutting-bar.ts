import type { Point } from "../geometry/path.ts";
import { polygonRing, rectanglePath } from "../geometry/shapes.ts";
import { type BarEnd, type BarPart, squareEnd } from "../stock-lengths/cutting-job.ts";
import type { CutBar, PlacedPart } from "../stock-lengths/lay-bars.ts";
import { formatLength } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { fineLineMm } from "./dimensions.ts";
import type { Item } from "./display-list.ts";
import { graphite, ink, linen, rule, sheetWhite } from "./palette.ts";
import { textItem } from "./text-item.ts";
import { capHeightShare, smallTextMm, textWidthMm } from "./type.ts";

export type BarStrip = {
  readonly bar: CutBar;
  readonly parts: ReadonlyMap<string, BarPart>;
  /** Width of the bar itself, mm. */
  readonly widthMm: number;
  /** Millimetres of bar that make one on paper. */
  readonly scale: number;
  /** Upper left corner and height of the strip on paper. */
  readonly at: Point;
  readonly heightMm: number;
  readonly unit: LengthUnit;
};

/**
 * One bar as a strip: what squares its end toned, what is left white, the parts with their mitres and labels, the kerfs dark
 * between them. Lengths are to scale; where the strip is drawn wider than the bar is, mitres keep their length along it.
 */
export function drawBarStrip(strip: BarStrip): Item[] {
  const { bar, at, heightMm, scale, unit } = strip;
  const whole = rectanglePath({ x: at.x, y: at.y, width: bar.lengthMm / scale, height: heightMm });
  const last = bar.places.at(-1);
  const end = last ? last.toMm + last.kerfMm : bar.squaringMm;
  const left = formatLength(bar.leftMm, unit);
  const fitsLeft = textWidthMm(left, "serif", smallTextMm) + 1.6 <= bar.leftMm / scale;
  const leftText = textItem(
    left,
    { x: xOf(strip, (Math.min(end, bar.lengthMm) + bar.lengthMm) / 2), y: textBase(strip) },
    {
      font: "serif",
      colour: graphite,
      align: "middle",
    },
  );
  return [
    { kind: "path", path: whole, fill: sheetWhite },
    {
      kind: "clip",
      clip: whole,
      items: [...squaredOff(strip), ...bar.places.flatMap((place) => kerf(strip, place))],
    },
    ...bar.places.flatMap((place) => partItems(strip, place)),
    { kind: "path", path: whole, stroke: { colour: graphite, widthMm: fineLineMm } },
    ...(fitsLeft ? [leftText] : []),
  ];
}

/** Corners of a part on paper, clockwise from its lower left; a part shorter than its mitres comes to a point. */
export function partCorners(strip: BarStrip, place: PlacedPart): Point[] {
  const { start = squareEnd, end = squareEnd } = strip.parts.get(place.partId) ?? {};
  const from = profileOf(start, place.fromMm, cutRun(start, strip.widthMm));
  const to = profileOf(end, place.toMm, -cutRun(end, strip.widthMm));
  if (from.upper < to.upper && from.lower < to.lower) {
    return [...pointsOf(strip, from), ...pointsOf(strip, to).reverse()];
  }
  const isUp = from.upper < to.upper;
  const [left, right] = isUp ? [from.upper, to.upper] : [from.lower, to.lower];
  const { upper, lower } = edgeHeights(strip);
  const edge = isUp ? upper : lower;
  const tip = isUp ? lower : upper;
  return [
    { x: xOf(strip, Math.min(left, right)), y: edge },
    { x: xOf(strip, Math.max(left, right)), y: edge },
    { x: xOf(strip, (left + right) / 2), y: tip },
  ];
}

function partItems(strip: BarStrip, place: PlacedPart): Item[] {
  const outline: Item = {
    kind: "path",
    id: `part:${place.partId}`,
    path: [polygonRing(partCorners(strip, place))],
    fill: linen,
    stroke: { colour: ink, widthMm: fineLineMm },
  };
  const { start = squareEnd, end = squareEnd } = strip.parts.get(place.partId) ?? {};
  // A label stands at half height.
  const left = xOf(strip, profileOf(start, place.fromMm, cutRun(start, strip.widthMm)).middle);
  const right = xOf(strip, profileOf(end, place.toMm, -cutRun(end, strip.widthMm)).middle);
  if (textWidthMm(place.label, "sans-semibold", smallTextMm) + 1 > right - left) return [outline];
  const style = { font: "sans-semibold", align: "middle" } as const;
  return [outline, textItem(place.label, { x: (left + right) / 2, y: textBase(strip) }, style)];
}

/** The way of the blade behind a part. */
function kerf(strip: BarStrip, place: PlacedPart): Item[] {
  if (place.kerfMm <= 0) return [];
  const { end = squareEnd } = strip.parts.get(place.partId) ?? {};
  const cut = profileOf(end, place.toMm, -cutRun(end, strip.widthMm));
  const behind = {
    upper: cut.upper + place.kerfMm,
    middle: cut.middle + place.kerfMm,
    lower: cut.lower + place.kerfMm,
    isTip: cut.isTip,
  };
  const way = [...pointsOf(strip, cut), ...pointsOf(strip, behind).reverse()];
  return [{ kind: "path", path: [polygonRing(way)], fill: graphite }];
}

/** What squaring the end takes off, as ground. */
function squaredOff({ bar, at, heightMm, scale }: BarStrip): Item[] {
  const width = bar.squaringMm / scale;
  if (width <= 0) return [];
  return [{ kind: "path", path: rectanglePath({ x: at.x, y: at.y, width, height: heightMm }), fill: rule }];
}

const cutRun = ({ angle }: BarEnd, widthMm: number): number =>
  angle === 90 ? 0 : widthMm / Math.tan((angle * Math.PI) / 180);

/** Where a cut crosses the bar, in mm along it. */
type Profile = {
  readonly upper: number;
  readonly middle: number;
  readonly lower: number;
  /** Whether it has a corner in the middle. */
  readonly isTip: boolean;
};

/** A cut with its long point at `mm`, which falls back by `run` over the bar's width. Two cuts that meet are drawn alike. */
function profileOf({ longPoint }: BarEnd, mm: number, run: number): Profile {
  if (longPoint === "middle") return { upper: mm + run / 2, middle: mm, lower: mm + run / 2, isTip: true };
  const [upper, lower] = longPoint === "upper" ? [mm, mm + run] : [mm + run, mm];
  return { upper, middle: mm + run / 2, lower, isTip: false };
}

/** A cut on paper, from the lower edge to the upper one. */
function pointsOf(strip: BarStrip, { upper, middle, lower, isTip }: Profile): Point[] {
  const heights = edgeHeights(strip);
  const tip = { x: xOf(strip, middle), y: (heights.upper + heights.lower) / 2 };
  return [
    { x: xOf(strip, lower), y: heights.lower },
    ...(isTip ? [tip] : []),
    { x: xOf(strip, upper), y: heights.upper },
  ];
}

const xOf = ({ at, scale }: BarStrip, mm: number): number => at.x + mm / scale;
const edgeHeights = ({ at, heightMm }: BarStrip) => ({ upper: at.y, lower: at.y + heightMm });

const textBase = ({ at, heightMm }: BarStrip): number => at.y + heightMm / 2 + (smallTextMm * capHeightShare) / 2;
