import { familyFacts } from "../../bonds/adhesive-families.ts";
import { isShorter } from "../../geometry/tolerance.ts";
import { faceStock } from "../../stack/backer.ts";
import { formatFine } from "../../units/format-length.ts";
import { allowedMovementMm, jointMovements } from "../bond-movement.ts";
import type { Finding } from "../finding.ts";
import { adhesiveMends } from "../fitting-adhesive.ts";
import { adhesivesOf, joinedLayers } from "../joints.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layerWords, piecesWords } from "../words.ts";

const source = "arithmetic; what an adhesive takes is common practice; wood: Wood Handbook, GTR-282, equation 13-2";

/** Rule 17: acrylic and wood under it part by more than the adhesive between them takes. */
export const bondMismatch: Rule = {
  number: 17,
  title: "Bond mismatch",
  check,
  mends: ({ layerKey }, input) => adhesiveMends(layerKey, input),
};

function check(input: RuleInput): Finding[] {
  const { limits, context, document } = input;
  const mm = (length: number) => formatFine(length, context.unit);
  return joinedLayers(input).flatMap(({ layer, joints }): Finding[] => {
    const adhesives = adhesivesOf(layer);
    const allowed = allowedMovementMm(adhesives, limits);
    const parting = joints
      .flatMap((joint) => {
        const movements = jointMovements(joint, input);
        return joint.pieces.map((one, index) => ({ ...one, movement: movements[index] ?? 0 }));
      })
      .filter(({ movement }) => isShorter(allowed, movement));
    const [worst] = parting.toSorted((a, b) => b.movement - a.movement);
    if (!worst) return [];
    const stiffest = adhesives.find((one) => allowedMovementMm([one], limits) === allowed) ?? layer.hold.adhesive;
    const way =
      familyFacts(stiffest.family).gives === "rigid"
        ? "It lets go from the ends inward: take one that gives, or divide the piece."
        : "It lets go from the ends inward: divide the piece, or stand it off.";
    return [
      foundBy(bondMismatch, {
        severity: "caution",
        text: `${piecesWords(layer, parting)} and the ${faceStock(document.backer).name} under ${parting.length === 1 ? "it" : "them"} part by up to ${mm(worst.movement)} at the bond's ends; ${stiffest.name} of ${layerWords(layer)} takes ${mm(allowed)}. ${way}`,
        layerKey: layer.key,
        pieceIds: parting.map(({ piece }) => piece.id),
        where: worst.figures.centroid,
        value: worst.movement,
        limit: allowed,
        unit: "mm",
        source,
      }),
    ];
  });
}
