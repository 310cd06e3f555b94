import { pairFit } from "../../bonds/adhesive-families.ts";
import { backSurface, woodSurface } from "../../bonds/surfaces.ts";
import { barrelAddsUp } from "../../hardware/barrel-offset.ts";
import { heldOffsetMm, usualOffsetMm } from "../../hardware/standoff-parts.ts";
import type { Hardware } from "../../mockup/document.ts";
import { mostLayers } from "../../mockup/split-layer.ts";
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
 * changed for stock that does; an edge grip that misses its edge is moved. Pieces that no standoff holds are bonded.
 */
export function gripMends(finding: Finding, input: RuleInput): Mend[] {
  const standing = standoffLayerOf(input, finding.layerKey);
  if (!standing) return [];
  if (finding.unit !== "mm") return splitMends(standing, finding, input);
  // An edge grip beside its place is a matter of the piece whose edge it misses.
  if (finding.pieceIds.length > 0) return moveHoleMends(finding, input);
  if (finding.holeId === null) return offsetMends(standing, input);
  const best = nearestFitting(standing, input);
  return best ? [hardwareMend(standing, best, input)] : [];
}

/** Some pieces of a layer stand on standoffs and the others, of the same colour, are bonded to the backer. */
function splitMends({ layer, pieces }: StandoffLayer, { pieceIds }: Finding, input: RuleInput): Mend[] {
  const { document, context } = input;
  if (pieceIds.length === pieces.length || document.layers.length >= mostLayers) return [];
  const surfaces = [backSurface(layer.stock), woodSurface(document.backer.finish)] as const;
  const adhesive = context.stock.adhesives.find(({ family }) => pairFit(family, ...surfaces).fits);
  if (!adhesive) return [];
  const label = `Make ${pieceIds.length === 1 ? "it" : "them"} a layer, bonded with ${adhesive.name}`;
  return [{ label, steps: [{ kind: "split layer", layerKey: layer.key, pieceIds, adhesive }] }];
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
