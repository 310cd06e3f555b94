import { isShorter } from "../../geometry/tolerance.ts";
import { screwMisfits, withScrew } from "../../hardware/screw-fit.ts";
import { longestScrew } from "../../hardware/screw-reach.ts";
import { usualOffsetMm } from "../../hardware/standoff-parts.ts";
import type { Hardware, Screw } from "../../mockup/document.ts";
import type { Finding } from "../finding.ts";
import { gripFault } from "../grip-fault.ts";
import type { Mend } from "../mend.ts";
import type { RuleInput } from "../rule.ts";
import { drivenAt, fixingPlaces } from "../screw-at.ts";
import { type StandoffLayer, standoffLayerOf } from "../standoff-layers.ts";
import { hardwareLike, hardwareMend } from "./hardware-mend.ts";

/** Two screws that are not made by number are of one thickness up to this, mm. */
const sameThicknessMm = 0.3;

/** A screw that goes into the barrel, the thickest and then the longest that holds; else a barrel that its screw goes into. */
export function fittingScrewMends({ layerKey }: Finding, input: RuleInput): Mend[] {
  const standing = standoffLayerOf(input, layerKey);
  if (!standing) return [];
  const { hardware, offset } = standing.hold;
  const fitting = input.context.stock.screws.filter((screw) => holdsWith(standing, withScrew(hardware, screw), input));
  const thickest = Math.max(...fitting.map(({ diameter }) => diameter));
  const screw = longestScrew(fitting, ({ diameter }) => diameter === thickest);
  const other = hardwareLike(standing, input).find(
    (one) => usualOffsetMm(one) === offset && holdsWith(standing, one, input) && grips(standing, one, input),
  );
  return [...(screw ? [screwMend(standing, screw)] : []), ...(other ? [hardwareMend(standing, other, input)] : [])];
}

/**
 * The longest screw of the same thickness that holds in the wood and does not break through, for a screw that is too long
 * or too short; for a stud, another stud.
 */
export function otherLengthMends(
  { layerKey }: Pick<Finding, "layerKey">,
  input: RuleInput,
  suffices: (hardware: Hardware) => boolean = () => true,
): Mend[] {
  const standing = standoffLayerOf(input, layerKey);
  if (!standing) return [];
  const { hardware, offset } = standing.hold;
  if (hardware.kind !== "blindStud") {
    const { screw: now } = hardware;
    const screw = longestScrew(input.context.stock.screws, (one) => {
      const other = withScrew(hardware, one);
      return isAsThick(one, now) && holdsWith(standing, other, input) && suffices(other);
    });
    if (screw) return [screwMend(standing, screw)];
  }
  const other = hardwareLike(standing, input).find(
    (one) =>
      usualOffsetMm(one) === offset && holdsWith(standing, one, input) && grips(standing, one, input) && suffices(one),
  );
  return other ? [hardwareMend(standing, other, input)] : [];
}

function screwMend({ layer }: StandoffLayer, screw: Screw): Mend {
  return { label: `Take ${screw.name}`, steps: [{ kind: "screw", layerKey: layer.key, screw }] };
}

function isAsThick(screw: Screw, now: Screw): boolean {
  if (screw.gauge !== null && now.gauge !== null) return screw.gauge === now.gauge;
  return Math.abs(screw.diameter - now.diameter) <= sameThicknessMm;
}

/** Whether a layer's hardware goes together, holds in the wood (past any slat) everywhere and breaks through nowhere. */
function holdsWith(standing: StandoffLayer, hardware: Hardware, input: RuleInput): boolean {
  if (screwMisfits(hardware).length > 0) return false;
  const other = { ...standing, hold: { ...standing.hold, hardware } };
  return fixingPlaces(other, input).every((place) => {
    const driven = drivenAt(place, hardware, { offset: standing.hold.offset, limits: input.limits });
    if (driven === null) return true;
    const { inWoodMm, leftMm, pastSlatMm } = driven;
    const held = pastSlatMm === null || !isShorter(pastSlatMm, input.limits.slatHoldMm);
    return held && inWoodMm > 0 && !isShorter(leftMm, 0);
  });
}

function grips(standing: StandoffLayer, hardware: Hardware, input: RuleInput): boolean {
  const { offset } = standing.hold;
  return fixingPlaces({ ...standing, hold: { ...standing.hold, hardware } }, input).every(
    ({ stack }) => gripFault(hardware, { stack, offset }, input.limits) === null,
  );
}
