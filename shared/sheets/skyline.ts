/** A rectangle as it may lie in a bin: its size along the filling direction and across it. */
export type RectangleWay = { readonly long: number; readonly wide: number; readonly way: number };

/** Room in a bin. */
export type RectangleRoom = { readonly long: number; readonly wide: number };

export type LaidRectangle = {
  /** Index into the list of rectangles. */
  readonly rectangle: number;
  readonly way: RectangleWay;
  /** Of the corner where it begins, along and across. */
  readonly u: number;
  readonly v: number;
};

/** Differences below this are rounding, mm. */
export const hairMm = 1e-7;

type Step = { v: number; wide: number; u: number };

/**
 * Fills one room with rectangles: at the lowest step of what is laid so far it puts the rectangle that fits the step
 * best, of equal ones the first in `order`; where none fits the step is raised to its lower neighbour (skyline with
 * scored best fit: S. C. H. Leung, D. Zhang, K. M. Sim, European Journal of Operational Research 215, 2011).
 * `kinds` tells rectangles of the same size and freedom apart from others, so that each kind is looked at once a step.
 * Gives what was laid; `order` loses it.
 */
export function fillRoom(
  order: number[],
  kinds: readonly number[],
  waysOf: readonly (readonly RectangleWay[])[],
  room: RectangleRoom,
  meter: { probes: number },
): LaidRectangle[] {
  const steps: Step[] = [{ v: 0, wide: room.wide, u: 0 }];
  const laid: LaidRectangle[] = [];
  const seen = new Int32Array(waysOf.length).fill(-1);
  const copies = new Int32Array(waysOf.length);
  let kindsLeft = 0;
  for (const rectangle of order) {
    const kind = kinds[rectangle] ?? 0;
    if (copies[kind] === 0) kindsLeft++;
    copies[kind] = (copies[kind] ?? 0) + 1;
  }
  let turn = 0;
  while (order.length > 0) {
    const at = lowestStep(steps);
    const step = steps[at];
    if (!step) break;
    const left = (steps[at - 1]?.u ?? Number.POSITIVE_INFINITY) - step.u;
    const right = (steps[at + 1]?.u ?? Number.POSITIVE_INFINITY) - step.u;
    let best = -1;
    let bestPlace = -1;
    let bestWay: RectangleWay | null = null;
    turn++;
    let kindsSeen = 0;
    let place = 0;
    for (; place < order.length && best < mostFitting && kindsSeen < kindsLeft; place++) {
      const rectangle = order[place] ?? 0;
      const kind = kinds[rectangle] ?? 0;
      if (seen[kind] === turn) continue;
      seen[kind] = turn;
      kindsSeen++;
      for (const way of waysOf[kind] ?? []) {
        meter.probes++;
        if (way.wide > step.wide + hairMm || step.u + way.long > room.long + hairMm) continue;
        const score = fitness(way, step.wide, left, right);
        if (score > best) {
          best = score;
          bestPlace = place;
          bestWay = way;
        }
      }
    }
    // Passing over copies of a kind that was seen costs something too.
    meter.probes += place >> 3;
    if (!bestWay) {
      if (!raise(steps, at)) break;
      continue;
    }
    const [rectangle = 0] = order.splice(bestPlace, 1);
    const kind = kinds[rectangle] ?? 0;
    copies[kind] = (copies[kind] ?? 0) - 1;
    if (copies[kind] === 0) kindsLeft--;
    const toRight = standsRight(bestWay, step.wide, left, right);
    const v = toRight ? step.v + step.wide - bestWay.wide : step.v;
    laid.push({ rectangle, way: bestWay, u: step.u, v });
    put(steps, at, bestWay, toRight);
  }
  return laid;
}

const same = (a: number, b: number): boolean => Math.abs(a - b) <= hairMm;
const mostFitting = 4;

/** How well a rectangle fits between two walls: 4 fills the step up to the higher wall, 0 leaves a new corner everywhere. */
function fitness(way: RectangleWay, wide: number, left: number, right: number): number {
  const high = Math.max(left, right);
  const low = Math.min(left, right);
  if (same(way.wide, wide)) {
    if (same(way.long, high)) return 4;
    if (same(way.long, low)) return 3;
    return way.long > high ? 2 : 1.5;
  }
  if (same(way.long, high)) return 1;
  return same(way.long, low) ? 0.5 : 0;
}

/** It stands at the higher wall, unless it ends level with the lower one. */
function standsRight(way: RectangleWay, wide: number, left: number, right: number): boolean {
  const rightIsHigher = right > left;
  if (same(way.wide, wide)) return false;
  if (same(way.long, Math.max(left, right))) return rightIsHigher;
  return same(way.long, Math.min(left, right)) ? !rightIsHigher : rightIsHigher;
}

function lowestStep(steps: readonly Step[]): number {
  let lowest = 0;
  for (const [index, step] of steps.entries()) if (step.u < (steps[lowest]?.u ?? 0) - hairMm) lowest = index;
  return lowest;
}

/** Raises a step to its lower neighbour and joins them; false when it has none. */
function raise(steps: Step[], at: number): boolean {
  const left = steps[at - 1]?.u ?? Number.POSITIVE_INFINITY;
  const right = steps[at + 1]?.u ?? Number.POSITIVE_INFINITY;
  const level = Math.min(left, right);
  const step = steps[at];
  if (!step || !Number.isFinite(level)) return false;
  step.u = level;
  join(steps, at);
  return true;
}

function put(steps: Step[], at: number, way: RectangleWay, toRight: boolean): void {
  const step = steps[at];
  if (!step) return;
  const rest = step.wide - way.wide;
  const laid: Step = { v: toRight ? step.v + rest : step.v, wide: way.wide, u: step.u + way.long };
  if (rest <= hairMm) steps.splice(at, 1, { ...laid, wide: step.wide, v: step.v });
  else if (toRight) steps.splice(at, 1, { v: step.v, wide: rest, u: step.u }, laid);
  else steps.splice(at, 1, laid, { v: step.v + way.wide, wide: rest, u: step.u });
  join(steps, toRight && rest > hairMm ? at + 1 : at);
}

/** Joins a step with neighbours on its level. */
function join(steps: Step[], at: number): void {
  for (const index of [at, at - 1]) {
    const step = steps[index];
    const next = steps[index + 1];
    if (step && next && same(step.u, next.u)) {
      step.wide += next.wide;
      steps.splice(index + 1, 1);
    }
  }
}
