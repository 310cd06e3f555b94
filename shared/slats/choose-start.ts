import type { Kernel } from "../geometry/kernel.ts";
import { isShorter } from "../geometry/tolerance.ts";
import type { Outcome } from "../units/outcome.ts";
import { checkedSlats, roughCount } from "./check-slats.ts";
import { pitchMm, slopeOf, stripLengthMm, stripsOfHalf } from "./half-board.ts";
import { bodyOf } from "./lay-out-slats.ts";
import { sidesOf, startHeightMm } from "./sides.ts";
import type { SlatBoard, SlatDesign } from "./slat-layout.ts";
import { trimmedSizes } from "./slats-on-outline.ts";

/** What a start leaves after trimming. */
export type StartMeasure = {
  readonly height: number;
  /** Of the shortest slat from long point to long point, and of the narrowest across its grain; 0 when nothing is left. */
  readonly shortestMm: number;
  readonly narrowestMm: number;
  /** Slats shorter than one slat is wide. */
  readonly slivers: number;
};

export type StartChoice = {
  /** The start as it is. */
  readonly current: StartMeasure;
  /** The best there is. It leaves no sliver, unless no start does. */
  readonly best: StartMeasure;
  readonly isSliverFree: boolean;
};

/** A hand lays a slat so exactly, mm: a start must hold that far either way. Our choice. */
const layingErrorMm = 0.5;
/** Starts that are tried besides the exact ones, evenly over one pitch; fewer where an outline has many points or slats. */
const triesOnRectangle = 60;
const triesOnOutline = 24;
const pointsForAllTries = 2_000;
/** Slats times starts on an outline: each start is clipped three times over. */
const mostSlatTries = 1_000;

/**
 * The start that leaves the longest shortest slat, and of those that leave no sliver the one with the widest narrow slat. It
 * is the same on both sides of a spine, so that slats meet there, is rounded to 0.1 mm and stays what it is when the first
 * slat is laid 0.5 mm off. On a rectangle the starts tried are those where a corner's slat changes to the next, and where the
 * corners' slats are equally long (their lengths grow and shrink in proportion to the start); on other outlines an even choice.
 */
export function chooseStart(board: SlatBoard, design: SlatDesign, kernel: Kernel): Outcome<StartChoice> {
  return checkedSlats(board, design, () => {
    const measure = measureOf(board, design, kernel);
    const exact = board.outline ? [] : exactStarts(board, design);
    const tries = triesOn(board, design);
    const pitch = pitchMm(design);
    const even = Array.from({ length: tries }, (_, index) => (index * pitch) / tries);
    const heights = [...exact, ...even].map((height) => tenths(height - pitch * Math.floor(height / pitch)));
    const rated = [...new Set(heights)]
      .toSorted((a, b) => a - b)
      .map((height) => rate(height, design.slatWidth, measure));
    const best = rated.reduce((one, other) => (isBetter(other, one) ? other : one));
    return {
      current: measure(startHeightMm(board, design)),
      best: best.measure,
      isSliverFree: best.measure.slivers === 0 && best.length === design.slatWidth,
    };
  });
}

function triesOn(board: SlatBoard, design: SlatDesign): number {
  if (!board.outline) return triesOnRectangle;
  const points = board.outline.reduce((count, ring) => count + ring.length, 0);
  const byPoints = Math.floor((triesOnOutline * pointsForAllTries) / points);
  const bySlats = Math.floor(mostSlatTries / roughCount(board, design));
  return Math.max(4, Math.min(triesOnOutline, byPoints, bySlats));
}

type Rated = { readonly measure: StartMeasure; readonly length: number; readonly width: number };

/** A start by the worst it may become within the laying error; lengths over a slat's width are all the same. */
function rate(height: number, slatWidth: number, measure: (height: number) => StartMeasure): Rated {
  const around = [height - layingErrorMm, height, height + layingErrorMm].map(measure);
  const length = Math.min(slatWidth, ...around.map(({ shortestMm }) => shortestMm));
  return {
    measure: around[1] ?? measure(height),
    length: isShorter(length, slatWidth) ? length : slatWidth,
    width: Math.min(...around.map(({ narrowestMm }) => narrowestMm)),
  };
}

function isBetter(one: Rated, other: Rated): boolean {
  if (isShorter(other.length, one.length)) return true;
  return !isShorter(one.length, other.length) && isShorter(other.width, one.width);
}

function measureOf(board: SlatBoard, design: SlatDesign, kernel: Kernel): (height: number) => StartMeasure {
  const body = board.outline ? bodyOf(board, kernel) : [];
  return (height) => {
    const started: SlatDesign = { ...design, start: { kind: "height", height } };
    const sizes = sidesOf(board, started).flatMap((side) =>
      board.outline
        ? trimmedSizes(side, started, body, kernel)
        : stripsOfHalf({ ...design, reach: side.reach, height: side.height, phase: side.phase }).map((strip) => ({
            length: stripLengthMm(strip),
            width: (strip.to - strip.from) * slopeOf(design.angle).sin,
          })),
    );
    return {
      height,
      shortestMm: sizes.length === 0 ? 0 : Math.min(...sizes.map(({ length }) => length)),
      narrowestMm: sizes.length === 0 ? 0 : Math.min(...sizes.map(({ width }) => width)),
      slivers: sizes.filter(({ length }) => isShorter(length, design.slatWidth)).length,
    };
  };
}

/**
 * In the corner farthest from the spine the last slat is t/cos long, t its height there, and so is the one in the corner at the
 * spine's end: starts just aside of where either
 * begins anew, and where both are equally long.
 */
function exactStarts(board: SlatBoard, design: SlatDesign): number[] {
  const { sin, cot } = slopeOf(design.angle);
  const face = design.slatWidth / sin;
  const pitch = pitchMm(design);
  const aside = layingErrorMm + 0.1;
  return sidesOf(board, design).flatMap(({ reach, height }) => {
    const lowest = -reach * cot - face;
    const equal = (height + lowest) / 2;
    return [lowest - aside, lowest + aside, height - aside, height + aside, equal, equal + pitch / 2];
  });
}

const tenths = (mm: number): number => Math.round(mm * 10) / 10;
