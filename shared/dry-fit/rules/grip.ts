import { regionCentroid } from "../../geometry/area.ts";
import { lengthsEqual } from "../../geometry/tolerance.ts";
import { barrelAddsUp, nearestBarrel } from "../../hardware/barrel-offset.ts";
import { heldOffsetMm } from "../../hardware/standoff-parts.ts";
import type { Hardware } from "../../mockup/document.ts";
import { holdsPiece } from "../../stack/held-piece.ts";
import { formatFine, formatLengthWithUnit } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { type GripFault, gripFault, overlapFault } from "../grip-fault.ts";
import { gripMends } from "../mends/grip-mends.ts";
import { heldPlaces } from "../on-panel.ts";
import { partsOfPiece } from "../parts-of-piece.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { pieceAt, type StandoffLayer, standoffLayers } from "../standoff-layers.ts";
import { layerWords, pieceWords } from "../words.ts";

const source = "arithmetic; how much grip is enough is common practice";

/** Rule 8: a standoff grips, it is as high as the offset, and every piece, and every part of it, has one to hold it. */
export const grip: Rule = { number: 8, title: "Grip", check, mends: gripMends };

function check(input: RuleInput): Finding[] {
  return standoffLayers(input).flatMap((standing) => [
    ...checkOffset(standing, input),
    ...checkGrip(standing, input),
    ...checkHeld(standing),
    ...checkParts(standing, input),
  ]);
}

function checkOffset({ layer, hold, pieces }: StandoffLayer, { context }: RuleInput): Finding[] {
  const { hardware, offset } = hold;
  const mm = (length: number) => formatLengthWithUnit(length, context.unit);
  const where = pieces[0]?.centroid ?? null;
  const base = { severity: "stop" as const, layerKey: layer.key, where, unit: "mm", source };
  if (hardware.kind === "capStud" && !barrelAddsUp(hardware)) {
    const sum = hardware.boreDepth + hardware.floorThickness;
    const text = `The barrel of ${hardware.name} is ${mm(hardware.barrelLength)} long, but its bore and floor make ${mm(sum)}: one of its measures is wrong.`;
    return [foundBy(grip, { ...base, text, value: sum, limit: hardware.barrelLength })];
  }
  const held = heldOffsetMm(hardware);
  if (held === null || lengthsEqual(offset, held, 0.05)) return [];
  const barrels = context.stock.hardware.map((one) => one.hardware).filter(({ kind }) => kind === hardware.kind);
  const alike = barrels.filter((barrel) => barrel.barrelDiameter === hardware.barrelDiameter);
  const other = nearestBarrel(offset, alike.length > 0 ? alike : barrels);
  const offer = other ? ` The nearest barrel on hand is ${mm(other.barrelLength)}.` : "";
  const text = `${layerWords(layer)} is drawn ${mm(offset)} off, but its barrel holds it at ${mm(held)}, and that is where the panel comes to lie.${offer}`;
  return [foundBy(grip, { ...base, text, value: offset, limit: held })];
}

/** Standoffs that fail alike are one finding, at the first of them; those of an edge grip depend on their place. */
function checkGrip(standing: StandoffLayer, input: RuleInput): Finding[] {
  const { layer, hold } = standing;
  const { hardware, offset } = hold;
  const found = new Map<string, Finding>();
  for (const { hole, piece, stack } of heldPlaces(standing, input)) {
    const loose = gripFault(hardware, { stack, offset }, input.limits);
    const misses = overlapFault(hardware, piece, hole, input.limits);
    for (const { fault, pieceIds } of [
      { fault: loose, pieceIds: [] },
      { fault: misses, pieceIds: [piece.pieceId] },
    ]) {
      if (!fault) continue;
      const finding = foundBy(grip, {
        severity: "stop",
        text: textOf(fault, hardware, layerWords(layer), (length) => formatFine(length, input.context.unit)),
        layerKey: layer.key,
        pieceIds,
        holeId: hole.id,
        where: { x: hole.x, y: hole.y },
        value: fault.valueMm,
        limit: fault.limitMm,
        unit: "mm",
        source,
      });
      if (!found.has(finding.text)) found.set(finding.text, finding);
    }
  }
  return [...found.values()];
}

