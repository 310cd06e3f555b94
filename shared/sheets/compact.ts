import { boxOfRegion } from "../geometry/box.ts";
import type { Point } from "../geometry/path.ts";
import type { LaidShape } from "./cut-shape.ts";
import type { LaidCopy, OpenField } from "./filler.ts";
import { type Slider, slideDistance, sliderOf } from "./slide.ts";

/** Rounds of sliding every piece both ways; what a further one gains is less than the cells were coarse. */
const rounds = 4;
/** More copies than this on a field are left where they are: the work grows with their square. */
const mostCopies = 400;

/**
 * Slides the pieces of one field together, first against the filling direction, then across, until they touch: takes
 * back what laying them on whole cells cost. Nothing ever moves out of the sheet or through another piece.
 */
export function compactField(copies: readonly LaidCopy[], { field }: OpenField): readonly LaidCopy[] {
  if (copies.length > mostCopies) return copies;
  const sliders = new Map<LaidShape, Slider>();
  const sliderFor = (laid: LaidShape): Slider => {
    const known = sliders.get(laid) ?? sliderOf(laid.grown);
    sliders.set(laid, known);
    return known;
  };
  // Walls look into the sheet: what is allowed, run the other way round, is an obstacle.
  const walls = field.allowed ? inverted(sliderOf(field.allowed)) : null;
  const bodies = copies.map((copy) => ({ copy, slider: sliderFor(copy.laid), at: offsetOf(copy) }));
  const axes = field.along === "x" ? (["x", "y"] as const) : (["y", "x"] as const);
  for (let round = 0; round < rounds; round++) {
    for (const axis of axes) {
      const order = bodies.toSorted((a, b) => a.at[axis] + a.slider.box[axis] - b.at[axis] - b.slider.box[axis]);
      for (const body of order) {
        let free = body.at[axis] + body.copy.laid.box[axis] - field.inner[axis];
        if (walls) free = slideDistance(axis, body.slider, body.at, walls, origin, free);
        for (const other of bodies) {
          if (free <= leastSlideMm) break;
          if (other !== body) free = slideDistance(axis, body.slider, body.at, other.slider, other.at, free);
        }
        if (free > leastSlideMm) body.at = { ...body.at, [axis]: body.at[axis] - free };
      }
    }
  }
  return bodies.map(({ copy, at }) => ({ ...copy, x: at.x + copy.laid.box.x, y: at.y + copy.laid.box.y }));
}

const origin: Point = { x: 0, y: 0 };
/** Shorter ways are not gone, mm. */
const leastSlideMm = 0.001;

/** From the piece's own turned plane to the sheet. */
const offsetOf = ({ laid, x, y }: LaidCopy): Point => ({ x: x - laid.box.x, y: y - laid.box.y });

function inverted({ box, left, right, top, bottom }: Slider): Slider {
  return { box, left: right, right: left, top: bottom, bottom: top };
}

/** The end of what lies on a field along its filling direction, from the sheet's beginning, mm. */
export function endOf(copies: readonly LaidCopy[], { field: { along, box } }: OpenField): number {
  return copies.reduce(
    (most, { laid, x, y }) => Math.max(most, along === "x" ? x + laid.box.width - box.x : y + laid.box.height - box.y),
    0,
  );
}

/** Around what lies on a field; null for nothing. */
export function boxOfCopies(copies: readonly LaidCopy[]) {
  return boxOfRegion(
    copies.map(({ laid, x, y }) => [
      { x, y },
      { x: x + laid.box.width, y: y + laid.box.height },
    ]),
  );
}
