import { usualOffsetMm } from "../../hardware/standoff-parts.ts";
import type { Hardware, Hole } from "../../mockup/document.ts";
import type { Mend, MendStep } from "../mend.ts";
import type { RuleInput } from "../rule.ts";
import type { StandoffHold, StandoffLayer } from "../standoff-layers.ts";
import { intoWindow, isEmptyWindow, windowOfHole } from "../window-of-hole.ts";

/** Steps that bring every hole of a layer into the window it has with that hold, where it has one. */
export function diameterSteps(
  layerKey: string,
  hold: Pick<StandoffHold, "hardware" | "holes">,
  input: RuleInput,
): MendStep[] {
  return hold.holes.flatMap((hole): MendStep[] => {
    const window = windowOfHole(hold, hole, input);
    if (!window || isEmptyWindow(window)) return [];
    const diameter = intoWindow(hole.diameter, window);
    return diameter === hole.diameter ? [] : [{ kind: "hole diameter", layerKey, holeId: hole.id, diameter }];
  });
}

/** Other hardware for a layer, its panel at the height that this holds it, its holes as wide as it asks for. */
export function hardwareMend({ layer, hold }: StandoffLayer, hardware: Hardware, input: RuleInput): Mend {
  const offset = usualOffsetMm(hardware);
  return {
    label: `Take ${hardware.name}`,
    steps: [
      { kind: "hardware", layerKey: layer.key, hardware, offset },
      ...diameterSteps(layer.key, { hardware, holes: hold.holes }, input),
    ],
  };
}

/** Stock of the kind that a layer has, the nearest in barrel diameter and then in height first. */
export function hardwareLike({ hold }: StandoffLayer, { context }: RuleInput): Hardware[] {
  const { hardware, offset } = hold;
  const far = (other: Hardware): number =>
    1000 * Math.abs(other.barrelDiameter - hardware.barrelDiameter) + Math.abs(usualOffsetMm(other) - offset);
  return context.stock.hardware
    .map((one) => one.hardware)
    .filter(({ kind }) => kind === hardware.kind)
    .toSorted((a, b) => far(a) - far(b));
}

/** Makes one hole the fixed one, the others as wide as their movement from there asks for. */
export function fixedHoleMend({ layer, hold }: StandoffLayer, hole: Hole, input: RuleInput): Mend {
  const holes = hold.holes.map((one) => ({ ...one, fixed: one.id === hole.id }));
  return {
    label: "Make the hole nearest the middle the fixed one",
    steps: [
      { kind: "fixed hole", layerKey: layer.key, holeId: hole.id },
      ...diameterSteps(layer.key, { hardware: hold.hardware, holes }, input),
    ],
  };
}

/** Holes by how near they are to the middle of them all. */
export function holesFromMiddle(holes: readonly Hole[]): Hole[] {
  const x = holes.reduce((sum, hole) => sum + hole.x, 0) / holes.length;
  const y = holes.reduce((sum, hole) => sum + hole.y, 0) / holes.length;
  const far = (hole: Hole): number => Math.hypot(hole.x - x, hole.y - y);
  return holes.toSorted((a, b) => far(a) - far(b));
}
