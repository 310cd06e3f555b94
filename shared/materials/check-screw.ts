import { isShorter } from "../geometry/tolerance.ts";
import type { Screw } from "../mockup/document.ts";
import { formatFine } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import type { StockFault } from "./stock-fault.ts";
import { woodScrewDiameterMm } from "./wood-screws.ts";

/** Larger than any screw that holds a sign, mm. */
const longest = 300;
const thickest = 20;
/** The standard's own tolerance on the body is +0.1 and −0.18 mm (ASME B18.6.1, from memory); a little is left for a caliper. */
const bodyTolerance = 0.3;

/** What keeps these figures from being a wood screw; lengths in the words are written in `unit`. */
export function checkScrew(screw: Screw, unit: LengthUnit): StockFault[] {
  const faults: StockFault[] = [];
  const say = (field: keyof Screw, detail: string) => faults.push({ path: [field], detail });
  const { gauge, head, diameter, length, headDiameter, headHeight } = screw;
  if (length > longest) say("length", `At most ${formatFine(longest, unit)}.`);
  if (diameter > thickest) say("diameter", `At most ${formatFine(thickest, unit)}.`);
  if (gauge !== null && Math.abs(diameter - woodScrewDiameterMm(gauge)) > bodyTolerance) {
    say(
      "diameter",
      `A No. ${gauge} is ${formatFine(woodScrewDiameterMm(gauge), unit)} thick. Correct this or the number.`,
    );
  }
  if (!isShorter(diameter, headDiameter)) say("headDiameter", "The head is wider than the shank.");
  if (head === "flat" && !isShorter(headHeight, length)) {
    say("headHeight", "A flat head is part of the length, so it is less than that.");
  }
  return faults;
}
