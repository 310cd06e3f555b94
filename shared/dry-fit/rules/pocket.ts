import { bindingCorners, pocketGapMm } from "../../bonds/pocket-fit.ts";
import { pocketDepthToleranceMm, pocketFloor } from "../../bonds/pocket-floor.ts";
import { type Kernel, remembered } from "../../geometry/kernel.ts";
import type { Point } from "../../geometry/path.ts";
import { isShorter } from "../../geometry/tolerance.ts";
import { countOf } from "../../mockup/change.ts";
import type { Hold, Layer } from "../../mockup/document.ts";
import { faceStock } from "../../stack/backer.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { formatFine, formatLengthWithUnit } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { type JoinedLayer, joinedLayers, type PieceWithFigures, piecesOf } from "../joints.ts";
import type { Limits } from "../limits.ts";
import type { Mend } from "../mend.ts";
import { cutBand, deepestPocketMm } from "../pocket-depth.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layerWords, piecesWords } from "../words.ts";

type PocketHold = Extract<Hold, { kind: "pocket" }>;
type Pocketed = JoinedLayer & { readonly hold: PocketHold };

const source = "arithmetic; what must be left and the gap are common practice";

/** Rule 19: enough floor under a pocket, and a piece that goes in without rattling. */
export const pocket: Rule = { number: 19, title: "Pocket", check, mends };

function check(input: RuleInput): Finding[] {
  return pocketed(input).flatMap((one) => [...checkFloor(one, input), ...checkFit(one, input)]);
}

function pocketed(input: RuleInput): Pocketed[] {
  return joinedLayers(input).flatMap((one) => {
    const { hold } = one.layer;
    return hold.kind === "pocket" ? [{ ...one, hold }] : [];
  });
}

function checkFloor({ layer, hold, joints }: Pocketed, input: RuleInput): Finding[] {
  const mm = (length: number) => formatFine(length, input.context.unit);
  return joints.flatMap(({ under, pieces }): Finding[] => {
    const band = cutBand(under, input.document);
    const floor = pocketFloor(band, hold.depth, { share: input.limits.pocketFloorShare });
    if (!floor.ok || floor.value.holds) return [];
    const { floorMm, neededMm } = floor.value;
    const what = under ? layerWords(under) : `the ${faceStock(input.document.backer).name}`;
    const left = floorMm > 0 ? `can leave only ${mm(floorMm)} of` : "can come through";
    return [
      foundBy(pocket, {
        severity: "stop",
        text: `The ${mm(hold.depth)} pocket of ${layerWords(layer)}, cut ${mm(pocketDepthToleranceMm)} too deep, ${left} ${what} where it is at its thinnest, ${mm(band.least)}; ${mm(neededMm)} must be left, or the floor breaks through.`,
        layerKey: layer.key,
        pieceIds: pieces.map(({ piece }) => piece.id),
        where: pieces[0]?.figures.centroid ?? null,
        value: floorMm,
        limit: neededMm,
        unit: "mm",
        source,
      }),
    ];
  });
}

function gapOf(clearance: number, limits: Limits): number | null {
  const gap = pocketGapMm({ clearance, pieceKerf: limits.pieceKerfMm, pocketKerf: limits.pocketKerfMm });
  return gap.ok ? gap.value.gapMm : null;
}

function checkFit({ layer, hold, joints }: Pocketed, input: RuleInput): Finding[] {
  const { limits, context } = input;
  const mm = (length: number) => formatFine(length, context.unit);
  const gapMm = gapOf(hold.clearance, limits);
  if (gapMm === null) return [];
  const pieces = piecesOf(joints);
  const base = { severity: "stop" as const, layerKey: layer.key, source };
  const all = { pieceIds: pieces.map(({ piece }) => piece.id), where: pieces[0]?.figures.centroid ?? null, unit: "mm" };
  const made = `${mm(hold.clearance)} drawn and ${mm(gapMm - hold.clearance)} that the cutters take`;
  if (isShorter(gapMm, limits.pocketGapLeastMm)) {
    const text = `The pockets of ${layerWords(layer)} leave a gap of ${mm(gapMm)} a side, ${made}; ${mm(limits.pocketGapLeastMm)} is the least, or the pieces do not go in.`;
    return [foundBy(pocket, { ...base, ...all, text, value: gapMm, limit: limits.pocketGapLeastMm })];
  }
  if (isShorter(limits.pocketGapMostMm, gapMm)) {
    const text = `The pockets of ${layerWords(layer)} leave a gap of ${mm(gapMm)} a side, ${made}; ${mm(limits.pocketGapMostMm)} is the most, or the pieces rattle and the gap is seen.`;
    return [foundBy(pocket, { ...base, ...all, text, value: gapMm, limit: limits.pocketGapMostMm })];
  }
  return checkCorners(layer, hold, pieces, gapMm, input);
}

