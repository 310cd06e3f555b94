import { remembered } from "../../geometry/kernel.ts";
import { fitOnBed } from "../../materials/bed-fit.ts";
import { shapeRegion } from "../../stack/piece-region.ts";
import { formatSize } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { splitPieceMends } from "../mends/split-piece.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, pieceWords } from "../words.ts";

/** Rule 21: a piece goes on the machine's bed, turned as need be. */
export const bed: Rule = { number: 21, title: "Bed", check, mends: splitPieceMends };

function check(input: RuleInput): Finding[] {
  const { bedWidthMm, bedHeightMm } = input.limits;
  const { unit } = input.context;
  const { kernel } = input;
  return layersWithFigures(input).flatMap(({ layer, pieces }) =>
    pieces.flatMap(({ piece, figures }): Finding[] => {
      const shape = shapeRegion(piece, kernel);
      const size = remembered(kernel, shape, `on a bed ${bedWidthMm} ${bedHeightMm}`, () =>
        fitOnBed(shape, { widthMm: bedWidthMm, heightMm: bedHeightMm }),
      );
      if (!size || size.overMm === 0) return [];
      return [
        foundBy(bed, {
          severity: "stop",
          text: `${pieceWords(layer, piece)} is ${formatSize(size.widthMm, size.heightMm, unit)} however it is turned; the bed takes ${formatSize(bedWidthMm, bedHeightMm, unit)}. Split it.`,
          layerKey: layer.key,
          pieceIds: [piece.id],
          where: figures.centroid,
          value: size.overMm,
          limit: 0,
          unit: "mm",
          source: "arithmetic",
        }),
      ];
    }),
  );
}
