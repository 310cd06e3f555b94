import { isShorter } from "../../geometry/tolerance.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { otherLengthMends } from "../mends/screw-mends.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { drivenAt, fixingPlaces } from "../screw-at.ts";
import { type StandoffLayer, standoffLayers } from "../standoff-layers.ts";
import { type WoodGround, woodGround } from "../wood-at.ts";
import { fixingWords, layerWords } from "../words.ts";

const source = "arithmetic; allowances are common practice";

/** Rule 10: screws and studs stay in the wood. */
export const breakThrough: Rule = { number: 10, title: "Break-through", check, mends: otherLengthMends };

function check(input: RuleInput): Finding[] {
  const standing = standoffLayers(input);
  if (standing.length === 0) return [];
  const ground = woodGround(input);
  return standing.flatMap((one) => checkLayer(one, ground, input));
}

/** The deepest of a layer's fixings stands for them all: they are the same, and so is what mends them. */
function checkLayer(standing: StandoffLayer, ground: WoodGround, input: RuleInput): Finding[] {
  const { layer, hold } = standing;
  const { limits, context } = input;
  const driven = fixingPlaces(standing, input, ground).flatMap((place) => {
    const reach = drivenAt(place, hold.hardware, { offset: hold.offset, limits });
    return reach && isShorter(reach.leftMm, 0) ? [{ ...place, reach }] : [];
  });
  const [first, ...others] = driven;
  if (!first) return [];
  const { hole, reach, wood } = others.reduce(
    (most, one) => (one.reach.leftMm < most.reach.leftMm ? one : most),
    first,
  );
  const mm = (length: number) => formatFine(length, context.unit);
  const opened = reach.mostMm - reach.leftMm;
  const thick = wood ? wood.slat + wood.substrate : 0;
  const drilled = hold.hardware.kind === "blindStud" ? "The hole for" : "";
  const what = `${drilled} ${fixingWords(hold.hardware)} of ${layerWords(layer)}`.trim();
  const why = isShorter(opened, thick) ? "It can show or bulge at the back" : "It comes out at the back";
  return [
    foundBy(breakThrough, {
      severity: "stop",
      text: `${capitalised(what)} comes ${mm(opened)} into the wood; ${mm(reach.mostMm)} is the most: ${mm(thick)} less ${mm(limits.sandingMm)} for sanding and ${mm(limits.skinMm)} left under the point. ${why}.`,
      layerKey: layer.key,
      holeId: hole.id,
      where: { x: hole.x, y: hole.y },
      value: opened,
      limit: reach.mostMm,
      unit: "mm",
      source,
    }),
  ];
}

const capitalised = (text: string): string => text.slice(0, 1).toUpperCase() + text.slice(1);
