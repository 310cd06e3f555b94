import { boxCentre } from "#shared/geometry/box.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { holesWithin, movableOf } from "./commands/piece-motion.ts";
import { boxOfPieces } from "./commands/pieces.ts";
import { type StepOffCopiesWay, type StepOffWay, stepOff, stepOffCopies } from "./commands/step-off.ts";
import { isWithinBounds } from "./length-bounds.ts";
import { mostPieces } from "./limits.ts";
import type { Site } from "./propose-holes.ts";
import { heapsOf, type Together, usualTogether } from "./together.ts";

export type StepOffShape = "across" | "down" | "at an angle" | "round";
/** Between the first and the last only what is chosen can be spaced, over a length only copies. */
export type StepOffSpacing = "pitch" | "gap" | "equal gaps" | "equal pitch" | "over";

/** A stepping off as it is being written; null and NaN are fields that are empty or can't be read. */
export type StepOffDraft = {
  readonly what: "copies" | "chosen";
  readonly together: Together;
  readonly shape: StepOffShape;
  readonly spacing: StepOffSpacing;
  readonly count: number | null;
  readonly mm: number | null;
  readonly angle: number | null;
  readonly onto: boolean;
  readonly centre: "board" | "chosen" | "typed";
  readonly x: number | null;
  readonly y: number | null;
  readonly radius: number | null;
  readonly sweep: number | null;
  readonly turned: boolean;
  readonly withHoles: boolean;
};

export const mostCopies = 500;
export const stepBounds = { least: -5000, most: 5000 } as const;
export const radiusBounds = { least: 0.1, most: 5000 } as const;

const spacingsOf = {
  copies: ["gap", "pitch", "over"],
  chosen: ["equal gaps", "equal pitch", "gap", "pitch"],
} as const satisfies Record<StepOffDraft["what"], readonly StepOffSpacing[]>;

export const spacingsFor = (what: StepOffDraft["what"]): readonly StepOffSpacing[] => spacingsOf[what];

/** What is mostly wanted: several pieces between the first and the last, one alone copied three times beside itself. */
export function startStepOff(document: MockupDocument, pieceIds: readonly string[]): StepOffDraft {
  const together = usualTogether(document, pieceIds);
  const what = heapsOf(document, pieceIds, together).length > 2 ? "chosen" : "copies";
  const { width, height } = document.board;
  return {
    what,
    together,
    shape: "across",
    spacing: what === "chosen" ? "equal gaps" : "gap",
    count: 3,
    mm: 10,
    angle: 45,
    onto: false,
    centre: "board",
    x: width / 2,
    y: height / 2,
    radius: null,
    sweep: 360,
    turned: true,
    withHoles: true,
  };
}

/** Whether the pieces have standoff holes in them that could be copied. */
export function haveHoles(document: MockupDocument, pieceIds: readonly string[]): boolean {
  const chosen = new Set(pieceIds);
  return document.layers.some(
    (layer) => layer.pieces.some(({ id }) => chosen.has(id)) && holesWithin(layer, chosen).size > 0,
  );
}

export type StepOffOutcome =
  | { readonly ok: true; readonly document: MockupDocument }
  | { readonly ok: false; readonly why: string };

type Order = { readonly pieceIds: readonly string[]; readonly id: string; readonly site: Site };

/** The document as a draft would leave it, or what is missing in words. Ids of copies are made from `id`. */
export function steppedOff(document: MockupDocument, draft: StepOffDraft, order: Order): StepOffOutcome {
  const why = whyNot(document, draft, order.pieceIds);
  if (why !== null) return { ok: false, why };
  const next = draft.what === "copies" ? copiesOf(document, draft, order) : chosenOf(document, draft, order);
  if (next !== document) return { ok: true, document: next };
  return { ok: false, why: draft.what === "copies" ? tooMuch : "They stand so already." };
}

const tooMuch = "This would be more than a mockup takes, or further off.";

