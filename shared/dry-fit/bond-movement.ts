import { familyFacts } from "../bonds/adhesive-families.ts";
import { movementMismatchMm } from "../bonds/movement-mismatch.ts";
import { boxContains } from "../geometry/box.ts";
import type { Region } from "../geometry/path.ts";
import { smallestBox } from "../geometry/smallest-box.ts";
import type { Adhesive } from "../mockup/document.ts";
import type { PieceFigures } from "../stack/figures.ts";
import { boardRegion } from "../stack/piece-region.ts";
import type { Joint } from "./joints.ts";
import type { Limits } from "./limits.ts";
import type { RuleInput } from "./rule.ts";

/** A length of a bond with its direction, degrees clockwise from the x axis. */
type Span = { readonly longest: number; readonly turn: number };

/**
 * How far in mm each piece of a joint and what is under it want to part at the bond's end, in the pieces' order: the most
 * of the bond's longest side, and of what it measures across the grain and along it. Acrylic on acrylic moves as one; wood
 * moves across the grain (Wood Handbook, GTR-282, equation 13-2), and what warmth does to it is left out.
 */
export function jointMovements({ under, pieces }: Joint, input: RuleInput): number[] {
  if (under) return pieces.map(() => 0);
  return pieces.map(({ figures }) => pieceMovement(figures, input));
}

function pieceMovement(figures: PieceFigures, input: RuleInput): number {
  const { document, limits, context, kernel } = input;
  const { board, backer } = document;
  const onBoard =
    board.outline.kind === "rectangle" &&
    boxContains({ x: 0, y: 0, width: board.width, height: board.height }, figures.box);
  const bonded = onBoard ? figures.region : kernel.intersect(figures.region, boardRegion(board, kernel));
  const box = onBoard ? figures.smallestBox : smallestBox(bonded);
  if (!box) return 0;
  const spans: Span[] = [
    { longest: box.length, turn: box.turn },
    spanAlong(bonded, backer.grainTurn + 90),
    spanAlong(bonded, backer.grainTurn),
  ];
  const movements = spans.map(({ longest, turn }) => {
    const sine = Math.sin(((turn - backer.grainTurn) * Math.PI) / 180);
    const mismatch = movementMismatchMm({
      longest,
      one: { perK: limits.expansionPerK, perPoint: 0 },
      other: { perK: 0, perPoint: backer.stock.movementPerPoint * sine * sine },
      temperatureK: context.place === "outside" ? limits.temperatureOutsideK : limits.temperatureInsideK,
      moisturePoints: limits.moisturePoints,
    });
    return mismatch.ok ? mismatch.value : 0;
  });
  return Math.max(...movements);
}

function spanAlong(region: Region, turn: number): Span {
  const radians = (turn * Math.PI) / 180;
  const [cosine, sine] = [Math.cos(radians), Math.sin(radians)];
  let least = Infinity;
  let most = -Infinity;
  for (const ring of region) {
    for (const { x, y } of ring) {
      const at = x * cosine + y * sine;
      least = Math.min(least, at);
      most = Math.max(most, at);
    }
  }
  return { longest: Math.max(0, most - least), turn };
}

/** What several adhesives in one joint allow together, mm: no more than the stiffest. */
export function allowedMovementMm(adhesives: readonly Adhesive[], limits: Limits): number {
  return Math.min(
    ...adhesives.map(({ family }) =>
      familyFacts(family).gives === "rigid" ? limits.rigidBondMm : limits.gapFillingBondMm,
    ),
  );
}
