import { lettersForDistance, readingEase } from "../../legibility/reading-distance.ts";
import { formatFine } from "../../units/format-length.ts";
import { inchesToMm, type LengthUnit } from "../../units/length.ts";
import type { Finding } from "../finding.ts";
import { type Letter, letterHeightMm, lettersOf } from "../lettering.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layerWords } from "../words.ts";

const source = "MUTCD 2009, section 2A.13, for the limit; ease is common practice";

/** Rule 24: letters tall enough for the distance that the sign is seen from. One finding a layer, of its smallest letter. */
export const readingDistance: Rule = { number: 24, title: "Reading distance", check };

function check(input: RuleInput): Finding[] {
  const letters = lettersOf(input);
  return input.document.layers.flatMap(({ key }) =>
    checkLayer(
      letters.filter(({ layer }) => layer.key === key),
      input,
    ),
  );
}

function checkLayer(letters: readonly Letter[], { document, context }: RuleInput): Finding[] {
  const smallest = letterHeightMm(letters);
  const distance = document.presentation.viewingDistance;
  if (!smallest) return [];
  const { heightMm, letter } = smallest;
  const ease = readingEase(heightMm, distance);
  const needed = lettersForDistance(distance);
  if (!ease.ok || !needed.ok || ease.value === "with ease") return [];
  const isLost = ease.value === "not at all";
  const limit = isLost ? needed.value.limitMm : needed.value.easeMm;
  const from = distanceWords(distance, context.unit);
  const height = formatFine(heightMm, context.unit);
  return [
    foundBy(readingDistance, {
      severity: isLost ? "caution" : "remark",
      text: isLost
        ? `The letters of ${layerWords(letter.layer)} are ${height} tall; from ${from} nobody reads them under ${formatFine(limit, context.unit)}.`
        : `The letters of ${layerWords(letter.layer)} are ${height} tall: from ${from} they are read at a pinch. With ease takes ${formatFine(limit, context.unit)}.`,
      layerKey: letter.layer.key,
      pieceIds: [letter.piece.id],
      where: letter.figures.centroid,
      value: heightMm,
      limit,
      unit: "mm",
      source,
    }),
  ];
}

function distanceWords(mm: number, unit: LengthUnit): string {
  return unit === "mm" ? `${Number((mm / 1000).toFixed(2))} m` : `${Number((mm / inchesToMm(12)).toFixed(1))} ft`;
}
