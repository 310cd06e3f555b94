import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, pieceWords } from "../words.ts";

/** Less than this is rounding, not a piece over the edge. */
const toleranceMm = 0.05;

/** Rule 27: a piece that stands over the board's edge. Set it aside where it is meant. */
export const outsideBoard: Rule = { number: 27, title: "Outside the board", check };

function check(input: RuleInput): Finding[] {
  const { width, height } = input.document.board;
  return layersWithFigures(input).flatMap(({ layer, pieces }) =>
    pieces.flatMap(({ piece, figures }): Finding[] => {
      if (figures.areaMm2 === 0) return [];
      const { box } = figures;
      const sides = [
        { edge: "left", over: -box.x, x: box.x, y: box.y + box.height / 2 },
        { edge: "right", over: box.x + box.width - width, x: box.x + box.width, y: box.y + box.height / 2 },
        { edge: "upper", over: -box.y, x: box.x + box.width / 2, y: box.y },
        { edge: "lower", over: box.y + box.height - height, x: box.x + box.width / 2, y: box.y + box.height },
      ].filter((side) => side.over > toleranceMm);
      const [worst] = sides.toSorted((a, b) => b.over - a.over);
      if (!worst) return [];
      const edges = sides.map((side) => side.edge).join(" and ");
      return [
        foundBy(outsideBoard, {
          severity: "caution",
          text: `${pieceWords(layer, piece)} stands over the board's ${edges} edge by ${formatFine(worst.over, input.context.unit)}. If that is meant, set this aside.`,
          layerKey: layer.key,
          pieceIds: [piece.id],
          where: { x: worst.x, y: worst.y },
          value: worst.over,
          limit: 0,
          unit: "mm",
          source: "our choice",
        }),
      ];
    }),
  );
}
