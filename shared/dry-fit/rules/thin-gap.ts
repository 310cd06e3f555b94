import { type Kernel, remembered } from "../../geometry/kernel.ts";
import type { Point } from "../../geometry/path.ts";
import { thinnestGap } from "../../pieces/thinnest-gap.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, piecesWords } from "../words.ts";

/** Rule 4: a gap inside one piece that is too narrow to cut and clean. */
export const thinGap: Rule = { number: 4, title: "Thin gap", check };

/** The narrowest gap of a piece under the limit, with its place on the board; it depends on the piece's region alone. */
export function measureGap(
  { region }: Pick<PieceFigures, "region">,
  limitMm: number,
  kernel: Kernel,
): { readonly widthMm: number; readonly where: Point } | null {
  return remembered(kernel, region, `thinnest gap ${limitMm}`, () => thinnestGap(region, limitMm, kernel));
}

function check(input: RuleInput): Finding[] {
  const { limits, context, kernel } = input;
  return layersWithFigures(input).flatMap(({ layer, pieces }): Finding[] => {
    const narrow = pieces
      .flatMap((one) => {
        const gap = measureGap(one.figures, limits.gapMm, kernel);
        return gap ? [{ ...one, gap }] : [];
      })
      .toSorted((a, b) => a.gap.widthMm - b.gap.widthMm);
    const [worst] = narrow;
    if (!worst) return [];
    const { widthMm, where } = worst.gap;
    const one = narrow.length === 1;
    const gap = one ? "has a gap that" : "have gaps; the narrowest";
    // Under a tenth there is no gap left to speak of.
    const width = widthMm < 0.1 ? "closes to nothing" : `is ${formatFine(widthMm, context.unit)} wide`;
    return [
      foundBy(thinGap, {
        severity: "caution",
        text: `${piecesWords(layer, narrow)} ${gap} ${width}; ${formatFine(limits.gapMm, context.unit)} is the least. A narrower one melts shut or chips, and nobody can clean it.`,
        layerKey: layer.key,
        pieceIds: narrow.map(({ piece }) => piece.id),
        where,
        value: widthMm,
        limit: limits.gapMm,
        unit: "mm",
        source: "common practice",
      }),
    ];
  });
}
