import { countOf } from "../../mockup/change.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, layerWords } from "../words.ts";

/** Rule 20: the hand must find the place of a bonded piece. */
export const locate: Rule = { number: 20, title: "Locate", check };

function check(input: RuleInput): Finding[] {
  return layersWithFigures(input).flatMap(({ layer, pieces }) => {
    const [first] = pieces;
    if (!first || layer.hold.kind !== "bond" || layer.locate !== "none") return [];
    return [
      foundBy(locate, {
        severity: "caution",
        text: `${countOf(pieces.length, "piece")} of ${layerWords(layer)} ${pieces.length === 1 ? "is" : "are"} bonded with nothing to find the place by. A bond can't be moved: plan a template, a scored line, a pocket or a hole pattern.`,
        layerKey: layer.key,
        pieceIds: pieces.map(({ piece }) => piece.id),
        where: first.figures.centroid,
        value: pieces.length,
        limit: 0,
        source: "common practice",
      }),
    ];
  });
}
