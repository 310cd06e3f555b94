import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import type { Mend } from "../mend.ts";
import type { RuleInput } from "../rule.ts";
import { type StandoffHold, standoffLayerOf } from "../standoff-layers.ts";
import { intoWindow, isEmptyWindow, windowOfHole } from "../window-of-hole.ts";
import { fixedHoleMend, hardwareLike, hardwareMend, holesFromMiddle } from "./hardware-mend.ts";

/**
 * A hole beside its window goes into it. One without a window gets one from a fixed hole nearer by, or from hardware that
 * covers more.
 */
export function holeWindowMends({ layerKey, holeId }: Finding, input: RuleInput): Mend[] {
  const standing = standoffLayerOf(input, layerKey);
  const hole = standing?.hold.holes.find(({ id }) => id === holeId);
  const window = standing && hole ? windowOfHole(standing.hold, hole, input) : null;
  if (!standing || !hole || !window) return [];
  const { layer, hold } = standing;
  if (!isEmptyWindow(window)) {
    const diameter = intoWindow(hole.diameter, window);
    const label = `Make the hole ${formatFine(diameter, input.context.unit)} wide`;
    return [{ label, steps: [{ kind: "hole diameter", layerKey: layer.key, holeId: hole.id, diameter }] }];
  }
  const [middle] = holesFromMiddle(hold.holes);
  const nearer = middle && hold.holes.map((one) => ({ ...one, fixed: one.id === middle.id }));
  const wider = hardwareLike(standing, input).find(
    (hardware) => hardware.barrelLength === hold.hardware.barrelLength && allOpen({ ...hold, hardware }, input),
  );
  return [
    ...(middle && nearer && allOpen({ ...hold, holes: nearer }, input) ? [fixedHoleMend(standing, middle, input)] : []),
    ...(wider ? [hardwareMend(standing, wider, input)] : []),
  ];
}

function allOpen(hold: StandoffHold, input: RuleInput): boolean {
  return hold.holes.every((hole) => {
    const window = windowOfHole(hold, hole, input);
    return !window || !isEmptyWindow(window);
  });
}
