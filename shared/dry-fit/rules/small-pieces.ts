import { regionCentroid } from "../../geometry/area.ts";
import { smallestBox } from "../../geometry/smallest-box.ts";
import { isShorter } from "../../geometry/tolerance.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { partsOfPiece } from "../parts-of-piece.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, piecesWords } from "../words.ts";

/** Rule 28: pieces that are lost easily, so that somebody counts them. */
export const smallPieces: Rule = { number: 28, title: "Small pieces", check };

function check(input: RuleInput): Finding[] {
  return [...checkWhole(input), ...checkParts(input)];
}

/** Parts of pieces that are no piece of their own, as the dot of an i, are lost as easily. */
function checkParts(input: RuleInput): Finding[] {
  const { limits, context, document, kernel } = input;
  return layersWithFigures(input).flatMap(({ layer, pieces }): Finding[] => {
    const small = pieces.flatMap((one) => {
      const parts = partsOfPiece(one.figures, kernel);
      if (parts.length < 2 || isLost(one.figures.smallestBox?.length ?? 0, limits.smallPieceMm)) return [];
      return parts.flatMap((region) => {
        const length = smallestBox(region)?.length ?? 0;
        return isLost(length, limits.smallPieceMm) ? [{ ...one, length, where: regionCentroid(region) }] : [];
      });
    });
    const [smallest] = small.toSorted((a, b) => a.length - b.length);
    if (!smallest) return [];
    const of = [...new Map(small.map((one) => [one.piece.id, one])).values()];
    const size = `${formatFine(smallest.length, context.unit)} long`;
    const loose = small.length === 1 ? `a loose part ${size}` : `${small.length} loose parts down to ${size}`;
    const all =
      document.quantity > 1 ? ` ${small.length * document.quantity} in all for ${document.quantity} signs.` : "";
    return [
      foundBy(smallPieces, {
        severity: "remark",
        text: `${piecesWords(layer, of)} ${of.length === 1 ? "has" : "have"} ${loose}, under ${formatFine(limits.smallPieceMm, context.unit)}, as dots and accents are: count them as they come off the bed, and cut some to spare.${all}`,
        layerKey: layer.key,
        pieceIds: of.map(({ piece }) => piece.id),
        where: smallest.where,
        value: small.length,
        limit: 0,
        source: "common practice",
      }),
    ];
  });
}

const isLost = (length: number, limitMm: number): boolean => length > 0 && isShorter(length, limitMm);

function checkWhole(input: RuleInput): Finding[] {
  const { limits, context, document } = input;
  const mm = (length: number) => formatFine(length, context.unit);
  return layersWithFigures(input).flatMap(({ layer, pieces }): Finding[] => {
    const small = pieces
      .flatMap((one) => {
        const length = one.figures.smallestBox?.length ?? 0;
        return isLost(length, limits.smallPieceMm) ? [{ ...one, length }] : [];
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
