import { hoursWords } from "../dry-fit/words.ts";
import { countOf } from "../mockup/change.ts";
import type { MockupDocument } from "../mockup/document.ts";
import { dryingHours } from "../mockup/drying-hours.ts";
import { formatLengthWithUnit } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import { formatStatedMass } from "../units/mass.ts";
import { hangingWords } from "./schedule.ts";

/** How a sign hangs and how long its finish dries, in a few sentences for those who make it. */
export function makingWords(document: MockupDocument, unit: LengthUnit): string {
  const { hanging, backer } = document;
  const { kind, gap, pose, carriesKg, points } = hanging;
  const parts = [
    `Hanging: ${hangingWords[kind]}, ${pose === "lying" ? "lying flat" : pose}`,
    gap > 0 && `${formatLengthWithUnit(gap, unit)} behind it`,
    carriesKg === null
      ? "what the fixing carries is not stated"
      : `the fixing carries ${formatStatedMass(carriesKg, unit)}`,
    points.length > 0 && `${countOf(points.length, "place")} set out for it`,
  ].filter((part) => part !== false);
  const hours = dryingHours(backer.finish);
  return `${parts.join(", ")}.${hours > 0 ? ` The finish dries ${hoursWords(hours)} in all.` : ""}`;
}
