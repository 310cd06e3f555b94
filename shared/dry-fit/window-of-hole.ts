import type { Point } from "../geometry/path.ts";
import { isShorter } from "../geometry/tolerance.ts";
import { fixedPoint, holeMovementMm } from "../hardware/hole-movement.ts";
import type { HoleWindow } from "../hardware/hole-window.ts";
import { holeWindowOfKind } from "../hardware/hole-window-of-kind.ts";
import { panelHoleOf } from "../hardware/panel-hole.ts";
import type { Hole } from "../mockup/document.ts";
import type { RuleInput } from "./rule.ts";
import type { StandoffHold } from "./standoff-layers.ts";

type Site = Pick<RuleInput, "document" | "limits"> & { readonly context: Pick<RuleInput["context"], "place"> };

/** How far in mm a panel moves against the wood at a place, seen from the one that is held. */
export function movementAtMm(held: Point, place: Point, { document, limits, context }: Site): number {
  return holeMovementMm(held, place, {
    expansionPerK: limits.expansionPerK,
    temperatureK: context.place === "outside" ? limits.temperatureOutsideK : limits.temperatureInsideK,
    woodPerPoint: document.backer.stock.movementPerPoint,
    moisturePoints: limits.moisturePoints,
    grainTurn: document.backer.grainTurn,
  });
}

/** The window of one hole of a layer with the movement it allows for; null where nothing passes the panel. */
export function windowOfHole(
  { hardware, holes }: Pick<StandoffHold, "hardware" | "holes">,
  hole: Hole,
  site: Site,
): (HoleWindow & { readonly movement: number }) | null {
  const movement = hole.fixed ? 0 : movementAtMm(fixedPoint(holes) ?? hole, hole, site);
  const { placingErrorMm: placingError, coverMm: cover } = site.limits;
  const window = holeWindowOfKind(panelHoleOf(hardware), { placingError, movement, cover });
  return window && { ...window, movement };
}

/** Whether no hole can be right in a window. */
export const isEmptyWindow = ({ lower, upper }: HoleWindow): boolean => isShorter(upper, lower);

/** The diameter in a window that comes nearest to one, in whole tenths of a mm where the window has any there. */
export function intoWindow(diameter: number, { lower, upper }: HoleWindow): number {
  if (isShorter(diameter, lower)) return Math.min(upper, Math.ceil(lower * 10 - 1e-6) / 10);
  if (isShorter(upper, diameter)) return Math.max(lower, Math.floor(upper * 10 + 1e-6) / 10);
  return diameter;
}
