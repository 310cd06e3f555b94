import { frameCorners } from "#shared/frame/frame-corners.ts";
import { frameRefusalWords } from "#shared/frame/frame-words.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Board } from "#shared/mockup/document.ts";
import { longestMm } from "#shared/mockup/schema-parts.ts";
import { checkedSlats } from "#shared/slats/check-slats.ts";
import { slatRefusalWords } from "#shared/slats/slat-words.ts";
import { boardPath } from "#shared/stack/board-outline.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import type { OutOfRange } from "#shared/units/outcome.ts";
import { type BackerDraft, type FrameDraft, frameOfDraft, type SlatsDraft, slatsOfDraft } from "./backer-draft.ts";
import { type Bounds, boundsProblem, isWithinBounds } from "./length-bounds.ts";
import { coordinateBounds, spineWidthBounds } from "./limits.ts";

type SlatsField = Exclude<keyof SlatsDraft, "stock" | "startsAt" | "direction">;
type FrameField = "isFramed" | "mitred" | Exclude<keyof FrameDraft, "stock">;

export type SlatsProblems = Partial<Record<SlatsField, string>>;
export type FrameProblems = Partial<Record<FrameField, string>>;

/** What can't be known without the geometry kernel, once it was asked. */
export type Refusals = { readonly slats: OutOfRange | null; readonly frame: OutOfRange | null };

/** As the document takes them; the least are our choice. */
const thicknessBounds: Bounds = { least: 1, most: 100 };
const spans: Bounds = { least: 0, most: longestMm };
const widths: Bounds = { least: 1, most: longestMm };
const slatBounds: Readonly<Record<Exclude<SlatsField, "angle" | "pattern">, Bounds>> = {
  thickness: thicknessBounds,
  slatWidth: widths,
  gap: spans,
  spineWidth: spineWidthBounds,
  spineOffset: coordinateBounds,
  startHeight: coordinateBounds,
  overhang: { least: 0, most: 1000 },
};
const frameBounds: Readonly<Record<"width" | "depth", Bounds>> = {
  width: { least: 1, most: 500 },
  depth: { least: 1, most: 500 },
};

/** The field that a refusal is about; what it says of the board's outline stands at the pattern. */
const fieldOfSlats: Readonly<Record<string, SlatsField>> = {
  angle: "angle",
  slatWidth: "slatWidth",
  slats: "slatWidth",
  gap: "gap",
  spineWidth: "spineWidth",
  spineOffset: "spineOffset",
  startHeight: "startHeight",
  overhang: "overhang",
};
const fieldOfFrame: Readonly<Record<string, FrameField>> = {
  buttedCorners: "mitred",
  framePiece: "width",
  frameOverlap: "width",
  frameWidth: "width",
  frameDepth: "depth",
};

/** What stands in the way of laying the slats on that board, by field: first the measures, then how they go together. */
export function slatsProblems(
  { backerIs, slats }: BackerDraft,
  board: Board,
  { unit, refusal }: { unit: LengthUnit; refusal: OutOfRange | null },
): SlatsProblems {
  if (backerIs !== "slats") return {};
  const problems: { -readonly [field in keyof SlatsProblems]: string } = {};
  for (const field of Object.keys(slatBounds) as (keyof typeof slatBounds)[]) {
    if (!isAsked(slats, field) || isWithinBounds(slats[field], slatBounds[field])) continue;
    problems[field] = boundsProblem(slats[field], slatBounds[field], unit) ?? "Write a length.";
  }
  if (slats.angle === null || !(slats.angle >= 15 && slats.angle <= 90)) problems.angle = "From 15 to 90 degrees.";
  const design = slatsOfDraft(slats);
  if (Object.keys(problems).length > 0 || design === null) return problems;
  const { width, height, outline } = board;
  const region = outline.kind === "rectangle" ? null : flattenPath(boardPath(board));
  const laid = checkedSlats({ width, height, outline: region }, design, () => null);
  const reason = laid.ok ? refusal : laid.reason;
  return reason ? { [fieldOfSlats[reason.field] ?? "pattern"]: slatRefusalWords(reason, unit) } : {};
}

/** Whether the pattern and the start have that field at all. */
export function isAsked({ pattern, startsAt }: SlatsDraft, field: SlatsField): boolean {
  if (field === "spineWidth") return pattern === "spine";
  if (field === "spineOffset") return pattern !== "single";
  return field !== "startHeight" || startsAt === "height";
}

/** What stands in the way of the frame round that board, by field. */
export function frameProblems(
  draft: BackerDraft,
  board: Board,
  { unit, refusal }: { unit: LengthUnit; refusal: OutOfRange | null },
): FrameProblems {
  if (!draft.isFramed) return {};
  const problems: { -readonly [field in keyof FrameProblems]: string } = {};
  for (const field of ["width", "depth"] as const) {
    if (isWithinBounds(draft.frame[field], frameBounds[field])) continue;
    problems[field] = boundsProblem(draft.frame[field], frameBounds[field], unit) ?? "Write a length.";
  }
  const corners = frameCorners(boardPath(board));
  if (!corners.ok) problems.isFramed = frameRefusalWords(corners.reason, unit);
  if (Object.keys(problems).length > 0 || !refusal || !frameOfDraft(draft)) return problems;
  return { [fieldOfFrame[refusal.field] ?? "isFramed"]: frameRefusalWords(refusal, unit) };
}
