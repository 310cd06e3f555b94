import { deltaE00, labOf } from "../../colour/lab.ts";
import { lengthsEqual } from "../../geometry/tolerance.ts";
import { nearestSheet } from "../../materials/find-stock.ts";
import type { Finding } from "../finding.ts";
import type { Mend, MendStep } from "../mend.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, layerWords } from "../words.ts";

const source = "ΔE00: Sharma, Wu, Dalal 2005; its bands: common practice";

/** Rule 23: the sheet's colour against the colour that the artwork has there. */
export const colourAgainstArtwork: Rule = { number: 23, title: "Colour against artwork", check, mends };

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
      const nearer = nearestSheet(
        { colour, look: layer.stock.look, thicknessMm: layer.thickness },
        context.stock.acrylics,
      );
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

/** The nearest sheet on hand, when with it the finding is gone or no caution any more, for everything drawn in the layer. */
function mends(finding: Finding, { document, limits, context }: RuleInput): Mend[] {
  const layer = document.layers.find(({ key }) => key === finding.layerKey);
  const piece = layer?.pieces.find(({ id }) => finding.pieceIds.includes(id));
  if (!layer || piece?.source.kind !== "artwork") return [];
  const wanted = { colour: piece.source.colour, look: layer.stock.look, thicknessMm: layer.thickness };
  const nearest = nearestSheet(wanted, context.stock.acrylics);
  const allowed = finding.severity === "caution" ? limits.colourCaution : limits.colourRemark;
  if (!nearest || nearest.deltaE > allowed) return [];
  const steps: MendStep[] = [{ kind: "stock", layerKey: layer.key, stock: nearest.stock }];
  if (!lengthsEqual(nearest.thicknessMm, layer.thickness)) {
    steps.push({ kind: "thickness", layerKey: layer.key, thickness: nearest.thicknessMm });
  }
  return [{ label: `Take ${nearest.stock.name} (CIEDE2000 ${nearest.deltaE.toFixed(1)})`, steps }];
}
