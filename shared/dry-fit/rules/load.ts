import type { Unproven } from "../../hardware/fixing-allowable.ts";
import type { Hardware } from "../../mockup/document.ts";
import type { PieceFigures } from "../../stack/figures.ts";
import { formatFine } from "../../units/format-length.ts";
import { formatMass } from "../../units/mass.ts";
import { type Carried, carriedMasses } from "../carried.ts";
import type { Finding } from "../finding.ts";
import { type FixingUse, fixingUse, isOver, tighter } from "../fixing-use.ts";
import type { Mend } from "../mend.ts";
import { otherLengthMends } from "../mends/screw-mends.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { type FixingPlace, fixingPlaces } from "../screw-at.ts";
import { type StandoffLayer, standoffLayerOf, standoffLayers } from "../standoff-layers.ts";
import { woodGround } from "../wood-at.ts";
import { fixingWords, layerWords, newtonWords, percentWords } from "../words.ts";

const source =
  "Wood Handbook (withdrawal: GTR-282, equation 8-10; across: table 8-4 before 1991, from memory); divisors: National Design Specification, our choice";

/**
 * Rule 12: what a panel and all that is on it asks of its standoffs, against what they may carry. A stop says that the
 * load is over that, or that nothing is in the wood. Outside the range of the published loads a load is reduced in
 * proportion where the sources say so (lateral.ts), else an estimate of ours (fixing-allowable.ts): a caution, once the
 * load is more than a share of it that the shop sets. Below that even a poor estimate will do, and a No. 6 × 16 under a
 * panel of a few hundred grams, 3.85 D deep, is at a hundredth of it.
 */
export const load: Rule = { number: 12, title: "Load on the standoffs", check, mends };

function check(input: RuleInput): Finding[] {
  const standing = standoffLayers(input);
  if (standing.length === 0) return [];
  const ground = woodGround(input);
  const carried = carriedMasses(input);
  return standing.flatMap((one) => {
    const places = fixingPlaces(one, input, ground);
    return one.pieces.flatMap((piece) => {
      const own = places.filter((place) => place.piece.pieceId === piece.pieceId);
      const loaded = carried.get(piece.pieceId);
      return loaded ? checkPiece(one, { piece, places: own, carried: loaded }, input) : [];
    });
  });
}

type Panel = { readonly piece: PieceFigures; readonly places: readonly FixingPlace[]; readonly carried: Carried };

function checkPiece({ layer, hold }: StandoffLayer, { piece, places, carried }: Panel, input: RuleInput): Finding[] {
  const use = fixingUse(places, hold, carried, input);
  const upper = places.toSorted((a, b) => a.hole.y - b.hole.y)[0];
  if (!use || !upper) return [];
  const { hole } = upper;
  const base = { layerKey: layer.key, pieceIds: [piece.pieceId], where: { x: hole.x, y: hole.y }, source };
  const name = layerWords(layer);
  const beside = places.find(({ wood }) => wood === null)?.hole;
  if (beside) {
    const text = `A standoff of ${name} stands beside the board: there is no wood that would hold it.`;
    const where = { x: beside.x, y: beside.y };
    return [foundBy(load, { ...base, where, holeId: beside.id, severity: "stop", text })];
  }
  if (!(use.holdingMm > 0)) {
    // What ends in a slat is a stop of rule 11.
    if (input.document.backer.slats) return [];
    const short = formatFine(-use.holdingMm, input.context.unit);
    const text = `${sentenceStart(fixingWords(hold.hardware))} of ${name} ends ${short} short of the wood: nothing holds the panel.`;
    return [foundBy(load, { ...base, severity: "stop", text, value: use.holdingMm, limit: 0, unit: "mm" })];
  }
  const way = tighter(use);
  const { loadN, mayN } = use[way];
  const weight = `${name} and what is on it weighs ${formatMass(carried.massG, input.context.unit)}: that ${askWords(way, use)} ${newtonWords(loadN)}`;
  const depth = `${formatFine(use.holdingMm, input.context.unit)} deep in ${input.document.backer.slats ? "this substrate" : "this wood"}`;
  if (isOver(use[way])) {
    const text = `${weight}, and ${depth} one may carry ${newtonWords(mayN)}. Take more standoffs, longer screws or a lighter panel.`;
    return [foundBy(load, { ...base, severity: "stop", text, value: loadN, limit: mayN, unit: "N" })];
  }
  const share = input.limits.unprovenLoadShare;
  if (use.unproven.length === 0 || !isOver(use[way], share)) return [];
  const reasons = use.unproven.map((reason) => reasonWords(reason, hold.hardware, use.holdingMm)).join("; ");
  const text = `${weight}, over ${percentWords(share)} of the ${newtonWords(mayN)} that we estimate for one, ${depth}. No published load covers it: ${reasons}. Try one on scrap.`;
  return [foundBy(load, { ...base, severity: "caution", text, value: loadN, limit: share * mayN, unit: "N" })];
}

function askWords(way: "across" | "along", { rows }: FixingUse): string {
  if (way === "across")
    return rows.fixings === 1 ? "bears on its one standoff with" : `bears on each of ${rows.fixings} standoffs with`;
  return rows.upper === 1
    ? "pulls at its upper standoff with"
    : `pulls at each of its ${rows.upper} upper standoffs with`;
}

function reasonWords(reason: Unproven, hardware: Hardware, inWoodMm: number): string {
  const diameter = hardware.kind === "blindStud" ? hardware.studDiameter : hardware.screw.diameter;
  switch (reason) {
    case "shallow":
      return `it is in the wood by ${Number((inWoodMm / diameter).toFixed(2))} of its diameters, and none counts on fewer than 4`;
    case "size":
      return "its size is not among those that were tested";
    case "glued stud":
      return "it is glued, not screwed";
    case "light wood":
      return "the wood is lighter than any that was tested";
  }
}

/** A screw that carries the load as it stands, so that the finding goes. */
function mends(finding: Finding, input: RuleInput): Mend[] {
  const standing = standoffLayerOf(input, finding.layerKey);
  if (!standing || finding.holeId !== null) return [];
  const carried = carriedMasses(input);
  const { offset } = standing.hold;
  const suffices = (hardware: Hardware): boolean =>
    standing.pieces.every((piece) => {
      const places = fixingPlaces({ ...standing, hold: { ...standing.hold, hardware } }, input);
      const own = places.filter((place) => place.piece.pieceId === piece.pieceId);
      const loaded = carried.get(piece.pieceId);
      const use = loaded && fixingUse(own, { hardware, offset }, loaded, input);
      if (!use) return true;
      const share = use.unproven.length > 0 ? input.limits.unprovenLoadShare : 1;
      return use.holdingMm > 0 && !isOver(use[tighter(use)], share);
    });
  return otherLengthMends(finding, input, suffices);
}

const sentenceStart = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);
