import { isShorter } from "../../geometry/tolerance.ts";
import { holeEdge } from "../../hardware/hole-edge.ts";
import type { Hole, Layer } from "../../mockup/document.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { layersWithFigures, layerWords } from "../words.ts";

const source = "common practice";

/** Rule 7: enough material round a hole. */
export const holeToEdge: Rule = { number: 7, title: "Hole to edge", check };

function check(input: RuleInput): Finding[] {
  return layersWithFigures(input).flatMap(({ layer, pieces }) => {
    if (layer.hold.kind !== "standoff") return [];
    const figures = pieces.map((one) => one.figures);
    return layer.hold.holes.flatMap((hole) => checkHole(layer, hole, figures, input));
  });
}

function checkHole(layer: Layer, hole: Hole, pieces: readonly PieceFigures[], input: RuleInput): Finding[] {
  if (layer.hold.kind !== "standoff") return [];
  const { limits, context } = input;
  const mm = (length: number) => formatFine(length, context.unit);
  const others = layer.hold.holes.filter((other) => other.id !== hole.id);
  const where = { x: hole.x, y: hole.y };
  const base = { severity: "stop" as const, layerKey: layer.key, holeId: hole.id, where, source };
  for (const piece of pieces) {
    const edge = holeEdge(hole, piece.region, others);
    if (!edge) continue;
    const pieceIds = [piece.pieceId];
    const nearest = limits.edgeDiameters * hole.diameter;
    const web = limits.webThicknesses * layer.thickness;
    if (isShorter(edge.centreMm, nearest)) {
      const text = `A hole of ${layerWords(layer)} lies ${mm(edge.centreMm)} from an edge; its ${mm(hole.diameter)} ask for ${mm(nearest)} from centre to edge, or the sheet cracks from the hole outward.`;
      return [foundBy(holeToEdge, { ...base, pieceIds, text, value: edge.centreMm, limit: nearest, unit: "mm" })];
    }
    if (isShorter(edge.webMm, web)) {
      const text = `A hole of ${layerWords(layer)} leaves a web of ${mm(edge.webMm)}; at least the sheet's ${mm(web)} are needed, or it breaks out.`;
      return [foundBy(holeToEdge, { ...base, pieceIds, text, value: edge.webMm, limit: web, unit: "mm" })];
    }
    return [];
  }
  const text = `A hole of ${layerWords(layer)} lies in no piece of the layer: its standoff would hold nothing.`;
  return [foundBy(holeToEdge, { ...base, text })];
}
