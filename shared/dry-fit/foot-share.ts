import { boxesOverlap } from "../geometry/box.ts";
import { distanceToRegionEdgeMm, regionContains } from "../geometry/contains.ts";
import { remembered } from "../geometry/kernel.ts";
import type { Point, Region } from "../geometry/path.ts";
import { isShorter, lengthsEqual } from "../geometry/tolerance.ts";
import { barrelFoot, type Joint } from "../hardware/barrel-foot.ts";
import { openJointsOf } from "../slats/foot-on-slats.ts";
import { faceRegion, slatsOf } from "../stack/backer.ts";
import type { PieceFigures } from "../stack/figures.ts";
import type { RuleInput } from "./rule.ts";
import { footHeightMm, type StandoffLayer } from "./standoff-layers.ts";
import { piecesBelow } from "./under.ts";

/** What the barrels of a piece stand on: the wood of the board's face, or pieces whose faces lie at that height. */
export type FootGround = {
  readonly onBoard: boolean;
  readonly parts: readonly Region[];
  /** Between slats, where they stand on those. */
  readonly openJoints: readonly Joint[];
};

/** What lies at the height of a held piece's feet, as far as it can lie under the piece. */
export function footGround({ hold, level }: StandoffLayer, piece: PieceFigures, input: RuleInput): FootGround {
  const height = footHeightMm(hold, piece);
  if (lengthsEqual(height, input.figures.backerTop.nominal)) {
    return { onBoard: true, parts: [faceRegion(input.document, input.kernel)], openJoints: openJoints(input) };
  }
  const parts = piecesBelow(input, level)
    .filter((below) => lengthsEqual(below.top.nominal, height) && boxesOverlap(below.box, piece.box))
    .map(({ region }) => region);
  return { onBoard: false, parts, openJoints: [] };
}

function openJoints({ document, kernel }: Pick<RuleInput, "document" | "kernel">): readonly Joint[] {
  const laid = slatsOf(document, kernel);
  return laid?.ok ? remembered(kernel, [laid.value], "open joints", () => openJointsOf(laid.value)) : [];
}

/** Share of a barrel's foot that stands on its ground, 0 to 1. */
export function footShare(
  place: Point,
  barrelDiameter: number,
  { parts }: FootGround,
  { kernel }: Pick<RuleInput, "kernel">,
): number {
  const radius = barrelDiameter / 2;
  // Nearly every foot stands well inside one thing, which needs no kernel to see.
  const inside = parts.some(
    (part) => regionContains(part, place) && !isShorter(distanceToRegionEdgeMm(part, place), radius),
  );
  if (inside) return 1;
  const near = parts.filter(
    (part) => regionContains(part, place) || isShorter(distanceToRegionEdgeMm(part, place), radius),
  );
  if (near.length === 0) return 0;
  const ground = { wood: kernel.union(near.flat(), "nonzero"), openJoints: [], brads: [] };
  return barrelFoot({ x: place.x, y: place.y, diameter: barrelDiameter }, ground, kernel).onWood;
}
