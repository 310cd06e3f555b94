import { isShorter } from "../../geometry/tolerance.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, piecesWords } from "../words.ts";

/** Rule 28: pieces that are lost easily, so that somebody counts them. */
export const smallPieces: Rule = { number: 28, title: "Small pieces", check };

function check(input: RuleInput): Finding[] {
  const { limits, context, document } = input;
  const mm = (length: number) => formatFine(length, context.unit);
  return layersWithFigures(input).flatMap(({ layer, pieces }): Finding[] => {
    const small = pieces
      .flatMap((one) => {
        const length = one.figures.smallestBox?.length ?? 0;
        return length > 0 && isShorter(length, limits.smallPieceMm) ? [{ ...one, length }] : [];
      })
      .toSorted((a, b) => a.length - b.length);
    const [smallest] = small;
    if (!smallest) return [];
    const are = small.length === 1 ? "is" : "are";
    const size = small.length === 1 ? `${mm(smallest.length)} long` : `down to ${mm(smallest.length)} long`;
    const inAll = small.length * document.quantity;
    const all = document.quantity > 1 ? ` ${inAll} in all for ${document.quantity} signs.` : "";
    return [
      foundBy(smallPieces, {
        severity: "remark",
        text: `${piecesWords(layer, small)} ${are} ${size}, under ${mm(limits.smallPieceMm)}: count them as they come off the bed, and cut some to spare.${all}`,
        layerKey: layer.key,
        pieceIds: small.map(({ piece }) => piece.id),
        where: smallest.figures.centroid,
        value: small.length,
        limit: 0,
        source: "common practice",
      }),
    ];
  });
}
