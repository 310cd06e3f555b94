import type { Frame } from "../frame/lay-out-frame.ts";
import { regionCentroid } from "../geometry/area.ts";
import { boxOfRegion } from "../geometry/box.ts";
import { regionContains } from "../geometry/contains.ts";
import type { Point, Region } from "../geometry/path.ts";
import { pathOfRegion } from "../geometry/path-of-region.ts";
import { circlePath } from "../geometry/shapes.ts";
import { regionTransform } from "../geometry/transform.ts";
import type { Brad } from "../slats/brad-map.ts";
import type { SlatLayout } from "../slats/slat-layout.ts";
import { formatLength } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { fineLineMm } from "./dimensions.ts";
import type { DisplayList, Item } from "./display-list.ts";
import { labelRoom } from "./label-room.ts";
import { graphite, ink, linen, rule, sheetWhite } from "./palette.ts";
import { lineItem, textItem } from "./text-item.ts";
import { capHeightShare, smallTextMm, textWidthMm } from "./type.ts";

type Paper = { readonly layout: SlatLayout; readonly widthMm: number; readonly heightMm: number };
type View = { readonly box: NonNullable<ReturnType<typeof boxOfRegion>>; readonly scale: number };

/** Room round the board for outlines, mm on paper. */
const edgeMm = 1;
const footMm = 7;

/**
 * The board with its slats in place, each under its number in laying order, the spine S, and the frame round it where one is
 * given. Empty when nothing is laid. A picture to look at bears only the numbers that fit in their slats.
 */
export function drawSlatPlan(
  paper: Paper & { readonly frame?: Frame | null; readonly numbers?: "every" | "fitting" },
): DisplayList | null {
  const { frame = null, numbers = "every" } = paper;
  const view = viewOf(paper, frame ? [frame.outer] : []);
  if (!view) return null;
  const { slats, spine } = paper.layout;
  const pieces = [
    ...(spine ? [{ id: "slat:spine", text: "S", region: spine.trimmed, turn: 0 }] : []),
    ...slats.map(({ order, trimmed, axis: { from, to } }) => {
      const turn = (Math.atan2(to.y - from.y, to.x - from.x) * 180) / Math.PI;
      return { id: `slat:${order}`, text: String(order), region: trimmed, turn: upright(turn) };
    }),
  ];
  return page(paper, view, 0, [
    ...pieces.flatMap(({ id, text, region, turn }) => {
      const drawn = onPaper(region, view);
      const stroke = { colour: ink, widthMm: fineLineMm };
      return [
        { kind: "path", id, path: pathOfRegion(drawn), fill: linen, stroke } as const,
        ...numberIn(drawn, text, { turn, mustFit: numbers === "fitting" }),
      ];
    }),
    ...outline(paper, view),
    ...(frame?.members ?? []).map((member): Item => {
      const stroke = { colour: ink, widthMm: fineLineMm };
      return { kind: "path", path: pathOfRegion(onPaper([member.outline], view)), fill: sheetWhite, stroke };
    }),
  ]);
}

/** Where brads go, as crosses, over the slats; the board's own measures stand below. Barrels that they avoid are circles. */
export function drawBradMap(
  paper: Paper & {
    readonly brads: readonly Brad[];
    readonly barrels: readonly (Point & { readonly diameter: number })[];
    readonly unit: LengthUnit;
  },
): DisplayList | null {
  const view = viewOf(paper);
  if (!view) return null;
  const { slats, spine } = paper.layout;
  const pieces = [...(spine ? [spine.trimmed] : []), ...slats.map(({ trimmed }) => trimmed)];
  const { box, scale } = view;
  const base = edgeMm + box.height / scale + 5;
  const words = `${formatLength(box.width, paper.unit)} × ${formatLength(box.height, paper.unit)}, at 1:${Number(scale.toFixed(1))}`;
  return page(paper, view, footMm, [
    ...pieces.map((region): Item => {
      const stroke = { colour: rule, widthMm: fineLineMm };
      return { kind: "path", path: pathOfRegion(onPaper(region, view)), fill: sheetWhite, stroke };
    }),
    ...paper.barrels.map((barrel): Item => {
      const stroke = { colour: graphite, widthMm: fineLineMm };
      return { kind: "path", path: circlePath(at(barrel, view), barrel.diameter / 2 / scale), stroke };
    }),
    ...paper.brads.flatMap((brad) => cross(at(brad, view))),
    ...outline(paper, view),
    textItem(words, { x: edgeMm, y: base }, { colour: graphite }),
  ]);
}

