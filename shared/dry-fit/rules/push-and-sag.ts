import { bendsTooFar, type Deflection, deflectionLimitMm } from "../../plates/deflection.ts";
import { holdingPattern } from "../../plates/holding-pattern.ts";
import { pushDeflection } from "../../plates/push.ts";
import { acrylicSheet, lastingShare, standardGravity } from "../../plates/rigidity.ts";
import { sag } from "../../plates/sag.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Outcome } from "../../units/outcome.ts";
import { type Carried, carriedMasses } from "../carried.ts";
import type { Finding } from "../finding.ts";
import type { Mend } from "../mend.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { pieceAt, type StandoffLayer, standoffLayerOf, standoffLayers } from "../standoff-layers.ts";
import { layerWords, newtonWords } from "../words.ts";

const source = "Timoshenko; Roark, table 11.4; limits are our choice";

/** Rule 15: how far a panel on standoffs gives way when it is pushed, or sags when it does not hang upright. */
export const pushAndSag: Rule = { number: 15, title: "Push and sag", check, mends };

function check(input: RuleInput): Finding[] {
  const standing = standoffLayers(input);
  if (standing.length === 0) return [];
  const carried = carriedMasses(input);
  return standing.flatMap((one) =>
    one.pieces.flatMap((piece) => {
      const bend = bendOf(one, piece, one.layer.thickness, carried.get(piece.pieceId), input);
      return bend ? findingOf(one, piece, bend, input) : [];
    }),
  );
}

type Bend = {
  readonly deflection: Deflection;
  readonly limitMm: number;
  readonly middle: { readonly x: number; readonly y: number };
};

/** How a piece of a thickness bends between its standoffs; null with fewer than two of them, which it would turn on. */
function bendOf(
  standing: StandoffLayer,
  piece: PieceFigures,
  thickness: number,
  carried: Carried | undefined,
  { document, limits }: RuleInput,
): Bend | null {
  const places = standing.hold.holes.filter((hole) => pieceAt(standing, hole)?.pieceId === piece.pieceId);
  const pattern = holdingPattern(places, standing.hold.hardware.barrelDiameter / 2);
  const across = piece.smallestBox?.width;
  if (!pattern || !across || !carried) return null;
  const sheet = { ...acrylicSheet, thickness };
  const { longer } = pattern;
  const limit = deflectionLimitMm(longer, { mm: limits.bendMm, part: limits.bendPart });
  const isFour = pattern.kind === "four points";
  const shorter = isFour ? pattern.shorter : Math.min(longer, across);
  const held = isFour
    ? ({ kind: "four points", width: longer, height: shorter } as const)
    : ({ kind: "strip", reach: longer } as const);
  const lasting = { ...sheet, modulus: lastingShare * sheet.modulus };
  const weight = ((carried.massG / 1000) * standardGravity) / piece.areaMm2;
  const bent: Outcome<Deflection> =
    document.hanging.pose === "upright"
      ? pushDeflection(sheet, { width: longer, height: shorter }, limits.pushN)
      : sag(lasting, held, weight);
  if (!bent.ok || !limit.ok) return null;
  return { deflection: bent.value, limitMm: limit.value, middle: pattern.middle };
}

function findingOf(
  { layer }: StandoffLayer,
  piece: PieceFigures,
  { deflection, limitMm, middle }: Bend,
  { document, limits, context }: RuleInput,
): Finding[] {
  if (!bendsTooFar(deflection, limitMm)) return [];
  const mm = (length: number) => formatFine(length, context.unit);
  const value = deflection.kind === "figure" ? deflection.mm : deflection.overMm;
  const far =
    deflection.kind === "figure"
      ? `${deflection.upperEstimate ? "up to " : ""}${mm(value)}`
      : `more than ${mm(value)} (half its thickness, where the theory ends)`;
  const text =
    document.hanging.pose === "upright"
      ? `${layerWords(layer)} gives way by ${far} when it is pushed with ${newtonWords(limits.pushN)} between its standoffs; ${mm(limitMm)} is the limit. Thicker sheet or standoffs nearer each other make it stiffer.`
      : `${layerWords(layer)} sags by ${far} between its standoffs under its own weight in the long run; ${mm(limitMm)} is the limit, over which it is seen. Thicker sheet or standoffs nearer each other make it stiffer.`;
  return [
    foundBy(pushAndSag, {
      severity: "caution",
      text,
      layerKey: layer.key,
      pieceIds: [piece.pieceId],
      where: middle,
      value,
      limit: limitMm,
      unit: "mm",
      source,
    }),
  ];
}

/** The same acrylic in the least thickness on hand that is stiff enough. */
function mends(finding: Finding, input: RuleInput): Mend[] {
  const standing = standoffLayerOf(input, finding.layerKey);
  const piece = standing?.pieces.find(({ pieceId }) => pieceId === finding.pieceIds[0]);
  if (!standing || !piece) return [];
  const { layer } = standing;
  const carried = carriedMasses(input).get(piece.pieceId);
  const stocked = input.context.stock.acrylics
    .filter(({ acrylic }) => acrylic.name === layer.stock.name && acrylic.process === layer.stock.process)
    .flatMap(({ thicknessesMm }) => thicknessesMm)
    .toSorted((a, b) => a - b);
  const stiff = stocked.find((thickness) => {
    if (thickness <= layer.thickness || !carried) return false;
    // The panel itself weighs more too.
    const massG = carried.massG + piece.massG * (thickness / layer.thickness - 1);
    const bend = bendOf(standing, piece, thickness, { ...carried, massG }, input);
    return bend !== null && !bendsTooFar(bend.deflection, bend.limitMm);
  });
  if (stiff === undefined) return [];
  const label = `Take ${formatFine(stiff, input.context.unit)} sheet`;
  return [{ label, steps: [{ kind: "thickness", layerKey: layer.key, thickness: stiff }] }];
}
