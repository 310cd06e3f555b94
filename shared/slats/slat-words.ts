import { isShorter } from "../geometry/tolerance.ts";
import { formatLengthWithUnit } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import type { OutOfRange } from "../units/outcome.ts";
import type { StartChoice } from "./choose-start.ts";
import type { SlatDesign } from "./slat-layout.ts";

/** Lengths that a refusal may be about, in a sentence. */
const lengths: Readonly<Record<string, string>> = {
  boardWidth: "The board's width",
  boardHeight: "The board's height",
  slatWidth: "The slats' width",
  gap: "The gap between slats",
  spineWidth: "The spine's width",
  spineOffset: "The spine's distance from the middle",
  startHeight: "The height of the first slat",
  overhang: "The overhang",
  outlineWidth: "The outline's width",
  outlineHeight: "The outline's height",
  outlineLeft: "The outline's left edge",
  outlineTop: "The outline's upper edge",
  trim: "The brads' distance from the trim line",
  joint: "The brads' distance from joints",
  barrel: "The brads' distance from barrels",
  apart: "The distance from brad to brad",
  kerf: "The saw's kerf",
};

/** Why slats can't be laid, in a sentence that says what to change. */
export function slatRefusalWords({ field, value, range }: OutOfRange, unit: LengthUnit): string {
  const mm = (length: number) => formatLengthWithUnit(length, unit);
  if (field === "angle")
    return `Slats stand at ${range.least} to ${range.most} degrees to the spine${given(value, `${value}`)}.`;
  if (field === "slats")
    return `That is about ${value} slats, and a board takes ${range.most} at most: choose wider ones or a wider gap.`;
  if (field === "outlinePoints")
    return `The board's outline has ${value} points: it takes ${range.least} to ${range.most}. Simplify it.`;
  if (field === "outlineParts")
    return "The board's outline is too jagged for slats this narrow: simplify it, or choose wider ones.";
  if (field === "slatWidth" && value > range.most)
    return `A slat of ${mm(value)} is wider than the board: choose ${mm(range.most)} at most.`;
  if (field === "gap" && value > range.most)
    return `A gap of ${mm(value)} is wider than the slats of ${mm(range.most)}: choose a narrower one.`;
  if (range.most < range.least) return "The board is too narrow for slats on both sides of a spine.";
  const name = lengths[field] ?? "A measure of the slats";
  return `${name} must lie between ${mm(range.least)} and ${mm(range.most)}${given(value, mm(value))}.`;
}

/** Where a start is measured, and from which edge. */
export const startPlace = ({ pattern, direction }: Pick<SlatDesign, "pattern" | "direction">) =>
  ({ edge: direction === "up" ? "lower" : "upper", at: pattern === "single" ? "left edge" : "spine" }) as const;

/** What a start leaves, and whether another would leave more. */
export function startWords(
  { current, best, isSliverFree }: StartChoice,
  { edge, at }: ReturnType<typeof startPlace>,
  unit: LengthUnit,
): string {
  const mm = (length: number) => formatLengthWithUnit(length, unit);
  const where =
    best.height < 0 ? `${mm(-best.height)} outside the ${edge} edge` : `${mm(best.height)} inside the ${edge} edge`;
  const leaves = `the shortest slat is then ${mm(best.shortestMm)} long`;
  if (current.slivers === 0) return `The shortest slat is ${mm(current.shortestMm)} long: no sliver.`;
  if (isSliverFree) return `Begin ${where} at the ${at}: ${leaves}, and no slat is shorter than it is wide.`;
  const isBest = best.slivers > 0 && !isShorter(current.shortestMm, best.shortestMm);
  if (isBest)
    return "No start leaves every slat longer than it is wide, and this is the best. Another width of slat may.";
  return best.slivers === 0
    ? `Begin ${where} at the ${at}: ${leaves}, but lay the first with care, since a little off leaves a sliver.`
    : `No start leaves every slat longer than it is wide. The best begins ${where} at the ${at}: ${leaves}.`;
}

const given = (value: number, text: string): string => (Number.isFinite(value) ? `, not at ${text}` : "");
