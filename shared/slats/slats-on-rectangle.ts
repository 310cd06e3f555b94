import type { Polygon } from "../geometry/path.ts";
import { lengthToleranceMm } from "../geometry/tolerance.ts";
import { clipConvexToBox } from "./clip-convex.ts";
import { type HalfBoard, slopeOf, stripEnds, stripLengthMm, stripsOfHalf } from "./half-board.ts";
import { fromSlats, type Side, stripEdges } from "./sides.ts";
import type { Slat, SlatCut, SlatDesign } from "./slat-layout.ts";

/** The slats of one side of a rectangular board, in closed form, first strip first. Slats that the trimming would take whole are left out. */
export function slatsOnRectangle(side: Side, design: SlatDesign): Omit<Slat, "order">[] {
  const { cot, sin } = slopeOf(design.angle);
  const { nearOverhang, overhang, reach, height, phase } = side;
  const common = { angle: design.angle, slatWidth: design.slatWidth, gap: design.gap };
  // Laid slats are measured from the corner of the board with its overhang, trimmed ones from the board's own.
  const shift = overhang - nearOverhang * cot;
  const laid: HalfBoard = {
    ...common,
    reach: reach + nearOverhang + overhang,
    height: height + 2 * overhang,
    phase: phase + shift,
  };
  const trimmedStrips = new Map(
    stripsOfHalf({ ...common, reach, height, phase }).map((strip) => [strip.index, strip] as const),
  );
  return stripsOfHalf(laid).flatMap((strip) => {
    const left = trimmedStrips.get(strip.index);
    if (!left) return [];
    const { from, to } = { from: strip.from - shift, to: strip.to - shift };
    const untrimmed = clipConvexToBox(slatBetween(from, to, side, design.angle), {
      x: -nearOverhang,
      y: -overhang,
      width: laid.reach,
      height: laid.height,
    });
    const trimmed = clipConvexToBox(untrimmed, { x: 0, y: 0, width: reach, height });
    const [lower, upper] = stripEdges(strip.index, side, design);
    const middle = (u: number) => side.toBoard(fromSlats({ x: u - along, y: (lower + upper) / 2 }, design.angle));
    const along = alongShift(side, design.angle);
    const ends = stripEnds(strip, laid);
    const cut = (end: "foot" | "spine" | "outer" | "head"): SlatCut => ({
      edge: side.edges[end],
      setting: end === "spine" || end === "outer" ? 90 - design.angle : design.angle,
      mustFit: overhang === 0 || side.edges[end] === "spine",
    });
    return [
      {
        strip: strip.index,
        side: side.name,
        untrimmed: untrimmed.map(side.toBoard),
        trimmed: [trimmed.map(side.toBoard)],
        isTrimmed: overhang > lengthToleranceMm && [...ends.near, ...ends.far].some((end) => !cut(end).mustFit),
        axis: { from: middle(strip.near), to: middle(strip.far) },
        longPoint: stripLengthMm(strip),
        shortPoint: Math.min(strip.fromEdge, strip.toEdge),
        trimmedLongPoint: stripLengthMm(left),
        trimmedWidth: (left.to - left.from) * sin,
        near: ends.near.map(cut),
        far: ends.far.map(cut),
      },
    ];
  });
}

/** How far along the slats the board's own corner lies from that of the board with its overhang. */
function alongShift({ nearOverhang, overhang }: Side, angle: number): number {
  const { sin, cos } = slopeOf(angle);
  return nearOverhang * sin + overhang * cos;
}

/** A slat between two edges, longer than the side it crosses, in the side's own axes. */
function slatBetween(from: number, to: number, { reach, nearOverhang, overhang }: Side, angle: number): Polygon {
  const { cot } = slopeOf(angle);
  const [start, end] = [-nearOverhang - 1, reach + overhang + 1];
  return [
    { x: start, y: start * cot + from },
    { x: end, y: end * cot + from },
    { x: end, y: end * cot + to },
    { x: start, y: start * cot + to },
  ];
}
