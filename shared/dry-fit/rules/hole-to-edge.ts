import { passesPanel } from "../../hardware/standoff-parts.ts";
import type { Hole } from "../../mockup/document.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { type HoleEdgeFault, holeEdgeFault } from "../hole-edge-fault.ts";
import { moveHoleMends } from "../mends/move-hole.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { type StandoffLayer, standoffLayers } from "../standoff-layers.ts";
import { layerWords } from "../words.ts";

const source = "common practice";

/** Rule 7: enough material round a hole, and a piece at every standoff. */
export const holeToEdge: Rule = { number: 7, title: "Hole to edge", check, mends: moveHoleMends };

function check(input: RuleInput): Finding[] {
  return standoffLayers(input).flatMap((standing) =>
    standing.hold.holes.flatMap((hole) => {
      const fault = holeEdgeFault(standing, hole, input.limits);
      return fault ? [findingOf(standing, hole, fault, input)] : [];
    }),
  );
}

function findingOf({ layer, hold }: StandoffLayer, hole: Hole, fault: HoleEdgeFault, { context }: RuleInput): Finding {
  const where = { x: hole.x, y: hole.y };
  const base = { severity: "stop" as const, layerKey: layer.key, holeId: hole.id, where, source };
  if (fault.kind === "in no piece") {
    const what = passesPanel(hold.hardware) ? "A hole" : "A standoff";
    const text = `${what} of ${layerWords(layer)} lies in no piece of the layer: its standoff would hold nothing.`;
    return foundBy(holeToEdge, { ...base, text });
  }
  const mm = (length: number) => formatFine(length, context.unit);
  const { hasMm, needsMm, piece } = fault;
  const texts = {
    centre: `A hole of ${layerWords(layer)} lies ${mm(hasMm)} from an edge; its ${mm(hole.diameter)} ask for ${mm(needsMm)} from centre to edge, or the sheet cracks from the hole outward.`,
    web: `A hole of ${layerWords(layer)} leaves a web of ${mm(hasMm)}; at least the sheet's ${mm(needsMm)} are needed, or it breaks out.`,
    pad: `The middle of a hidden stud of ${layerWords(layer)} lies ${mm(hasMm)} from an edge; with less than ${mm(needsMm)} its foot looks out beside the panel.`,
  };
  const measured = { value: hasMm, limit: needsMm, unit: "mm" };
  return foundBy(holeToEdge, { ...base, ...measured, pieceIds: [piece.pieceId], text: texts[fault.kind] });
}
