import { lengthsEqual } from "../../geometry/tolerance.ts";
import { hasThickness, nearestSheet, nearestThickness } from "../../materials/find-stock.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import type { Mend, MendStep } from "../mend.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { type CutLayer, checkCounts, entryOf, stockRule, stockSource } from "../stock-counts.ts";
import { layersWithFigures, layerWords } from "../words.ts";

/** Rule 22: colours, thicknesses, sheets, hardware and wood that the shop has on hand. A list that is empty says nothing. */
export const stockOnHand: Rule = { ...stockRule, check, mends };

function check(input: RuleInput): Finding[] {
  const cut = layersWithFigures(input).filter(({ pieces }) => pieces.length > 0);
  const listed = input.context.stock.acrylics.length > 0;
  return [...(listed ? cut.flatMap((one) => checkSheet(one, input)) : []), ...checkCounts(cut, input)];
}

function checkSheet({ layer, pieces }: CutLayer, { context }: RuleInput): Finding[] {
  const { acrylics } = context.stock;
  const mm = (length: number) => formatFine(length, context.unit);
  const base = {
    severity: "caution" as const,
    layerKey: layer.key,
    pieceIds: pieces.map(({ piece }) => piece.id),
    where: pieces[0]?.figures.centroid ?? null,
    source: stockSource,
  };
  const entry = entryOf(layer, acrylics);
  if (!entry) {
    const nearest = nearestSheet({ ...layer.stock, thicknessMm: layer.thickness }, acrylics);
    const offer = nearest
      ? ` ${nearest.stock.name} in ${mm(nearest.thicknessMm)} comes nearest (CIEDE2000 ${nearest.deltaE.toFixed(1)}).`
      : ` Nothing on hand looks ${layer.stock.look}.`;
    return [
      foundBy(stockOnHand, {
        ...base,
        text: `${layer.stock.name} of ${layerWords(layer)} is not in the stock list.${offer}`,
      }),
    ];
  }
  const { thicknessesMm } = entry;
  if (hasThickness(thicknessesMm, layer.thickness)) return [];
  const there = thicknessesMm.length > 0 ? `it is there in ${thicknessesMm.map(mm).join(", ")}` : "it is there in none";
  return [
    foundBy(stockOnHand, {
      ...base,
      text: `${layerWords(layer)} takes ${layer.stock.name} in ${mm(layer.thickness)}, which is not in stock: ${there}.`,
      value: layer.thickness,
      limit: nearestThickness(thicknessesMm, layer.thickness),
      unit: "mm",
    }),
  ];
}

/** The nearest thickness of the same sheet, or the nearest sheet. What is too few is bought, not drawn. */
function mends(finding: Finding, input: RuleInput): Mend[] {
  const { document, context } = input;
  const layer = document.layers.find(({ key }) => key === finding.layerKey);
  if (!layer || finding.pieceIds.length === 0) return [];
  const mm = (length: number) => formatFine(length, context.unit);
  const { acrylics } = context.stock;
  const entry = entryOf(layer, acrylics);
  if (entry && hasThickness(entry.thicknessesMm, layer.thickness)) return [];
  const thinner = entry ? nearestThickness(entry.thicknessesMm, layer.thickness) : null;
  const sameSheet: Mend[] =
    thinner === null
      ? []
      : [
          {
            label: `Take it in ${mm(thinner)}`,
            steps: [{ kind: "thickness", layerKey: layer.key, thickness: thinner }],
          },
        ];
  const other = nearestSheet({ ...layer.stock, thicknessMm: layer.thickness }, acrylics);
  if (!other || other.stock === entry?.acrylic) return sameSheet;
  const thickness: MendStep[] = lengthsEqual(other.thicknessMm, layer.thickness)
    ? []
    : [{ kind: "thickness", layerKey: layer.key, thickness: other.thicknessMm }];
  const label = `Take ${other.stock.name} in ${mm(other.thicknessMm)}`;
  const otherSheet = {
    label,
    steps: [{ kind: "stock" as const, layerKey: layer.key, stock: other.stock }, ...thickness],
  };
  return [...sameSheet, otherSheet];
}
