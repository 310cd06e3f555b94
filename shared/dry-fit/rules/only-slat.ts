import { isShorter } from "../../geometry/tolerance.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { otherLengthMends } from "../mends/screw-mends.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { drivenAt, fixingPlaces } from "../screw-at.ts";
import { type StandoffLayer, standoffLayers } from "../standoff-layers.ts";
import { type WoodGround, woodGround } from "../wood-at.ts";
import { fixingWords, layerWords } from "../words.ts";

const source = "common practice";

/** Rule 11: a standoff's screw or stud reaches through the slat into the substrate, since a slat is held by glue alone. */
export const onlySlat: Rule = { number: 11, title: "Held by the slat only", check, mends: otherLengthMends };

function check(input: RuleInput): Finding[] {
  if (!input.document.backer.slats) return [];
  const standing = standoffLayers(input);
  if (standing.length === 0) return [];
  const ground = woodGround(input);
  return standing.flatMap((one) => checkLayer(one, ground, input));
}

/** The shallowest of a layer's fixings stands for them all: they are the same, and so is what mends them. */
function checkLayer(standing: StandoffLayer, ground: WoodGround, input: RuleInput): Finding[] {
  const { layer, hold } = standing;
  const { limits, context } = input;
  const shallow = fixingPlaces(standing, input, ground).flatMap(({ hole, ...place }) => {
    const pastMm = drivenAt(place, hold.hardware, { offset: hold.offset, limits })?.pastSlatMm ?? null;
    return pastMm !== null && isShorter(pastMm, limits.slatHoldMm) ? [{ hole, pastMm }] : [];
  });
  const [first, ...others] = shallow;
  if (!first) return [];
  const { hole, pastMm } = others.reduce((least, one) => (one.pastMm < least.pastMm ? one : least), first);
  const mm = (length: number) => formatFine(length, context.unit);
  const comes = pastMm > 0 ? `comes ${mm(pastMm)} past the slat` : `ends ${mm(-pastMm)} short of the substrate`;
  return [
    foundBy(onlySlat, {
      severity: "stop",
      text: `${sentenceStart(fixingWords(hold.hardware))} of ${layerWords(layer)} ${comes}; ${mm(limits.slatHoldMm)} into the substrate is the least. Only glue holds a slat: the load pulls it off.`,
      layerKey: layer.key,
      holeId: hole.id,
      where: { x: hole.x, y: hole.y },
      value: pastMm,
      limit: limits.slatHoldMm,
      unit: "mm",
      source,
    }),
  ];
}

const sentenceStart = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);
