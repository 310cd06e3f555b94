import { isShorter, lengthsEqual } from "../../geometry/tolerance.ts";
import { barrelAddsUp, nearestBarrel } from "../../hardware/barrel-offset.ts";
import { capStudGrip } from "../../hardware/grip.ts";
import { heldOffsetMm } from "../../hardware/standoff-parts.ts";
import { sheetBand } from "../../materials/sheet-tolerance.ts";
import type { Hardware, Hole, Layer } from "../../mockup/document.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { holdsPiece } from "../../stack/held-piece.ts";
import { formatFine, formatLengthWithUnit } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, layerWords } from "../words.ts";

const source = "arithmetic";

/** Rule 8: the cap tightens, the barrel is as long as the offset, and every piece has a standoff to hold it. */
export const grip: Rule = { number: 8, title: "Grip", check };

function check(input: RuleInput): Finding[] {
  return layersWithFigures(input).flatMap(({ layer, pieces }) => {
    if (layer.hold.kind !== "standoff") return [];
    const { hardware, holes, offset } = layer.hold;
    const figures = pieces.map((one) => one.figures);
    return [
      ...checkOffset(layer, hardware, offset, input),
      ...checkGrip(layer, hardware, holes, input),
      ...checkHeld(layer, hardware, holes, figures),
    ];
  });
}

function checkOffset(layer: Layer, hardware: Hardware, offset: number, { context, figures }: RuleInput): Finding[] {
  const mm = (length: number) => formatLengthWithUnit(length, context.unit);
  const where = figures.pieces.find((piece) => piece.layerKey === layer.key)?.centroid ?? null;
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

function checkGrip(layer: Layer, hardware: Hardware, holes: readonly Hole[], { context }: RuleInput): Finding[] {
  const [first] = holes;
  if (!first || hardware.kind !== "capStud") return [];
  const mm = (length: number) => formatFine(length, context.unit);
  const { least, most, needed, room } = capStudGrip(hardware, sheetBand(layer.stock.process, layer.thickness));
  const base = {
    severity: "stop" as const,
    layerKey: layer.key,
    where: { x: first.x, y: first.y },
    unit: "mm",
    source,
  };
  const stud = `The ${mm(hardware.studLength)} stud of ${hardware.name}`;
  if (isShorter(least, needed)) {
    const text = `${stud} has ${mm(Math.max(0, least))} left in the barrel when the sheet of ${layerWords(layer)} is at its thickest; one stud diameter, ${mm(needed)}, is the least. The cap pulls out.`;
    return [foundBy(grip, { ...base, text, value: least, limit: needed })];
  }
  if (isShorter(room, most)) {
    const text = `${stud} reaches ${mm(most)} into the barrel when the sheet of ${layerWords(layer)} is at its thinnest, but the bore has ${mm(room)} before the screw's head. The cap never tightens.`;
    return [foundBy(grip, { ...base, text, value: most, limit: room })];
  }
  return [];
}

function checkHeld(
  layer: Layer,
  hardware: Hardware,
  holes: readonly Hole[],
  pieces: readonly PieceFigures[],
): Finding[] {
  const loose = pieces.filter((piece) => !holes.some((hole) => holdsPiece(hardware, piece.region, hole)));
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
