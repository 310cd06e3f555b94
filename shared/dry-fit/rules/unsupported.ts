import { measureSupport } from "../../bonds/support.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { moveOntoSupport } from "../mends/move-onto-support.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { supportOf } from "../under.ts";
import { layersWithFigures, percentWords, pieceWords } from "../words.ts";

const source = "common practice";

/** Rule 1: a bonded piece that hangs over what it is bonded to. */
export const unsupported: Rule = { number: 1, title: "Unsupported", check, mends: moveOntoSupport };

function check(input: RuleInput): Finding[] {
  const { limits, kernel, context } = input;
  return layersWithFigures(input).flatMap(({ layer, level, pieces }) => {
    if (layer.hold.kind !== "bond") return [];
    return pieces.flatMap(({ piece, figures }): Finding[] => {
      if (figures.areaMm2 === 0) return [];
      const support = supportOf(input, level, figures);
      const { unsupportedShare, reachMm, where } = measureSupport(figures.region, support, kernel);
      const base = { layerKey: layer.key, pieceIds: [piece.id], where: where ?? figures.centroid, source };
      const name = pieceWords(layer, piece);
      if (reachMm === null) {
        const text = `${name} lies on nothing: there is nothing under it to bond it to.`;
        return [
          foundBy(unsupported, {
            ...base,
            severity: "stop",
            text,
            value: 100,
            limit: limits.unsupportedStop * 100,
            unit: "%",
          }),
        ];
      }
      const share = unsupportedShare > limits.unsupportedCaution;
      if (!share && !(reachMm > limits.reachMm)) return [];
      const severity = unsupportedShare > limits.unsupportedStop ? "stop" : "caution";
      const limit = severity === "stop" ? limits.unsupportedStop : limits.unsupportedCaution;
      const reach = `reaching up to ${formatFine(reachMm, context.unit)} over`;
      const why = "No adhesive holds that part, and a push breaks it off.";
      const bound = share
        ? {
            value: unsupportedShare * 100,
            limit: limit * 100,
            unit: "%",
            text: `${name} has ${percentWords(unsupportedShare)} of its area off its support, ${reach}; ${percentWords(limit)} is the limit. ${why}`,
          }
        : {
            value: reachMm,
            limit: limits.reachMm,
            unit: "mm",
            text: `${name} hangs over, ${reach}; ${formatFine(limits.reachMm, context.unit)} is the limit. ${why}`,
          };
      return [foundBy(unsupported, { ...base, severity, ...bound })];
    });
  });
}
