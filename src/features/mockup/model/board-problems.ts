import { regionContains } from "#shared/geometry/contains.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import { leastBoardMm, longestMm } from "#shared/mockup/schema-parts.ts";
import { boardPath } from "#shared/stack/board-outline.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import {
  type FrameProblems,
  frameProblems,
  type Refusals,
  type SlatsProblems,
  slatsProblems,
} from "./backer-problems.ts";
import { type BoardDraft, boardOfDraft, frameInMeasures, measuresOf } from "./board-draft.ts";
import { type CoatProblems, coatProblems } from "./coat-draft.ts";
import { type Bounds, boundsProblem, isWithinBounds } from "./length-bounds.ts";

const bounds = {
  width: { least: leastBoardMm, most: longestMm },
  height: { least: leastBoardMm, most: longestMm },
  radius: { least: 1, most: longestMm / 2 },
  gap: { least: 0, most: 500 },
} as const satisfies Record<string, Bounds>;
const distance: Bounds = { least: 100, most: 200_000 };

const none: Refusals = { slats: null, frame: null };

/** What stands in the way of taking a draft, by field; coats and fixings by their ids. */
export type BoardProblems = {
  readonly fields: Partial<
    Record<keyof typeof bounds | "pieceId" | "quantity" | "carries" | "viewingDistance" | "fixings", string>
  >;
  readonly coats: ReadonlyMap<string, CoatProblems>;
  readonly fixings: ReadonlyMap<string, string>;
  readonly slats: SlatsProblems;
  readonly frame: FrameProblems;
};

export function boardProblems(
  draft: BoardDraft,
  document: MockupDocument,
  unit: LengthUnit,
  refusals: Refusals = none,
): BoardProblems {
  const board = boardOfDraft(draft, document);
  const round = frameInMeasures(draft);
  const fields: { -readonly [key in keyof BoardProblems["fields"]]: string } = {};
  for (const name of ["width", "height", "radius", "gap"] as const) {
    if (name === "radius" && draft.outline !== "rounded") continue;
    const { least, most } = bounds[name];
    const added = name === "width" || name === "height" ? round : 0;
    const held = { least: least + added, most };
    if (isWithinBounds(draft[name], held)) continue;
    fields[name] = boundsProblem(draft[name], held, unit) ?? "Write a length.";
  }
  if (draft.outline === "piece" && draft.pieceId === null) fields.pieceId = "Choose the piece.";
  const { quantity, carries } = draft;
  if (quantity === null || !Number.isInteger(quantity) || quantity < 1 || quantity > 1000)
    fields.quantity = "Write a whole number from 1 to 1000.";
  if (carries !== null && !(carries > 0 && carries <= 10_000))
    fields.carries = `More than 0, at most ${unit === "mm" ? "10 000 kg" : "10 000 lb"}.`;
  if (!isWithinBounds(draft.viewingDistance, distance))
    fields.viewingDistance = `From ${unit === "mm" ? "0.1 to 200 m" : "1/3 to 656 feet"}.`;
  return {
    fields,
    coats: new Map(
      draft.finish.flatMap((coat) => {
        const found = coatProblems(coat);
        return Object.keys(found).length > 0 ? [[coat.id, found] as const] : [];
      }),
    ),
    fixings: fixingProblems(draft, document),
    slats: slatsProblems(draft, board, { unit, refusal: refusals.slats }),
    frame: frameProblems(draft, board, { unit, refusal: refusals.frame }),
  };
}

export const hasProblems = ({ fields, coats, fixings, slats, frame }: BoardProblems): boolean =>
  [fields, slats, frame].some((group) => Object.keys(group).length > 0) || coats.size > 0 || fixings.size > 0;

function fixingProblems(draft: BoardDraft, document: MockupDocument): ReadonlyMap<string, string> {
  const { width, height } = measuresOf(draft, document);
  // A piece's outline moves with the piece: against its box, then.
  const board = boardOfDraft(draft, document);
  const region = flattenPath(
    boardPath(draft.outline === "piece" ? { ...board, outline: { kind: "rectangle" } } : board),
  );
  return new Map(
    draft.fixings.flatMap(({ id, fromX, fromY }): [string, string][] => {
      const at = { x: width / 2 + fromX, y: height / 2 + fromY };
      return regionContains(region, at) ? [] : [[id, "That is beside the board."]];
    }),
  );
}
