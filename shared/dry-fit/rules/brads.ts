import { frameBrads } from "../../frame/frame-brads.ts";
import { isShorter } from "../../geometry/tolerance.ts";
import { countOf } from "../../mockup/change.ts";
import { bradReach } from "../../slats/brad-checks.ts";
import type { SlatLayout } from "../../slats/slat-layout.ts";
import { frameOf, slatsOf } from "../../stack/backer.ts";
import { bradsOf } from "../../stack/brads-of.ts";
import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";

const source = "common practice";
/** How many slats a finding names before it only counts. */
const mostNamed = 8;

/**
 * Rule 31: brads reach far enough past the slats and stay in the wood, none is so near to the trim line that the blade meets
 * it, and a frame's brads reach into the board's edge. Slats that leave no room for one are told.
 */
export const brads: Rule = { number: 31, title: "Brads", check };

function check(input: RuleInput): Finding[] {
  return [...checkReach(input), ...checkRoom(input), ...checkFrame(input)];
}

function checkReach({ document, limits, context }: RuleInput): Finding[] {
  const { slats, thickness } = document.backer;
  if (!slats) return [];
  const { bradLengthMm: length, bradHoldMm: needed, sandingMm, skinMm } = limits;
  const under = {
    slat: slats.thickness,
    substrate: thickness,
    sanding: Math.min(sandingMm, slats.thickness),
    skin: skinMm,
  };
  const reach = bradReach(length, under, needed);
  if (!reach.ok) return [];
  const { pastSlatMm, leftMm, onlySlat } = reach.value;
  const mm = (one: number) => formatFine(one, context.unit);
  const shortest = length + needed - pastSlatMm;
  const longest = length + leftMm;
  const fitting = isShorter(longest, shortest)
    ? "No length does both: take a thicker substrate or thinner slats."
    : `Take brads of ${mm(shortest)} to ${mm(longest)}.`;
  const base = { severity: "caution" as const, where: middleOf(document.board), unit: "mm", source };
  const findings: Finding[] = [];
  if (onlySlat) {
    const comes = pastSlatMm > 0 ? `comes ${mm(pastSlatMm)} past the slats` : "ends in the slats";
    const text = `A brad of ${mm(length)} ${comes}; ${mm(needed)} into the substrate is the least, or it holds nothing while the glue sets. ${fitting}`;
    findings.push(foundBy(brads, { ...base, text, value: pastSlatMm, limit: needed }));
  }
  if (isShorter(leftMm, 0)) {
    const text = `A brad of ${mm(length)} comes too deep by ${mm(-leftMm)}: ${mm(skinMm)} must be left under its point, or it shows at the back. ${fitting}`;
    findings.push(foundBy(brads, { ...base, text, value: leftMm, limit: 0 }));
  }
  return findings;
}

function checkRoom({ document, limits, kernel, context }: RuleInput): Finding[] {
  const laid = slatsOf(document, kernel);
  if (!laid?.ok) return [];
  const spacing = { trim: limits.bradTrimMm, barrel: limits.footBradMm };
  const map = bradsOf(document, laid.value, spacing, kernel);
  if (!map.ok || map.value.without.length === 0) return [];
  const { without } = map.value;
  const mm = (one: number) => formatFine(one, context.unit);
  const them = without.length === 1 ? "it" : "them";
  return [
    foundBy(brads, {
      severity: "remark",
      text: `${bareWords(without)} ${without.length === 1 ? "takes" : "take"} no brad that keeps ${mm(spacing.trim)} inside the trim line, where the blade runs, and off joints and screws. Glue and clamp ${them}.`,
      where: slatMiddle(laid.value, without[0] ?? 0),
      value: without.length,
      limit: 0,
      source,
    }),
  ];
}

/** "Slat 7", "Slats 1, 2 and 26", "The spine and 72 slats". */
function bareWords(orders: readonly number[]): string {
  const numbers = orders.filter((order) => order > 0);
  const listed = numbers.length === 1 ? `slat ${numbers[0]}` : `slats ${inRow(numbers.map(String))}`;
  const slats = numbers.length > mostNamed ? countOf(numbers.length, "slat") : listed;
  const words = [...(orders.includes(0) ? ["the spine"] : []), ...(numbers.length === 0 ? [] : [slats])];
  const text = words.join(" and ");
  return text.slice(0, 1).toUpperCase() + text.slice(1);
}

const inRow = (words: readonly string[]): string => `${words.slice(0, -1).join(", ")} and ${words.at(-1)}`;

function slatMiddle({ slats, spine, body }: SlatLayout, order: number): Finding["where"] {
  const axis = slats.find((slat) => slat.order === order)?.axis;
  if (axis) return { x: (axis.from.x + axis.to.x) / 2, y: (axis.from.y + axis.to.y) / 2 };
  return spine?.untrimmed[0] ?? body[0]?.[0] ?? null;
}

function checkFrame({ document, limits, kernel, context }: RuleInput): Finding[] {
  const round = frameOf(document, kernel);
  const { frame, backer, board } = document;
  if (!frame || !round?.ok) return [];
  const { frameBradLengthMm: length, frameBradHoldMm: needed } = limits;
  const driven = frameBrads(round.value, { length, frameWidth: frame.width, substrate: backer.thickness });
  if (!driven.ok || !isShorter(driven.value.intoEdgeMm, needed)) return [];
  const { intoEdgeMm } = driven.value;
  const mm = (one: number) => formatFine(one, context.unit);
  const comes = intoEdgeMm > 0 ? `comes ${mm(intoEdgeMm)} into the board's edge` : "does not come through it";
  return [
    foundBy(brads, {
      severity: "caution",
      text: `A brad of ${mm(length)} through the ${mm(frame.width)} frame ${comes}; ${mm(needed)} is the least. Take brads of ${mm(length + needed - intoEdgeMm)} or more, screws, or a narrower frame.`,
      where: round.value.members[0]?.from ?? middleOf(board),
      value: intoEdgeMm,
      limit: needed,
      unit: "mm",
      source,
    }),
  ];
}

const middleOf = ({ width, height }: { readonly width: number; readonly height: number }) => ({
  x: width / 2,
  y: height / 2,
});
