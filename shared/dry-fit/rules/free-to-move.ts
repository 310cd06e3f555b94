import { isShorter } from "../../geometry/tolerance.ts";
import { edgeOverlapMm } from "../../hardware/edge-grip.ts";
import { patternFaults } from "../../hardware/hole-pattern.ts";
import { passesPanel } from "../../hardware/standoff-parts.ts";
import type { Hole } from "../../mockup/document.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import type { Mend } from "../mend.ts";
import { fixedHoleMend, holesFromMiddle } from "../mends/hardware-mend.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { pieceAt, type StandoffLayer, standoffLayerOf, standoffLayers } from "../standoff-layers.ts";
import { movementAtMm } from "../window-of-hole.ts";
import { layerWords } from "../words.ts";

const source = "common practice";

/**
 * Rule 16: a panel is held at one place and free to move from there. Holes without enough play are the hole window's
 * (rule 6); studs and grips, which have none, are measured from their middle.
 */
export const freeToMove: Rule = { number: 16, title: "Free to move", check, mends };

function check(input: RuleInput): Finding[] {
  return standoffLayers(input).flatMap((standing) => {
    const { hardware, holes } = standing.hold;
    if (holes.length < 2) return [];
    if (passesPanel(hardware)) return checkFixed(standing);
    return hardware.kind === "edgeGrip" ? checkGrips(standing, input) : checkStuds(standing, input);
  });
}

const at = ({ x, y }: Hole) => ({ x, y });

function checkFixed({ layer, hold }: StandoffLayer): Finding[] {
  const [fault] = patternFaults(hold.holes.map((hole) => ({ ...hole, least: 0 })));
  const [middle] = holesFromMiddle(hold.holes);
  if (!fault || !middle || fault.kind === "no play") return [];
  const fixed = fault.kind === "several fixed" ? fault.ids.length : 0;
  const text =
    fixed === 0
      ? `No hole of ${layerWords(layer)} is the fixed one: the panel settles anywhere in its play. Make the one nearest the middle the fixed one.`
      : `${fixed} holes of ${layerWords(layer)} are fixed ones: as the panel grows they hold it against each other, and it cracks. Keep the one nearest the middle.`;
  return [
    foundBy(freeToMove, {
      severity: "caution",
      text,
      layerKey: layer.key,
      where: at(middle),
      value: fixed,
      limit: 1,
      source,
    }),
  ];
}

/** The place of a list where the movement from their middle is the most. */
function farthest(holes: readonly Hole[], input: RuleInput): { readonly hole: Hole; readonly movement: number } | null {
  const x = holes.reduce((sum, hole) => sum + hole.x, 0) / holes.length;
  const y = holes.reduce((sum, hole) => sum + hole.y, 0) / holes.length;
  const moved = holes.map((hole) => ({ hole, movement: movementAtMm({ x, y }, hole, input) }));
  return moved.reduce<(typeof moved)[number] | null>(
    (most, one) => (!most || one.movement > most.movement ? one : most),
    null,
  );
}

function checkStuds({ layer, hold }: StandoffLayer, input: RuleInput): Finding[] {
  const most = farthest(hold.holes, input);
  const limit = input.limits.studGiveMm;
  if (!most || !isShorter(limit, most.movement)) return [];
  const mm = (length: number) => formatFine(length, input.context.unit);
  const text = `The panel moves ${mm(most.movement)} against the wood at the outermost glued stud of ${layerWords(layer)}; a stud takes ${mm(limit)} by bending, and has no play. Bring the studs nearer each other, or take standoffs whose holes have play.`;
  return [
    foundBy(freeToMove, {
      severity: "caution",
      text,
      layerKey: layer.key,
      holeId: most.hole.id,
      where: at(most.hole),
      value: most.movement,
      limit,
      unit: "mm",
      source,
    }),
  ];
}

function checkGrips(standing: StandoffLayer, input: RuleInput): Finding[] {
  const { layer, hold } = standing;
  const most = farthest(hold.holes, input);
  const piece = most && pieceAt(standing, most.hole);
  if (!most || !piece) return [];
  const overlap = edgeOverlapMm(hold.hardware.barrelDiameter, piece.region, most.hole);
  const left = overlap - most.movement;
  const limit = input.limits.edgeGripMm;
  // An overlap that is too small on any day is a stop of rule 8.
  if (isShorter(overlap, limit) || !isShorter(left, limit)) return [];
  const mm = (length: number) => formatFine(length, input.context.unit);
  const text = `An edge grip of ${layerWords(layer)} reaches ${mm(overlap)} over the edge, and the panel can draw back ${mm(most.movement)} from it: ${mm(Math.max(0, left))} are left, ${mm(limit)} is the least. The panel can slip out.`;
  return [
    foundBy(freeToMove, {
      severity: "caution",
      text,
      layerKey: layer.key,
      holeId: most.hole.id,
      where: at(most.hole),
      value: left,
      limit,
      unit: "mm",
      source,
    }),
  ];
}

function mends({ layerKey, holeId }: Finding, input: RuleInput): Mend[] {
  const standing = standoffLayerOf(input, layerKey);
  if (!standing || holeId !== null) return [];
  const [middle] = holesFromMiddle(standing.hold.holes);
  return middle ? [fixedHoleMend(standing, middle, input)] : [];
}
