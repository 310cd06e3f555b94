import type { MockupDocument } from "../mockup/document.ts";
import { dryingHours } from "../mockup/drying-hours.ts";
import { tackThenBond, waitingHours } from "./adhesive-families.ts";

type Hold = MockupDocument["layers"][number]["hold"];

/** Hours a sign waits in all: its coats one after the other, then the slowest of its bonds to full strength. */
export function dryingHoursOfSign({ backer, layers }: Pick<MockupDocument, "backer" | "layers">): number {
  return dryingHours(backer.finish) + Math.max(0, ...layers.map(({ hold }) => bondHours(hold)));
}

function bondHours(hold: Hold): number {
  if (hold.kind === "standoff") return 0;
  const tack = hold.kind === "bond" ? hold.tack : null;
  const { family } = hold.adhesive;
  return waitingHours(tack ? tackThenBond(tack.family, family) : family).full;
}
