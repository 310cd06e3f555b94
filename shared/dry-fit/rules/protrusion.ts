import { formatFine } from "../../units/format-length.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";

/** Rule 37: what reaches out over a way that people walk. */
export const protrusion: Rule = { number: 37, title: "Over a walkway", check };

function check({ document, figures, limits, context }: RuleInput): Finding[] {
  const offWall = figures.offWall.most;
  if (!context.walkway || offWall <= limits.protrusionMm) return [];
  const mm = (length: number) => formatFine(length, context.unit);
  return [
    foundBy(protrusion, {
      severity: "caution",
      text: `The sign stands up to ${mm(offWall)} off the wall where people walk; over ${mm(limits.protrusionMm)} is a hazard to who can't see it, unless a cane finds it (lower edge 685 mm over the floor at most) or it hangs over 2030 mm. Local rules come first.`,
      where: { x: document.board.width / 2, y: document.board.height / 2 },
      value: offWall,
      limit: limits.protrusionMm,
      unit: "mm",
      source: "2010 ADA Standards, 307, from memory",
    }),
  ];
}
