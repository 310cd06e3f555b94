import { deltaE00, labOf } from "../../colour/lab.ts";
import { nearestStock } from "../../colour/nearest-stock.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, layerWords } from "../words.ts";

const source = "ΔE00: Sharma, Wu, Dalal 2005; its bands: common practice";

/** Rule 23: the sheet's colour against the colour that the artwork has there. */
export const colourAgainstArtwork: Rule = { number: 23, title: "Colour against artwork", check };

function check(input: RuleInput): Finding[] {
  const { limits, context } = input;
  return layersWithFigures(input).flatMap(({ layer, pieces }) => {
    const byColour = new Map<string, (typeof pieces)[number][]>();
    for (const one of pieces) {
      if (one.piece.source.kind !== "artwork") continue;
      const { colour } = one.piece.source;
      byColour.set(colour, [...(byColour.get(colour) ?? []), one]);
    }
    return [...byColour].flatMap(([colour, drawn]): Finding[] => {
      const deltaE = deltaE00(labOf(colour), labOf(layer.stock.colour));
      if (deltaE <= limits.colourRemark) return [];
      const severity = deltaE > limits.colourCaution ? "caution" : "remark";
      const looks = severity === "caution" ? "That is another colour." : "Side by side it shows.";
      const acrylics = context.stock.acrylics.map(({ acrylic }) => acrylic);
      const nearer = nearestStock(colour, acrylics);
      const offer =
        nearer && nearer.deltaE < deltaE - 0.05
          ? ` ${nearer.stock.name} comes nearer (${nearer.deltaE.toFixed(1)}).`
          : "";
      return [
        foundBy(colourAgainstArtwork, {
          severity,
          text: `${layer.stock.name} (${layer.stock.colour}) of ${layerWords(layer)} differs from the artwork's ${colour} by ${deltaE.toFixed(1)} (CIEDE2000). ${looks}${offer}`,
          layerKey: layer.key,
          pieceIds: drawn.map(({ piece }) => piece.id),
          where: drawn[0]?.figures.centroid ?? null,
          value: deltaE,
          limit: severity === "caution" ? limits.colourCaution : limits.colourRemark,
          unit: "ΔE00",
          source,
        }),
      ];
    });
  });
}