function viewOf({ layout, widthMm, heightMm }: Paper, round: Region = []): View | null {
  const box = boxOfRegion([...layout.body, ...round]);
  if (!box || box.width === 0 || box.height === 0) return null;
  return { box, scale: Math.max(box.width / (widthMm - 2 * edgeMm), box.height / (heightMm - 2 * edgeMm - footMm)) };
}

const page = ({ widthMm }: Paper, { box, scale }: View, foot: number, items: readonly Item[]): DisplayList => ({
  widthMm,
  heightMm: box.height / scale + 2 * edgeMm + foot,
  items,
});

const at = ({ x, y }: Point, { box, scale }: View): Point => ({
  x: edgeMm + (x - box.x) / scale,
  y: edgeMm + (y - box.y) / scale,
});

const onPaper = (region: Region, { box, scale }: View): Region =>
  regionTransform(region, {
    a: 1 / scale,
    b: 0,
    c: 0,
    d: 1 / scale,
    e: edgeMm - box.x / scale,
    f: edgeMm - box.y / scale,
  });

function outline({ layout }: Paper, view: View): Item[] {
  const stroke = { colour: ink, widthMm: 2 * fineLineMm };
  return [{ kind: "path", path: pathOfRegion(onPaper(layout.body, view)), stroke }];
}

/** Level in the roomiest place of the slat; where it is too narrow for that, along it about its middle. */
function numberIn(region: Region, text: string, { turn, mustFit }: { turn: number; mustFit: boolean }): Item[] {
  const font = "sans-semibold";
  const capMm = smallTextMm * capHeightShare;
  const widthMm = textWidthMm(text, font, smallTextMm);
  const place = labelRoom(region, widthMm + 0.4, capMm + 0.4);
  if (place) return [textItem(text, { x: place.x, y: place.y + capMm / 2 }, { font, align: "middle" })];
  const middle = regionCentroid(region);
  if (!middle) return [];
  const angle = (turn * Math.PI) / 180;
  if (mustFit && !holdsLabel(region, middle, { widthMm, capMm, angle })) return [];
  const at = { x: middle.x - (Math.sin(angle) * capMm) / 2, y: middle.y + (Math.cos(angle) * capMm) / 2 };
  return [{ kind: "text", text, at, sizeMm: smallTextMm, font, colour: ink, align: "middle", turn }];
}

/** Whether a line of text about that point, turned by radians, lies within a region. */
function holdsLabel(
  region: Region,
  { x, y }: Point,
  { widthMm, capMm, angle }: { widthMm: number; capMm: number; angle: number },
): boolean {
  const [along, across] = [widthMm / 2, capMm / 2];
  return [-1, 1].every((side) =>
    [-1, 0, 1].every((end) =>
      regionContains(region, {
        x: x + end * along * Math.cos(angle) - side * across * Math.sin(angle),
        y: y + end * along * Math.sin(angle) + side * across * Math.cos(angle),
      }),
    ),
  );
}

/** A turn in degrees that lettering is read at from below or from the right. */
const upright = (turn: number): number => (turn > 90 ? turn - 180 : turn <= -90 ? turn + 180 : turn);

const crossMm = 0.9;
function cross({ x, y }: Point): Item[] {
  return [
    lineItem({ x: x - crossMm, y: y - crossMm }, { x: x + crossMm, y: y + crossMm }, fineLineMm),
    lineItem({ x: x - crossMm, y: y + crossMm }, { x: x + crossMm, y: y - crossMm }, fineLineMm),
  ];
}
