import type { Placement, Point } from "../geometry/path.ts";
import { placePoint, unplacePoint } from "../geometry/placement.ts";

/** Where a setting put a letter, about the lettering's origin, and where the letter now lies on the board. */
export type PlacedLetter = {
  readonly laid: Point & { readonly turn: number };
  readonly placement: Placement;
};

/** What was done to one letter alone: in the lettering's own plane, mm as laid and degrees, and its size against the others'. */
export type OwnShift = {
  readonly dx: number;
  readonly dy: number;
  readonly turn: number;
  readonly scale: number;
  readonly mirrored: boolean;
};

/** Turns are kept to a hundredth of a degree, places to a thousandth of a mm; moved a few times, they are off by some of that. */
const placeMm = 0.02;
const turnDegrees = 0.05;
const scaleShare = 1e-4;

/**
 * Where the lettering's own plane lies on the board: the movement that most of its letters have made together; of movements
 * that equally many made, that of the first letter. Null for no letters.
 */
export function commonMovement(letters: readonly PlacedLetter[]): Placement | null {
  let most: { readonly movement: Placement; readonly along: readonly PlacedLetter[] } | null = null;
  for (const letter of letters) {
    const movement = movementOf(letter);
    const along = letters.filter((other) => hasMoved(other, movement, letter));
    if (!most || along.length > most.along.length) most = { movement, along };
    if (2 * along.length > letters.length) break;
  }
  return most && refined(most.movement, most.along);
}

/** The movement that brings a letter from where it was laid to where it lies. */
function movementOf({ laid, placement }: PlacedLetter): Placement {
  const { scale, mirrored } = placement;
  const turn = turnWithin(placement.turn - (mirrored ? -laid.turn : laid.turn));
  const { x, y } = placePoint(laid, { x: 0, y: 0, turn, scale, mirrored });
  return { x: placement.x - x, y: placement.y - y, turn, scale, mirrored };
}

function hasMoved({ laid, placement }: PlacedLetter, movement: Placement, from: PlacedLetter): boolean {
  const to = movedLetter({ laid, movement });
  const far = Math.hypot(laid.x - from.laid.x, laid.y - from.laid.y) * movement.scale;
  return (
    placement.mirrored === to.mirrored &&
    Math.abs(placement.scale - to.scale) <= scaleShare * to.scale &&
    Math.abs(turnWithin(placement.turn - to.turn)) <= turnDegrees &&
    Math.hypot(placement.x - to.x, placement.y - to.y) <= placeMm + far * ((turnDegrees * Math.PI) / 180)
  );
}

/**
 * The movement turned and moved so that it meets the letters' places as well as it can: the places lie far apart and say the
 * turn better than one rounded angle does (least squares; see K. S. Arun et al., IEEE PAMI 9, 1987, for two dimensions).
 */
function refined(movement: Placement, letters: readonly PlacedLetter[]): Placement {
  const from = middleOf(letters.map(({ laid }) => laid));
  const to = middleOf(letters.map(({ placement }) => placement));
  const bare = { ...movement, x: 0, y: 0 };
  let cross = 0;
  let dot = 0;
  let spread = 0;
  for (const { laid, placement } of letters) {
    const a = placePoint({ x: laid.x - from.x, y: laid.y - from.y }, bare);
    const b = { x: placement.x - to.x, y: placement.y - to.y };
    cross += a.x * b.y - a.y * b.x;
    dot += a.x * b.x + a.y * b.y;
    spread += Math.hypot(a.x, a.y);
  }
  // Letters on one spot tell no turn.
  const by = spread > 1 ? (Math.atan2(cross, dot) * 180) / Math.PI : 0;
  const turned = { ...bare, turn: movement.turn + by };
  const middle = placePoint(from, turned);
  return { ...turned, x: to.x - middle.x, y: to.y - middle.y };
}

/** What was done to a letter beside the common movement. */
export function ownShift({ laid, placement }: PlacedLetter, movement: Placement): OwnShift {
  const { x, y } = unplacePoint(placement, movement);
  const by = placement.turn - movement.turn;
  return {
    dx: x - laid.x,
    dy: y - laid.y,
    turn: turnWithin((movement.mirrored ? -by : by) - laid.turn),
    scale: placement.scale / movement.scale,
    mirrored: placement.mirrored !== movement.mirrored,
  };
}

/** Where a letter comes to lie that is laid so, goes along with a movement, and has a shift of its own. */
export function movedLetter({
  laid,
  movement,
  shift = noShift,
}: {
  readonly laid: PlacedLetter["laid"];
  readonly movement: Placement;
  readonly shift?: OwnShift;
}): Placement {
  const turn = laid.turn + shift.turn;
  return {
    ...placePoint({ x: laid.x + shift.dx, y: laid.y + shift.dy }, movement),
    turn: movement.turn + (movement.mirrored ? -turn : turn),
    scale: movement.scale * shift.scale,
    mirrored: movement.mirrored !== shift.mirrored,
  };
}

const noShift: OwnShift = { dx: 0, dy: 0, turn: 0, scale: 1, mirrored: false };

/** Degrees from −180 to 180. */
function turnWithin(degrees: number): number {
  return degrees - 360 * Math.round(degrees / 360);
}

function middleOf(points: readonly Point[]): Point {
  const sum = points.reduce((all, { x, y }) => ({ x: all.x + x, y: all.y + y }), { x: 0, y: 0 });
  return { x: sum.x / points.length, y: sum.y / points.length };
}
