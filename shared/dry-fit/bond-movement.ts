import { familyFacts } from "../bonds/adhesive-families.ts";
import { movementMismatchMm } from "../bonds/movement-mismatch.ts";
import { boxContains } from "../geometry/box.ts";
import type { Region } from "../geometry/path.ts";
import { smallestBox } from "../geometry/smallest-box.ts";
import type { Adhesive } from "../mockup/document.ts";
import { faceRegion } from "../stack/backer.ts";
import type { PieceFigures } from "../stack/figures.ts";
import type { Joint } from "./joints.ts";
import type { Limits } from "./limits.ts";
import type { RuleInput } from "./rule.ts";

/** A length of a bond, and what the wood under it moves in its direction per point of moisture. */
type Span = { readonly longest: number; readonly perPoint: number };

/**
 * How far in mm each piece of a joint and what is under it want to part at the bond's end, in the pieces' order: the most
 * of the bond's longest side, of what it measures across the grain and along it, and of a slat's width. Acrylic on acrylic
 * moves as one; wood moves across the grain (Wood Handbook, GTR-282, equation 13-2), and its own growth by warmth is left
 * out, being small.
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
  const bonded = onBoard ? figures.region : kernel.intersect(figures.region, faceRegion(document, kernel));
  const box = onBoard ? figures.smallestBox : smallestBox(bonded);
  if (!box) return 0;
  const { grainTurn, stock, slats } = backer;
  const along = (turn: number) => Math.sin(((turn - grainTurn) * Math.PI) / 180) ** 2;
  const spans: Span[] = [
    { longest: box.length, perPoint: stock.movementPerPoint * along(box.turn) },
    { longest: spanAlong(bonded, grainTurn + 90), perPoint: stock.movementPerPoint },
    { longest: spanAlong(bonded, grainTurn), perPoint: 0 },
    // The substrate holds its slats together; each by itself moves as wide as it is.
    ...(slats ? [{ longest: Math.min(box.length, slats.slatWidth), perPoint: slats.stock.movementPerPoint }] : []),
  ];
  const movements = spans.map(({ longest, perPoint }) => {
    const mismatch = movementMismatchMm({
      longest,
      one: { perK: limits.expansionPerK, perPoint: 0 },
      other: { perK: 0, perPoint },
      temperatureK: context.place === "outside" ? limits.temperatureOutsideK : limits.temperatureInsideK,
      moisturePoints: limits.moisturePoints,
    });
    return mismatch.ok ? mismatch.value : 0;
  });
  return Math.max(...movements);
}

function spanAlong(region: Region, turn: number): number {
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
  return Math.max(0, most - least);
}

/** What several adhesives in one joint allow together, mm: no more than the stiffest. */
export function allowedMovementMm(adhesives: readonly Adhesive[], limits: Limits): number {
  return Math.min(
    ...adhesives.map(({ family }) =>
      familyFacts(family).gives === "rigid" ? limits.rigidBondMm : limits.gapFillingBondMm,
    ),
  );
}
