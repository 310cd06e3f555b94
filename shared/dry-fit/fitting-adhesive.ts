import { pairFit } from "../bonds/adhesive-families.ts";
import { isShorter } from "../geometry/tolerance.ts";
import type { Adhesive } from "../mockup/document.ts";
import { allowedMovementMm, jointMovements } from "./bond-movement.ts";
import { type JoinedLayer, joinedLayers, surfacesOf } from "./joints.ts";
import type { Mend, MendStep } from "./mend.ts";
import type { RuleInput } from "./rule.ts";

/** The families that melt acrylic. */
export const isSolvent = ({ family }: Adhesive): boolean => family === "solvent cement" || family === "bodied cement";

/**
 * The press that gives a layer the first adhesive on hand that bonds all it is glued to, takes the movement, and does not
 * craze a pocket; without a tack. None when nothing on hand does.
 */
export function adhesiveMends(layerKey: string | null, input: RuleInput): Mend[] {
  const joined = joinedLayers(input).find(({ layer }) => layer.key === layerKey);
  if (!joined) return [];
  const { hold } = joined.layer;
  const adhesive = fittingAdhesive(joined, input);
  if (!adhesive) return [];
  const untacked: MendStep[] =
    hold.kind === "bond" && hold.tack ? [{ kind: "tack", layerKey: joined.layer.key, tack: null }] : [];
  return [
    {
      label: `Take ${adhesive.name}${untacked.length > 0 ? ", without a tack" : ""}`,
      steps: [{ kind: "adhesive", layerKey: joined.layer.key, adhesive }, ...untacked],
    },
  ];
}

function fittingAdhesive({ layer, joints }: JoinedLayer, input: RuleInput): Adhesive | null {
  const movement = Math.max(0, ...joints.flatMap((joint) => jointMovements(joint, input)));
  const inAcrylicPocket = layer.hold.kind === "pocket" && joints.some(({ under }) => under !== null);
  const fits = (adhesive: Adhesive) =>
    joints.every(({ under }) => pairFit(adhesive.family, ...surfacesOf(layer, under, input.document)).fits) &&
    !isShorter(allowedMovementMm([adhesive], input.limits), movement) &&
    !(inAcrylicPocket && isSolvent(adhesive));
  return input.context.stock.adhesives.find(fits) ?? null;
}