function whyNot(document: MockupDocument, draft: StepOffDraft, pieceIds: readonly string[]): string | null {
  const movable = movableOf(document, pieceIds);
  if (movable.length === 0) return "Choose pieces of a layer that is not locked.";
  if (draft.what === "copies") {
    const { count } = draft;
    if (count === null || !Number.isInteger(count) || count < 1 || count > mostCopies)
      return `Write how many copies, from 1 to ${mostCopies}.`;
    if (count * movable.length > mostPieces) return tooMuch;
  } else if (heapsOf(document, pieceIds, draft.together).length < 2)
    return "There is only one to step off. Make copies, or let each piece move.";
  if (draft.shape === "round") return whyNotRound(document, draft, movable);
  if (draft.shape === "at an angle" && !isAngle(draft.angle)) return "Write an angle from −360 to 360 degrees.";
  if (needsLength(draft) && (!isWithinBounds(draft.mm, stepBounds) || draft.mm === 0))
    return "Write how far apart they stand.";
  return null;
}

function whyNotRound(document: MockupDocument, draft: StepOffDraft, movable: readonly string[]): string | null {
  if (draft.centre === "typed" && !(isWithinBounds(draft.x, stepBounds) && isWithinBounds(draft.y, stepBounds)))
    return "Write where the centre is.";
  if (draft.radius !== null && !isWithinBounds(draft.radius, radiusBounds)) return "Write a radius, or leave it empty.";
  if (!isAngle(draft.sweep) || draft.sweep === 0) return "Write how far round they go, up to 360 degrees.";
  if (draft.radius !== null) return null;
  const centre = centreOf(document, draft, movable);
  const heaps = draft.what === "copies" ? [[...movable]] : heapsOf(document, movable, draft.together);
  const isOnCentre = heaps.some((ids) => {
    const box = boxOfPieces(document, ids);
    if (!box) return false;
    const { x, y } = boxCentre(box);
    return x === centre.x && y === centre.y;
  });
  return isOnCentre ? "It lies on the centre itself: write a radius." : null;
}

const isAngle = (degrees: number | null): degrees is number =>
  degrees !== null && Number.isFinite(degrees) && Math.abs(degrees) <= 360;

export const needsLength = ({ shape, spacing }: Pick<StepOffDraft, "shape" | "spacing">): boolean =>
  shape !== "round" && spacing !== "equal gaps" && spacing !== "equal pitch";

function angleOf({ shape, angle }: StepOffDraft): number {
  return shape === "across" ? 0 : shape === "down" ? 90 : (angle ?? 0);
}

function centreOf(document: MockupDocument, { centre, x, y }: StepOffDraft, pieceIds: readonly string[]) {
  const box = centre === "chosen" ? boxOfPieces(document, pieceIds) : null;
  if (box) return boxCentre(box);
  const { width, height } = document.board;
  return centre === "typed" ? { x: x ?? 0, y: y ?? 0 } : { x: width / 2, y: height / 2 };
}

function roundOf(document: MockupDocument, draft: StepOffDraft, pieceIds: readonly string[]) {
  const { radius, sweep, turned } = draft;
  return { kind: "round", centre: centreOf(document, draft, pieceIds), radius, sweep: sweep ?? 360, turned } as const;
}

function copiesOf(document: MockupDocument, draft: StepOffDraft, { pieceIds, id, site }: Order): MockupDocument {
  const { spacing, mm, count, withHoles } = draft;
  const kind = spacing === "gap" || spacing === "over" ? spacing : "pitch";
  const way: StepOffCopiesWay =
    draft.shape === "round"
      ? roundOf(document, draft, pieceIds)
      : { kind: "along", angle: angleOf(draft), spacing: { kind, mm: mm ?? 0 } };
  return stepOffCopies(document, { pieceIds, count: count ?? 1, way, id, withHoles, site });
}

function chosenOf(document: MockupDocument, draft: StepOffDraft, { pieceIds }: Order): MockupDocument {
  const { spacing, mm, together, onto } = draft;
  const along = { kind: "along", angle: angleOf(draft), onto } as const;
  const way: StepOffWay =
    draft.shape === "round"
      ? roundOf(document, draft, pieceIds)
      : spacing === "equal gaps" || spacing === "equal pitch"
        ? { ...along, spacing: { kind: spacing } }
        : { ...along, spacing: { kind: spacing === "gap" ? "gap" : "pitch", mm: mm ?? 0 } };
  return stepOff(document, { pieceIds, together, way });
}
