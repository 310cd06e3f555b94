import { movementMoisture } from "../../materials/seasonal-movement.ts";
import { backerMovement } from "../../slats/backer-movement.ts";
import { slatsOf } from "../../stack/backer.ts";
import { formatFine } from "../../units/format-length.ts";
import { rangeClamp } from "../../units/range-clamp.ts";
import type { Finding } from "../finding.ts";
import { foundBy, type Rule, type RuleInput } from "../rule.ts";

const source = "Wood Handbook, GTR-282, equation 13-2, free movement";
/** What is less than that no one sees, mm. Our choice. */
const leastMm = 0.05;

/** Rule 35: slats on one side of a board only, and what they want to move that the substrate does not. */
export const cladding: Rule = { number: 35, title: "Clad on one side", check };

function check({ document, limits, kernel, context }: RuleInput): Finding[] {
  const { board, backer } = document;
  const { slats, stock, grainTurn } = backer;
  if (!slats || !slatsOf(document, kernel)?.ok) return [];
  const from = rangeClamp(slats.stock.moisturePercent, movementMoisture);
  const damper = rangeClamp(from + limits.moisturePoints, movementMoisture);
  const drier = rangeClamp(from - limits.moisturePoints, movementMoisture);
  const to = damper - from >= from - drier ? damper : drier;
  const movement = backerMovement({
    width: board.width,
    height: board.height,
    angle: slats.angle,
    slatWidth: slats.slatWidth,
    slatPerPoint: slats.stock.movementPerPoint,
    substrate: { perPoint: stock.movementPerPoint, grain: grainTurn },
    from,
    to,
  });
  if (!movement.ok || movement.value.held.mm < leastMm) return [];
  const { slat, held } = movement.value;
  const mm = (length: number) => formatFine(length, context.unit);
  return [
    foundBy(cladding, {
      severity: "remark",
      text: `The board is clad on one side only. From ${percent(from)} to ${percent(to)} moisture a slat moves ${mm(Math.abs(slat))} across its width if nothing holds it, and over the ${held.along} slats and substrate want to part by ${mm(held.mm)}: glued together they may cup, the ${held.hollow} hollow. Seal the back as well as the face, or balance it with slats of its own.`,
      where: { x: board.width / 2, y: board.height / 2 },
      value: held.mm,
      unit: "mm",
      source,
    }),
  ];
}

const percent = (moisture: number): string => `${Number(moisture.toFixed(1))} %`;