function textOf(
  { kind, valueMm, limitMm }: GripFault,
  hardware: Hardware,
  layer: string,
  mm: (length: number) => string,
) {
  const value = mm(Math.max(0, valueMm));
  const limit = mm(limitMm);
  const stud = "studLength" in hardware ? `The ${mm(hardware.studLength)} stud of ${hardware.name}` : "";
  switch (kind) {
    case "stud too short":
      return `${stud} at ${layer} has ${value} left in the barrel when all that lies under its cap is at its thickest; ${limit} is the least. The cap pulls out.`;
    case "stud too long":
      return `${stud} at ${layer} reaches ${value} into the barrel when all that lies under its cap is at its thinnest, but the bore has ${limit} before the screw's head. The cap never tightens.`;
    case "stud not in the wood":
      return `${stud} comes ${value} into the wood under ${layer}; ${limit} is the least that glue holds it by.`;
    case "slot too narrow":
      return `The slot of ${hardware.name} is ${value} wide; the sheet of ${layer} can measure ${limit}, and then it does not go in.`;
    case "slot too wide":
      return `The slot of ${hardware.name} is ${value} wider than the sheet of ${layer} at its thinnest; up to ${limit} a gasket or set screw takes up. The panel rattles.`;
    case "overlap too small":
      return `An edge grip reaches ${value} over the edge of ${layer}; ${limit} is the least. The panel slips out.`;
    case "overlap too deep":
      return `An edge grip is set ${value} over the edge of ${layer}, but its slot is only ${limit} deep: the panel does not go in.`;
  }
}

function checkHeld(standing: StandoffLayer): Finding[] {
  const { layer, hold, pieces } = standing;
  const held = new Set(hold.holes.map((hole) => pieceAt(standing, hole)?.pieceId));
  const loose = pieces.filter(({ pieceId }) => !held.has(pieceId));
  const [first] = loose;
  if (!first) return [];
  const which = loose.length === 1 ? "A piece" : `${loose.length} pieces`;
  return [
    foundBy(grip, {
      severity: "stop",
      text: `${which} of ${layerWords(layer)} ${loose.length === 1 ? "has" : "have"} no standoff: nothing holds ${loose.length === 1 ? "it" : "them"}. Set holes, or hold the layer otherwise.`,
      layerKey: layer.key,
      pieceIds: loose.map((piece) => piece.pieceId),
      where: first.centroid,
      value: loose.length,
      limit: 0,
      source,
    }),
  ];
}

/** Of a letter as i the dot falls off when only the stem has a standoff. */
function checkParts(standing: StandoffLayer, { kernel }: RuleInput): Finding[] {
  const { layer, hold, pieces } = standing;
  const held = new Set(hold.holes.map((hole) => pieceAt(standing, hole)?.pieceId));
  return pieces.flatMap((figures): Finding[] => {
    const parts = held.has(figures.pieceId) ? partsOfPiece(figures, kernel) : [];
    const loose = parts.filter((part) => !hold.holes.some((hole) => holdsPiece(hold.hardware, part, hole)));
    const piece = layer.pieces.find(({ id }) => id === figures.pieceId);
    const [first] = loose;
    if (parts.length < 2 || !first || !piece) return [];
    const some = loose.length === 1 ? "one of them has" : `${loose.length} of them have`;
    return [
      foundBy(grip, {
        severity: "stop",
        text: `${pieceWords(layer, piece)} is ${parts.length} parts, and ${some} no standoff: nothing holds ${loose.length === 1 ? "it" : "them"}. Set a hole in each part, or bond the layer.`,
        layerKey: layer.key,
        pieceIds: [figures.pieceId],
        where: regionCentroid(first),
        value: loose.length,
        limit: 0,
        source,
      }),
    ];
  });
}
