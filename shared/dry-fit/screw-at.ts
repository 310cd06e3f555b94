import { drivenOf } from "../hardware/driven-of.ts";
import { reachRoom, screwReach } from "../hardware/screw-reach.ts";
import type { Hardware } from "../mockup/document.ts";
import { type Banded, bandSum, exactly } from "../units/banded.ts";
import { type HeldPlace, heldPlaces } from "./on-panel.ts";
import type { RuleInput } from "./rule.ts";
import { footHeightMm, type StandoffLayer } from "./standoff-layers.ts";
import { type WoodAt, type WoodGround, woodAt, woodGround } from "./wood-at.ts";

/** A standoff where it stands, with the wood under it and what lies under its front. */
export type FixingPlace = HeldPlace & {
  readonly wood: WoodAt | null;
  /** From what the barrel stands on down to the wood's face; less than nothing where it stands in a recess. */
  readonly gapMm: number;
};

/** Every standoff of a layer that holds a piece, in the order of its holes. */
export function fixingPlaces(
  standing: StandoffLayer,
  input: RuleInput,
  ground: WoodGround = woodGround(input),
): FixingPlace[] {
  return heldPlaces(standing, input).map((place) => {
    const wood = woodAt(input, ground, place.hole);
    return { ...place, wood, gapMm: wood ? footHeightMm(standing.hold, place.piece) - wood.face : 0 };
  });
}

export type Driven = {
  /** How deep the point comes below the wood's face, mm. */
  readonly point: Banded;
  /** How deep the wood may be opened, and what is left of that; less than nothing breaks through. */
  readonly mostMm: number;
  readonly leftMm: number;
  /** How much of it is in wood at the least, mm; nothing or less when it does not get there. */
  readonly inWoodMm: number;
  /** How far it comes past the slat at the least, mm; less than nothing when it ends in the slat. Null on a plank. */
  readonly pastSlatMm: number | null;
  /** How much of it is in the wood that carries: the plank, or the substrate, since slats are held by glue alone. */
  readonly holdingMm: number;
};

/** How a standoff's screw or stud sits in the wood at its place; null beside the board, or for measures out of range. */
export function drivenAt(
  { wood, stack, gapMm }: Pick<FixingPlace, "wood" | "stack" | "gapMm">,
  hardware: Hardware,
  { offset, limits }: { offset: number; limits: RuleInput["limits"] },
): Driven | null {
  if (!wood) return null;
  const reach = screwReach(drivenOf(hardware, { stack, offset }));
  if (!reach.ok) return null;
  const under = exactly(-gapMm);
  const point = bandSum(reach.value.point, under);
  const opened = bandSum(reach.value.opened, under);
  const { slat, substrate } = wood;
  const room = reachRoom({ point, opened }, { slat, substrate, sanding: limits.sandingMm, skin: limits.skinMm });
  if (!room.ok) return null;
  const { mostMm, leftMm, pastSlatMm } = room.value;
  const inWoodMm = point.least - (wood.face - wood.top);
  const holdingMm = Math.min(inWoodMm, pastSlatMm);
  return { point, mostMm, leftMm, inWoodMm, pastSlatMm: slat > 0 ? pastSlatMm : null, holdingMm };
}
