import { isShorter } from "../../geometry/tolerance.ts";
import { jointUnder } from "../../hardware/barrel-foot.ts";
import type { Hole } from "../../mockup/document.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { type FootGround, footGround, footShare } from "../foot-share.ts";
import { moveHoleMends } from "../mends/move-hole.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";
import { pieceAt, type StandoffLayer, standoffLayers } from "../standoff-layers.ts";
import { layerWords, percentWords } from "../words.ts";

const source = "common practice";

/**
 * Rule 14: a barrel's foot stands on what it is screwed to, and over no open joint between slats. Brads give way to barrels
 * (brad-map.ts), so that none is nearer to a screw than the shop's limit.
 */
export const footOnWood: Rule = { number: 14, title: "Barrel's foot", check, mends: moveHoleMends };

function check(input: RuleInput): Finding[] {
  return standoffLayers(input).flatMap((standing) => checkLayer(standing, input));
}

function checkLayer(standing: StandoffLayer, input: RuleInput): Finding[] {
  const { layer, hold } = standing;
  const least = input.limits.footShare;
  const grounds = new Map<string, FootGround>();
  return hold.holes.flatMap((hole): Finding[] => {
    const piece = pieceAt(standing, hole);
    if (!piece) return [];
    const ground = grounds.get(piece.pieceId) ?? footGround(standing, piece, input);
    grounds.set(piece.pieceId, ground);
    const share = footShare(hole, hold.hardware.barrelDiameter, ground, input);
    if (!isShorter(share, least)) return overJoint(standing, hole, ground, input);
    const on = ground.onBoard ? "wood" : "what is under it";
    return [
      foundBy(footOnWood, {
        severity: "caution",
        text: `${percentWords(share)} of a barrel's foot of ${layerWords(layer)} stands on ${on}; ${percentWords(least)} is the least, or it tilts as its screw is tightened.`,
        layerKey: layer.key,
        holeId: hole.id,
        where: { x: hole.x, y: hole.y },
        value: share * 100,
        limit: least * 100,
        unit: "%",
        source,
      }),
    ];
  });
}

function overJoint({ layer, hold }: StandoffLayer, hole: Hole, ground: FootGround, { context }: RuleInput): Finding[] {
  const under = jointUnder({ x: hole.x, y: hole.y, diameter: hold.hardware.barrelDiameter }, ground.openJoints);
  if (!under) return [];
  const mm = (length: number) => formatFine(length, context.unit);
  return [
    foundBy(footOnWood, {
      severity: "caution",
      text: `A barrel's foot of ${layerWords(layer)} stands over an open joint between slats, its middle ${mm(under.distanceMm)} from the joint's; from ${mm(under.neededMm)} on it clears it. Tightened over a joint it presses on the edges of the slats, and the joint shows beside it.`,
      layerKey: layer.key,
      holeId: hole.id,
      where: { x: hole.x, y: hole.y },
      value: under.distanceMm,
      limit: under.neededMm,
      unit: "mm",
      source,
    }),
  ];
}
