import { boxCentre } from "#shared/geometry/box.ts";
import type { Point } from "#shared/geometry/path.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { directionOf } from "#shared/setting-out/direction.ts";
import { type SpacingAlong, type SpacingOfCopies, stepsAlong, stepsOfCopies } from "#shared/setting-out/step-along.ts";
import { type RigidStep, type RoundOrder, stepsOfCopiesRound, stepsRound } from "#shared/setting-out/step-round.ts";
import type { Site } from "../propose-holes.ts";
import { boxesOfHeaps, heapsOf, stretchOf, type Together } from "../together.ts";
import { addCopies } from "./add-copies.ts";
import { changePieces, movableOf, moveAll, rigidMotion, shiftMotion } from "./piece-motion.ts";
import { boxOfPieces } from "./pieces.ts";

/** Along a line at `angle`, degrees clockwise from the x axis; `onto` brings middles onto one line through the first. */
type Along<Spacing> = { readonly kind: "along"; readonly angle: number; readonly spacing: Spacing };
type Round = { readonly kind: "round" } & RoundOrder;

export type StepOffWay = (Along<SpacingAlong> & { readonly onto: boolean }) | Round;
export type StepOffCopiesWay = Along<SpacingOfCopies> | Round;

/** Sets what is chosen out at equal steps along a line or round a centre, with the holes in it. */
export function stepOff(
  document: MockupDocument,
  { pieceIds, together, way }: { pieceIds: readonly string[]; together: Together; way: StepOffWay },
): MockupDocument {
  const heaps = boxesOfHeaps(document, heapsOf(document, pieceIds, together));
  const middles = heaps.map(({ box }) => boxCentre(box));
  const steps =
    way.kind === "round"
      ? stepsRound(middles, way)
      : stepsOnLine(
          heaps.map(({ ids }) => stretchOf(document, ids, way.angle) ?? { from: 0, to: 0 }),
          middles,
          way,
        );
  if (steps === null) return document;
  const motions = heaps.flatMap(({ ids }, index) => {
    const step = steps[index];
    const motion = step && rigidMotion(step);
    return motion ? ids.map((id) => [id, motion] as const) : [];
  });
  return changePieces(document, new Map(motions));
}

/** Adds copies of what is chosen, taken as one, at equal steps along a line or round a centre; ids are made from `id`. */
export function stepOffCopies(
  document: MockupDocument,
  {
    pieceIds,
    count,
    way,
    ...made
  }: { pieceIds: readonly string[]; count: number; way: StepOffCopiesWay; id: string; withHoles: boolean; site: Site },
): MockupDocument {
  const ids = movableOf(document, pieceIds);
  const box = boxOfPieces(document, ids);
  if (!box || !Number.isInteger(count) || count < 1) return document;
  if (way.kind === "round") {
    const steps = stepsOfCopiesRound(boxCentre(box), count, way);
    if (!steps) return document;
    const motions = steps.copies.map((step) => rigidMotion(step));
    const copied = addCopies(document, { pieceIds: ids, motions, ...made });
    return copied === document ? document : moveAll(copied, ids, rigidMotion(steps.own));
  }
  const stretch = stretchOf(document, ids, way.angle);
  if (!stretch) return document;
  const { x, y } = directionOf(way.angle);
  const motions = stepsOfCopies(stretch.to - stretch.from, count, way.spacing).map((far) =>
    shiftMotion(far * x, far * y),
  );
  return addCopies(document, { pieceIds: ids, motions, ...made });
}

function stepsOnLine(
  stretches: Parameters<typeof stepsAlong>[0],
  middles: readonly Point[],
  { angle, spacing, onto }: Extract<StepOffWay, { kind: "along" }>,
): RigidStep[] {
  const direction = directionOf(angle);
  const steps = stepsAlong(stretches, spacing);
  const along = ({ x, y }: Point) => x * direction.x + y * direction.y;
  const across = ({ x, y }: Point) => y * direction.x - x * direction.y;
  const first = middles.reduce<Point | null>((least, one) => (least && along(least) <= along(one) ? least : one), null);
  return middles.map((middle, index) => {
    const far = steps[index] ?? 0;
    const aside = onto && first ? across(first) - across(middle) : 0;
    return {
      about: middle,
      turn: 0,
      dx: far * direction.x - aside * direction.y,
      dy: far * direction.y + aside * direction.x,
    };
  });
}
