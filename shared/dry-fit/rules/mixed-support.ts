import { lengthsEqual } from "../../geometry/tolerance.ts";
import type { Layer } from "../../mockup/document.ts";
import { mostLayers } from "../../mockup/split-layer.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { areasTouch } from "../../stack/touching.ts";
import { formatFine, formatLengthWithUnit } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import type { Mend } from "../mend.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { piecesBelow, topUnderDisc } from "../under.ts";
import { layersWithFigures, layerWords } from "../words.ts";

const source = "arithmetic";

/**
 * Rule 2: pieces of one layer, or the barrels of one panel, on different levels; and a panel that would run into what
 * is under it.
 */
export const mixedSupport: Rule = { number: 2, title: "Mixed support", check, mends };

function check(input: RuleInput): Finding[] {
  return layersWithFigures(input).flatMap(({ layer, level, pieces }) => {
    const figures = pieces.map((one) => one.figures);
    return [
      ...piecesOnLevels(layer, figures, input),
      ...feetOnLevels(layer, level, input),
      ...figures.flatMap((piece) => runsInto(layer, level, piece, input)),
    ];
  });
}

/** A layer for each of the smaller groups; what else stands in the way is the maker's to decide. */
function mends(finding: Finding, input: RuleInput): Mend[] {
  const found = layersWithFigures(input).find(({ layer }) => layer.key === finding.layerKey);
  if (!found || finding.holeId !== null) return [];
  const { layer, pieces } = found;
  const [, ...others] = levelGroups(pieces.map(({ figures }) => figures));
  const ids = others.map((group) => group.map(({ pieceId }) => pieceId));
  if (others.length === 0 || !isSameSet(ids.flat(), finding.pieceIds)) return [];
  if (input.document.layers.length + others.length > mostLayers) return [];
  const label = others.length === 1 ? "Split the layer" : `Split the layer in ${others.length + 1}`;
  return [{ label, steps: ids.map((pieceIds) => ({ kind: "split layer", layerKey: layer.key, pieceIds })) }];
}

const isSameSet = (a: readonly string[], b: readonly string[]): boolean =>
  a.length === b.length && a.every((one) => b.includes(one));

/** Pieces by the height of their backs, the largest group first, of equal ones the one that comes first. */
function levelGroups(pieces: readonly PieceFigures[]): PieceFigures[][] {
  const groups: PieceFigures[][] = [];
  for (const piece of pieces) {
    const group = groups.find(([first]) => first && lengthsEqual(first.bottom.nominal, piece.bottom.nominal));
    if (group) group.push(piece);
    else groups.push([piece]);
  }
  return groups.toSorted((a, b) => b.length - a.length);
}

function piecesOnLevels(layer: Layer, pieces: readonly PieceFigures[], { context }: RuleInput): Finding[] {
  // The smaller groups are the ones to take out of the layer.
  const [most, ...others] = levelGroups(pieces);
  const first = others[0]?.[0];
  if (!most?.[0] || !first) return [];
  const levels = [most, ...others].map((group) => {
    const [one] = group;
    const on = one?.restsOn[0] === undefined ? "nothing" : one.restsOn[0];
    return `${group.length} on ${on} at ${formatLengthWithUnit(one?.bottom.nominal ?? 0, context.unit)}`;
  });
  const apart = Math.abs(first.bottom.nominal - most[0].bottom.nominal);
  return [
    foundBy(mixedSupport, {
      severity: "stop",
      text: `Pieces of ${layerWords(layer)} would stand on different levels: ${levels.join(", ")}. One layer has one height: split it.`,
      layerKey: layer.key,
      pieceIds: others.flat().map((piece) => piece.pieceId),
      where: first.centroid,
      value: apart,
      limit: 0,
      unit: "mm",
      source,
    }),
  ];
}

function feetOnLevels(layer: Layer, level: number, input: RuleInput): Finding[] {
  const { hold } = layer;
  if (hold.kind !== "standoff") return [];
  const feet = hold.holes.flatMap((hole) => {
    const top = topUnderDisc(input, level, { ...hole, diameter: hold.hardware.barrelDiameter });
    return top === null ? [] : [{ hole, top }];
  });
  const lowest = Math.min(...feet.map((foot) => foot.top));
  return feet
    .filter((foot) => !lengthsEqual(foot.top, lowest))
    .map(({ hole, top }) => {
      const apart = formatFine(top - lowest, input.context.unit);
      return foundBy(mixedSupport, {
        severity: "stop",
        text: `A barrel of ${layerWords(layer)} stands ${apart} higher than another of the same layer: the panel would not lie on them all.`,
        layerKey: layer.key,
        holeId: hole.id,
        where: { x: hole.x, y: hole.y },
        value: top - lowest,
        limit: 0,
        unit: "mm",
        source,
      });
    });
}

/** Only a panel on standoffs can: everything else lies on the highest thing under it. */
function runsInto(layer: Layer, level: number, piece: PieceFigures, input: RuleInput): Finding[] {
  if (layer.hold.kind !== "standoff") return [];
  const inTheWay = piecesBelow(input, level)
    .filter((lower) => lower.top.nominal - piece.bottom.nominal > 0.01 && areasTouch(piece, lower, input.kernel))
    .toSorted((a, b) => b.top.nominal - a.top.nominal)[0];
  if (!inTheWay) return [];
  const by = inTheWay.top.nominal - piece.bottom.nominal;
  return [
    foundBy(mixedSupport, {
      severity: "stop",
      text: `${layerWords(layer)} would run ${formatFine(by, input.context.unit)} into ${inTheWay.layerKey} under it. Take a longer barrel or move one of them.`,
      layerKey: layer.key,
      pieceIds: [piece.pieceId, inTheWay.pieceId],
      where: inTheWay.centroid,
      value: by,
      limit: 0,
      unit: "mm",
      source,
    }),
  ];
}
