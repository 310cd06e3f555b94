import { nearestThickness } from "#shared/materials/find-stock.ts";
import type { Backer, FrameOfSign, MockupDocument, Slats, Wood } from "#shared/mockup/document.ts";
import { backerThicknessMm, faceStock } from "#shared/stack/backer.ts";
import { type Bounds, isWithinBounds } from "./length-bounds.ts";
import { coordinateBounds, roundMm, spineWidthBounds } from "./limits.ts";
import { isSameStock, type StockChoices } from "./stock-choices.ts";

/** Slats while they are being written; there are some to begin with, also while the backer is a plank. Lengths mm. */
export type SlatsDraft = {
  readonly stock: Wood;
  readonly thickness: number | null;
  readonly pattern: Slats["pattern"];
  readonly angle: number | null;
  readonly slatWidth: number | null;
  readonly gap: number | null;
  readonly spineWidth: number | null;
  readonly spineOffset: number | null;
  readonly startsAt: Slats["start"]["kind"];
  readonly startHeight: number | null;
  readonly direction: Slats["direction"];
  readonly overhang: number | null;
};

/** A frame while it is being written. Without a depth until one is chosen: it depends on the backer. */
export type FrameDraft = {
  readonly stock: Wood;
  readonly width: number | null;
  readonly depth: number | null;
  readonly mitred: boolean;
};

/**
 * Plank, slats and frame side by side, so that what was written of one is still there after another was looked at.
 * `stock` and `thickness` are the plank's.
 */
export type BackerDraft = {
  readonly backerIs: "plank" | "slats";
  readonly stock: Wood;
  readonly thickness: number;
  readonly substrate: { readonly stock: Wood; readonly thickness: number };
  readonly grainTurn: number;
  readonly slats: SlatsDraft;
  readonly isFramed: boolean;
  readonly frame: FrameDraft;
};

/** How slats begin, mm and degrees: common practice is 45 degrees all through and 25 to 50 laid past the edge. */
const usual = {
  thickness: 9,
  pattern: "spine",
  angle: 45,
  slatWidth: 38,
  gap: 0,
  spineWidth: 38,
  spineOffset: 0,
  startsAt: "corner",
  startHeight: 0,
  direction: "up",
  overhang: 25,
} as const satisfies Omit<SlatsDraft, "stock">;
/** Our choice. */
const usualSubstrateMm = 12;
const usualFrameMm = 18;

export function draftOfBacker(
  { backer, frame }: Pick<MockupDocument, "backer" | "frame">,
  woods: StockChoices["woods"],
): BackerDraft {
  const { stock, thickness, slats, grainTurn } = backer;
  const stocked = woods.find(({ wood }) => isSameStock(wood, stock))?.thicknessesMm ?? [];
  return {
    backerIs: slats ? "slats" : "plank",
    stock,
    thickness,
    substrate: {
      stock,
      thickness: slats ? thickness : (nearestThickness(stocked, usualSubstrateMm) ?? usualSubstrateMm),
    },
    grainTurn,
    slats: slats ? draftOfSlats(slats) : { stock, ...usual },
    isFramed: frame !== null,
    frame: frame ?? { stock: faceStock(backer), width: usualFrameMm, depth: null, mitred: true },
  };
}

function draftOfSlats({ start, ...slats }: Slats): SlatsDraft {
  return {
    ...slats,
    startsAt: start.kind,
    startHeight: start.kind === "height" ? start.height : usual.startHeight,
  };
}

/** The slats as the document keeps them; null while a measure is missing. What the pattern has no use for may be. */
export function slatsOfDraft({ startsAt, startHeight, ...draft }: SlatsDraft): Slats | null {
  const { stock, pattern, direction } = draft;
  const thickness = numberIn(draft.thickness);
  const angle = numberIn(draft.angle);
  const slatWidth = numberIn(draft.slatWidth);
  const gap = numberIn(draft.gap);
  const overhang = numberIn(draft.overhang);
  const spineWidth =
    pattern === "spine" ? numberIn(draft.spineWidth) : spare(draft.spineWidth, spineWidthBounds, usual.spineWidth);
  const spineOffset =
    pattern === "single" ? spare(draft.spineOffset, coordinateBounds, usual.spineOffset) : numberIn(draft.spineOffset);
  const height = numberIn(startHeight);
  if (thickness === null || angle === null || slatWidth === null || gap === null || overhang === null) return null;
  if (spineWidth === null || spineOffset === null) return null;
  if (startsAt === "height" && height === null) return null;
  const start: Slats["start"] =
    startsAt === "height" && height !== null ? { kind: "height", height } : { kind: "corner" };
  return { stock, thickness, pattern, angle, slatWidth, gap, spineWidth, spineOffset, start, direction, overhang };
}

/** What a field holds; null for an empty one and for what is no number. */
const numberIn = (value: number | null): number | null => (Number.isNaN(value) ? null : value);

/** What a field that the pattern does not ask for leaves in the document: what is in it, if that can stay there. */
const spare = (value: number | null, bounds: Bounds, otherwise: number): number =>
  isWithinBounds(value, bounds) ? value : otherwise;

/** The frame as the document keeps it; null without one, or while a measure is missing. */
export function frameOfDraft({ isFramed, frame }: BackerDraft): FrameOfSign | null {
  const { width, depth, ...rest } = frame;
  if (!isFramed || !width || !depth) return null;
  return { ...rest, width, depth };
}

/** Backer as the draft has it just now; under half-written slats only their substrate, `finish` as given. */
export function backerOfDraft(draft: BackerDraft, finish: Backer["finish"]): Backer {
  const { backerIs, stock, thickness, substrate, grainTurn, slats } = draft;
  if (backerIs === "plank") return { stock, thickness, grainTurn, slats: null, finish };
  return { ...substrate, grainTurn, slats: slatsOfDraft(slats), finish };
}

/** The wood that is seen, also while the slats are half-written. */
export const faceStockOfDraft = ({ backerIs, stock, slats }: BackerDraft): Wood =>
  backerIs === "slats" ? slats.stock : stock;

/** The depth at which a frame is level with the face; null while slats are half-written. */
export function flushDepthOfDraft(draft: BackerDraft): number | null {
  const backer = backerOfDraft(draft, []);
  return draft.backerIs === "slats" && backer.slats === null ? null : roundMm(backerThicknessMm(backer));
}