/** Corners of a piece that a round bit can't follow; they depend on its region alone. */
export function measureBinding(
  { region }: Pick<PieceFigures, "region">,
  fit: { readonly gapMm: number; readonly bitRadius: number },
  kernel: Kernel,
): Point[] {
  const { gapMm, bitRadius } = fit;
  const make = () => bindingCorners(region, gapMm, bitRadius, kernel);
  return remembered(kernel, region, `binding corners ${gapMm} ${bitRadius}`, make);
}

function checkCorners(
  layer: Layer,
  { cut, bitRadius }: PocketHold,
  pieces: readonly PieceWithFigures[],
  gapMm: number,
  { context, kernel }: RuleInput,
): Finding[] {
  if (cut !== "routed") return [];
  const binding = pieces
    .map((one) => ({ ...one, corners: measureBinding(one.figures, { gapMm, bitRadius }, kernel) }))
    .filter(({ corners }) => corners.length > 0);
  const corners = binding.flatMap((one) => one.corners);
  const [where] = corners;
  if (!where) return [];
  const radius = formatLengthWithUnit(bitRadius, context.unit);
  return [
    foundBy(pocket, {
      severity: "stop",
      text: `${piecesWords(layer, binding)} ${binding.length === 1 ? "does" : "do"} not go into the pockets that a bit of radius ${radius} cuts: ${countOf(corners.length, "corner")} ${corners.length === 1 ? "is" : "are"} sharper. Round them, take a thinner bit, or square the pockets by hand.`,
      layerKey: layer.key,
      pieceIds: binding.map(({ piece }) => piece.id),
      where,
      value: corners.length,
      limit: 0,
      source,
    }),
  ];
}

/** A shallower pocket leaves the floor, another clearance the gap; a sharp corner is the maker's to decide. */
function mends(finding: Finding, input: RuleInput): Mend[] {
  const found = pocketed(input).find(({ layer }) => layer.key === finding.layerKey);
  if (!found || finding.unit !== "mm") return [];
  const { layer, hold } = found;
  const mm = (length: number) => formatFine(length, input.context.unit);
  if (checkFloor(found, input).some(({ text }) => text === finding.text)) {
    const depth = deepestPocketMm(found.joints, input);
    if (depth < leastDepthMm) return [];
    const label = `Cut the pocket ${mm(depth)} deep`;
    return [{ label, steps: [{ kind: "pocket", layerKey: layer.key, depth, clearance: hold.clearance }] }];
  }
  const clearance = fittingClearance(input.limits);
  if (clearance === null) return [];
  const label = `Draw ${mm(clearance)} of clearance`;
  return [{ label, steps: [{ kind: "pocket", layerKey: layer.key, depth: hold.depth, clearance }] }];
}

/** A pocket shallower than this is a mark, not a pocket. */
const leastDepthMm = 0.3;

/** Clearance in whole hundredths whose gap lies in the middle of what fits, or as near to it as cutters leave it. */
function fittingClearance(limits: Limits): number | null {
  const middle = (limits.pocketGapLeastMm + limits.pocketGapMostMm) / 2;
  const kerfs = gapOf(0, limits);
  if (kerfs === null) return null;
  const clearance = Math.min(mostClearanceMm, Math.max(0, Math.round((middle - kerfs) * 100) / 100));
  const gap = kerfs + clearance;
  const fits = !isShorter(gap, limits.pocketGapLeastMm) && !isShorter(limits.pocketGapMostMm, gap);
  return fits ? clearance : null;
}

/** As the document takes it. */
const mostClearanceMm = 5;
