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
  const x = (mm: number) => at.x + mm / scale;
  const whole = rectanglePath({ x: at.x, y: at.y, width: bar.lengthMm / scale, height: heightMm });
  const last = bar.places.at(-1);
  const end = last ? last.toMm + last.kerfMm : bar.squaringMm;
  const left = formatLength(bar.leftMm, unit);
  const fitsLeft = textWidthMm(left, "serif", smallTextMm) + 1.6 <= bar.leftMm / scale;
  const leftText = textItem(
    left,
    { x: (x(Math.min(end, bar.lengthMm)) + x(bar.lengthMm)) / 2, y: textBase(strip) },
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

/** Corners of a part on paper, clockwise from its upper left; a part shorter than its mitres comes to a point. */
export function partCorners({ parts, widthMm, scale, at, heightMm }: BarStrip, place: PlacedPart): Point[] {
  const { start = squareEnd, end = squareEnd } = parts.get(place.partId) ?? {};
  const from = edgesOf(start, place.fromMm, cutRun(start, widthMm));
  const to = edgesOf(end, place.toMm, -cutRun(end, widthMm));
  const corner = (mm: number, y: number) => ({ x: at.x + mm / scale, y });
  const upper = at.y;
  const lower = at.y + heightMm;
  if (from.upper >= to.upper || from.lower >= to.lower) {
    const isUp = from.upper < to.upper;
    const [left, right] = isUp ? [from.upper, to.upper] : [from.lower, to.lower];
    const edge = isUp ? upper : lower;
    return [corner(left, edge), corner(right, edge), corner((left + right) / 2, isUp ? lower : upper)];
  }
  return [corner(from.upper, upper), corner(to.upper, upper), corner(to.lower, lower), corner(from.lower, lower)];
}

function partItems(strip: BarStrip, place: PlacedPart): Item[] {
  const corners = partCorners(strip, place);
  const outline: Item = {
    kind: "path",
    id: `part:${place.partId}`,
    path: [polygonRing(corners)],
    fill: linen,
    stroke: { colour: ink, widthMm: fineLineMm },
  };
  const room = roomForText(corners);
  if (textWidthMm(place.label, "sans-semibold", smallTextMm) + 1 > room.width) return [outline];
  const style = { font: "sans-semibold", align: "middle" } as const;
  return [outline, textItem(place.label, { x: room.middle, y: textBase(strip) }, style)];
}

/** The way of the blade behind a part. */
function kerf(strip: BarStrip, place: PlacedPart): Item[] {
  const { end = squareEnd } = strip.parts.get(place.partId) ?? {};
  const { upper, lower } = edgesOf(end, place.toMm, -cutRun(end, strip.widthMm));
  const corner = (mm: number, y: number) => ({ x: strip.at.x + mm / strip.scale, y });
  const top = strip.at.y;
  const bottom = top + strip.heightMm;
  if (place.kerfMm <= 0) return [];
  const way = [
    corner(upper, top),
    corner(upper + place.kerfMm, top),
    corner(lower + place.kerfMm, bottom),
    corner(lower, bottom),
  ];
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

/** Where a cut meets both edges: its long point at `mm`, the other `run` off. */
function edgesOf({ longPoint }: BarEnd, mm: number, run: number): { upper: number; lower: number } {
  return longPoint === "upper" ? { upper: mm, lower: mm + run } : { upper: mm + run, lower: mm };
}

/** Width at half height, where a label stands. */
function roomForText(corners: readonly Point[]): { width: number; middle: number } {
  const [a, b, c, d] = corners;
  if (!a || !b || !c || !d) return { width: 0, middle: 0 };
  const [left, right] = [(a.x + d.x) / 2, (b.x + c.x) / 2];
  return { width: right - left, middle: (left + right) / 2 };
}

const textBase = ({ at, heightMm }: BarStrip): number => at.y + heightMm / 2 + (smallTextMm * capHeightShare) / 2;
