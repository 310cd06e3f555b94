import type { Limits } from "#shared/dry-fit/limits.ts";
import type { Point } from "#shared/geometry/path.ts";
import { isShorter } from "#shared/geometry/tolerance.ts";
import { holeWindowOfKind } from "#shared/hardware/hole-window-of-kind.ts";
import { panelHoleOf } from "#shared/hardware/panel-hole.ts";
import { frontOf } from "#shared/hardware/standoff-parts.ts";
import type { Hold, MockupDocument } from "#shared/mockup/document.ts";

/** A hole in a panel and what hides it, mm on the board. */
export type CapCover = Point & {
  readonly id: string;
  /** Diameters of the hole and of the cap or head over it. */
  readonly hole: number;
  readonly cap: number;
  /** How far cap and barrel still reach over the hole's edge when it lies hard over to one side; under 0 it shows. */
  readonly reach: number;
  readonly isEnough: boolean;
};

type StandoffHold = Extract<Hold, { kind: "standoff" }>;

/**
 * What covers each hole of a standoff layer; none where nothing passes the panel. The reach is the room left under the upper
 * end of the hole window (shared/hardware/hole-window.ts) and the cover that the shop asks for.
 */
export function capCovers({ hardware, holes }: StandoffHold, { coverMm }: Pick<Limits, "coverMm">): CapCover[] {
  const window = holeWindowOfKind(panelHoleOf(hardware), { placingError: 0, movement: 0, cover: 0 });
  const front = frontOf(hardware);
  if (window === null || front === null) return [];
  return holes.map(({ id, x, y, diameter }) => {
    const reach = window.upper - diameter;
    return { id, x, y, hole: diameter, cap: front.diameter, reach, isEnough: !isShorter(reach, coverMm) };
  });
}

/** The covers of one layer by its key; none for a layer that is hidden, not there or not on standoffs. */
export function capCoversOf(document: MockupDocument, layerKey: string | null, limits: Limits): CapCover[] {
  const layer = document.layers.find(({ key }) => key === layerKey);
  return layer === undefined || layer.hidden || layer.hold.kind !== "standoff" ? [] : capCovers(layer.hold, limits);
}
