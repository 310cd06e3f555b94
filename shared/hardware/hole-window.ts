/**
 * Diameters in mm between which a hole in a panel hides under its cap and still gives play. Empty when lower > upper.
 */
export type HoleWindow = { readonly lower: number; readonly upper: number };

/**
 * The hole window of a cap standoff, in mm:
 * lower = passing + 2 (placing error + movement): the stud still passes when the hole was drilled beside its place and
 * the panel has moved;
 * upper = (min(cap, barrel) + passing) / 2 − cover: the hole may lie hard over to one side, and cap and barrel still
 * cover its far edge. Arithmetic; about half a millimetre of play and "never shows round the cap" are common practice.
 */
export function holeWindow(options: {
  /** Diameter of what passes the panel: the cap's stud. */
  readonly passing: number;
  readonly cap: number;
  readonly barrel: number;
  /** How far a hole may be drilled from its place, per side. */
  readonly placingError: number;
  /** This hole's largest movement against the backer. */
  readonly movement: number;
  /** How far cap and barrel must reach over the hole's edge. */
  readonly cover: number;
}): HoleWindow {
  const { passing, cap, barrel, placingError, movement, cover } = options;
  return {
    lower: passing + 2 * (placingError + movement),
    upper: (Math.min(cap, barrel) + passing) / 2 - cover,
  };
}
