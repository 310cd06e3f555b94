import { barrelAddsUp } from "../../hardware/barrel-offset.ts";
import { heldOffsetMm, usualOffsetMm } from "../../hardware/standoff-parts.ts";
import type { Hardware } from "../../mockup/document.ts";
import { formatLengthWithUnit } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { gripFault } from "../grip-fault.ts";
import type { Mend } from "../mend.ts";
import { heldPlaces } from "../on-panel.ts";
import type { RuleInput } from "../rule.ts";
import { type StandoffLayer, standoffLayerOf } from "../standoff-layers.ts";
import { hardwareLike, hardwareMend } from "./hardware-mend.ts";
import { moveHoleMends } from "./move-hole.ts";

/**
 * An offset that no barrel makes goes to the barrel, or the barrel goes to it. A stud or a slot that does not grip is
 * changed for stock that does; an edge grip that misses its edge is moved.
 */
export function gripMends(finding: Finding, input: RuleInput): Mend[] {
  const standing = standoffLayerOf(input, finding.layerKey);
  if (!standing || finding.unit !== "mm") return [];
  // An edge grip beside its place is a matter of the piece whose edge it misses.
  if (finding.pieceIds.length > 0) return moveHoleMends(finding, input);
  if (finding.holeId === null) return offsetMends(standing, input);
  const best = nearestFitting(standing, input);
  return best ? [hardwareMend(standing, best, input)] : [];
}

function offsetMends(standing: StandoffLayer, input: RuleInput): Mend[] {
  const { hardware } = standing.hold;
  const held = heldOffsetMm(hardware);
  const sound = held !== null && (hardware.kind !== "capStud" || barrelAddsUp(hardware));
  const nearest = nearestFitting(standing, input, (other) => !sound || usualOffsetMm(other) !== held);
  const toBarrel: Mend[] = sound
    ? [
        {
          label: `Set it ${formatLengthWithUnit(held, input.context.unit)} off`,
          steps: [{ kind: "offset", layerKey: standing.layer.key, offset: held }],
        },
      ]
    : [];
  return [...toBarrel, ...(nearest ? [hardwareMend(standing, nearest, input)] : [])];
}

/** The stock nearest to what a layer has that goes together and grips everywhere. */
function nearestFitting(
  standing: StandoffLayer,
  input: RuleInput,
  wanted: (hardware: Hardware) => boolean = () => true,
): Hardware | undefined {
  return hardwareLike(standing, input).find((hardware) => {
    if (!wanted(hardware) || (hardware.kind === "capStud" && !barrelAddsUp(hardware))) return false;
    const offset = usualOffsetMm(hardware);
    return heldPlaces({ ...standing, hold: { ...standing.hold, hardware } }, input).every(
      ({ stack }) => gripFault(hardware, { stack, offset }, input.limits) === null,
    );
  });
}
