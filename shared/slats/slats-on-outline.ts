import { regionAreaMm2, regionPerimeterMm } from "../geometry/area.ts";
import { boxOfRegion } from "../geometry/box.ts";
import { connectedPieces } from "../geometry/connected.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { Polygon, Region } from "../geometry/path.ts";
import { outlineSlat } from "./outline-slat.ts";
import { alongSlats, fromSlats, type Side, stripEdges } from "./sides.ts";
import type { Slat, SlatDesign } from "./slat-layout.ts";

/** Farther than any board reaches, and well within the kernel's grid. */
const farMm = 100_000;
/** Parts of a slat that overlap along it by more than rounding are cut as one. */
const overlapMm = 0.01;
/** A part whose area is less than its edge times the kernel's grid is rounding. */
const gridMm = 0.001;

/** A part of a strip, and how far it runs along it. */
type Part = { readonly region: Region; readonly start: number; readonly end: number; readonly width: number };

/** Parts that come out of one slat. */
type Group = Omit<Part, "region"> & { readonly parts: readonly Part[] };

/**
 * The slats of one side of a board of any outline, by clipping: each strip is one slat, or several where the board and its
 * overhang leave parts of it apart. `laid` is the body grown by the overhang.
 */
export function slatsOnOutline(
  side: Side,
  design: SlatDesign,
  body: Region,
  laid: Region,
  kernel: Kernel,
): Omit<Slat, "order">[] {
  const laidParts = partsByStrip(laid, side, design, kernel);
  const trimmedParts = partsByStrip(body, side, design, kernel);
  return [...laidParts.keys()]
    .toSorted((a, b) => a - b)
    .flatMap((strip) => {
      const trimmed = trimmedParts.get(strip) ?? [];
      return joinedAlong(laidParts.get(strip) ?? []).flatMap((group) => {
        const left = trimmed.filter((part) => part.start < group.end && part.end > group.start);
        const region = left.flatMap((part) => part.region);
        if (region.length === 0) return [];
        return [outlineSlat({ strip, laid: group.parts.map((part) => part.region), trimmed: region }, side, design)];
      });
    });
}

/** Length and width of each slat after trimming, without the slats themselves: what a start is chosen by. */
export function trimmedSizes(
  side: Side,
  design: SlatDesign,
  body: Region,
  kernel: Kernel,
): { readonly length: number; readonly width: number }[] {
  return [...partsByStrip(body, side, design, kernel).values()].flatMap((parts) =>
    joinedAlong(parts).map(({ start, end, width }) => ({ length: end - start, width })),
  );
}

/** The parts of a region in each strip of a side, by strip. */
function partsByStrip(region: Region, side: Side, design: SlatDesign, kernel: Kernel): Map<number, Part[]> {
  const inSide = side.name === "whole" ? region : kernel.intersect(region, [sideRectangle(side)]);
  const box = boxOfRegion([inSide.flat().map((point) => alongSlats(side.fromBoard(point), design.angle))]);
  if (!box) return new Map();
  const pitch = design.slatWidth + design.gap;
  const [zero] = stripEdges(0, side, design);
  const first = Math.floor((box.y - zero) / pitch);
  const last = Math.floor((box.y + box.height - zero) / pitch);
  const strips = Array.from({ length: last - first + 1 }, (_, place) => first + place);
  const polygonOf = (strip: number): Polygon => {
    const [from, to] = stripEdges(strip, side, design);
    const corners = [
      { x: box.x - 1, y: from },
      { x: box.x + box.width + 1, y: from },
      { x: box.x + box.width + 1, y: to },
      { x: box.x - 1, y: to },
    ];
    return corners.map((corner) => side.toBoard(fromSlats(corner, design.angle)));
  };
  const found = new Map<number, Part[]>();
  // Every second strip at a time: neighbours without a gap would come out as one.
  for (const odd of [false, true]) {
    const polygons = strips.filter((strip) => (strip % 2 !== 0) === odd).map(polygonOf);
    for (const piece of connectedPieces(kernel.intersect(polygons, inSide))) {
      if (regionAreaMm2(piece) < gridMm * regionPerimeterMm(piece)) continue;
      const at = boxOfRegion([piece.flat().map((point) => alongSlats(side.fromBoard(point), design.angle))]);
      if (!at) continue;
      const strip = Math.floor((at.y + at.height / 2 - zero) / pitch);
      found.set(strip, [
        ...(found.get(strip) ?? []),
        { region: piece, start: at.x, end: at.x + at.width, width: at.height },
      ]);
    }
  }
  return found;
}

/** Parts that lie beside each other along a strip, joined: they come out of one slat. From the near end on. */
function joinedAlong(parts: readonly Part[]): Group[] {
  const groups: (Group & { readonly parts: Part[] })[] = [];
  for (const part of parts.toSorted((a, b) => a.start - b.start || a.end - b.end)) {
    const last = groups.at(-1);
    const joins = last !== undefined && part.start < last.end - overlapMm;
    if (joins) groups.pop();
    groups.push({
      parts: joins ? [...last.parts, part] : [part],
      start: joins ? last.start : part.start,
      end: joins ? Math.max(last.end, part.end) : part.end,
      width: joins ? Math.max(last.width, part.width) : part.width,
    });
  }
  return groups;
}

function sideRectangle(side: Side): Polygon {
  return [
    { x: 0, y: -farMm },
    { x: farMm, y: -farMm },
    { x: farMm, y: farMm },
    { x: 0, y: farMm },
  ].map(side.toBoard);
}
