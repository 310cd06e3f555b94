import { bodyInFrame } from "#shared/frame/lay-out-frame.ts";
import type { Board, MockupDocument } from "#shared/mockup/document.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { gramsPerPound } from "#shared/units/mass.ts";
import { type BackerDraft, backerOfDraft, draftOfBacker, frameOfDraft } from "./backer-draft.ts";
import { type CoatDraft, coatOf, draftOfCoat } from "./coat-draft.ts";
import type { BoardFields } from "./commands/set-board.ts";
import { roundMm } from "./limits.ts";
import { boardOutline, outlineOfPiece } from "./outline-of-piece.ts";
import { isSame } from "./same.ts";
import type { StockChoices } from "./stock-choices.ts";

type Hanging = MockupDocument["hanging"];

/** A fixing by its way from the middle of the board, so that it keeps its place while the board's measures are written. */
export type FixingDraft = { readonly id: string; readonly fromX: number; readonly fromY: number };

/**
 * The board while it is being written: null is an empty field, NaN one that can't be read. Lengths mm; `carries` in the
 * shop's own unit, kg or lb. Width and height are those of the body, or of body and frame where `measures` says so and
 * there is a frame.
 */
export type BoardDraft = BackerDraft & {
  readonly outline: Board["outline"]["kind"] | "piece";
  readonly radius: number | null;
  readonly pieceId: string | null;
  readonly removePiece: boolean;
  readonly width: number | null;
  readonly height: number | null;
  readonly measures: Board["measures"];
  readonly finish: readonly CoatDraft[];
  readonly quantity: number | null;
  readonly kind: Hanging["kind"];
  readonly gap: number | null;
  readonly pose: Hanging["pose"];
  readonly carries: number | null;
  readonly fixings: readonly FixingDraft[];
  readonly azimuth: number;
  readonly viewingDistance: number | null;
  readonly wall: string;
};

const kgOf: Readonly<Record<LengthUnit, number>> = { mm: 1, in: gramsPerPound / 1000 };

/** The draft to begin with. Coats and fixings are numbered, so that the same document begins the same. */
export function draftOfBoard(
  document: MockupDocument,
  unit: LengthUnit,
  woods: StockChoices["woods"] = [],
): BoardDraft {
  const { board, backer, frame, hanging, presentation, quantity } = document;
  const round = frame && isOverall(board.outline.kind, board.measures) ? 2 * frame.width : 0;
  return {
    ...draftOfBacker(document, woods),
    outline: board.outline.kind,
    radius: board.outline.kind === "rounded" ? board.outline.radius : Math.min(board.width, board.height) / 10,
    pieceId: null,
    removePiece: false,
    width: round === 0 ? board.width : roundMm(board.width + round),
    height: round === 0 ? board.height : roundMm(board.height + round),
    measures: board.measures,
    finish: backer.finish.map((coat, index) => draftOfCoat(coat, `coat ${index}`)),
    quantity,
    kind: hanging.kind,
    gap: hanging.gap,
    pose: hanging.pose,
    carries: hanging.carriesKg === null ? null : Math.round((hanging.carriesKg / kgOf[unit]) * 100) / 100,
    fixings: hanging.points.map(({ x, y }, index) => ({
      id: `fixing ${index}`,
      fromX: x - board.width / 2,
      fromY: y - board.height / 2,
    })),
    azimuth: presentation.light.azimuth,
    viewingDistance: presentation.viewingDistance,
    wall: presentation.wall,
  };
}

/** Whether measures of such a board may include its frame: round other outlines it adds more than twice its width. */
const isOverall = (outline: BoardDraft["outline"], measures: Board["measures"]): boolean =>
  outline === "rectangle" && measures === "overall";

/** How much of a written measure is the frame's, mm. */
export function frameInMeasures(draft: BoardDraft): number {
  const frame = frameOfDraft(draft);
  return frame && isOverall(draft.outline, draft.measures) ? 2 * frame.width : 0;
}

/** The body that a draft stands for just now: the document's measures where what is written leaves none. */
export function measuresOf(draft: BoardDraft, { board }: MockupDocument) {
  const frame = frameOfDraft(draft);
  const within = (written: number | null): number | null => {
    if (written === null || !(written > 0)) return null;
    if (!frame || frameInMeasures(draft) === 0) return written;
    const body = bodyInFrame({ width: written, height: written }, frame.width);
    return body.ok ? roundMm(body.value.width) : null;
  };
  return { width: within(draft.width) ?? board.width, height: within(draft.height) ?? board.height };
}

/** The board as the draft has it, for a picture or a check; with the document's own outline until a piece is chosen. */
export function boardOfDraft(draft: BoardDraft, document: MockupDocument): Board {
  const size = measuresOf(draft, document);
  const piece = draft.outline === "piece" && draft.pieceId !== null ? outlineOfPiece(document, draft.pieceId) : null;
  const outline = piece ? boardOutline(piece, size) : outlineOfDraft(draft, document);
  return { outline, ...size, measures: draft.measures };
}

/** The board's outline as the draft has it; the document's own for the outline of a piece. */
export function outlineOfDraft({ outline, radius }: BoardDraft, { board }: MockupDocument): Board["outline"] {
  if (outline === "rounded") return { kind: "rounded", radius: radius !== null && radius > 0 ? radius : 1 };
  if (outline === "rectangle" || outline === "ellipse") return { kind: outline };
  return board.outline;
}

/**
 * What the draft changes of the board. Whatever it leaves alone is left out, so that it stays as it is to the last digit.
 * The draft must have no problems.
 */
export function fieldsOfDraft(draft: BoardDraft, document: MockupDocument, unit: LengthUnit): BoardFields {
  const start = draftOfBoard(document, unit);
  const same = (...keys: (keyof BoardDraft)[]) => keys.every((key) => isSame(draft[key], start[key]));
  const { width, height } = measuresOf(draft, document);
  const { stock, thickness, slats } = backerOfDraft(draft, []);
  const frame = frameOfDraft(draft);
  const isStill = (side: "width" | "height", mm: number) => mm === roundMm(document.board[side]);
  const { gap, carries, quantity, viewingDistance } = draft;
  const byPiece = draft.outline === "piece" && draft.pieceId !== null ? draft.pieceId : null;
  const isShaped = draft.outline === start.outline && (draft.outline !== "rounded" || same("radius"));
  const points = draft.fixings.map(({ fromX, fromY }) => ({
    x: roundMm(width / 2 + fromX),
    y: roundMm(height / 2 + fromY),
  }));
  return {
    ...(byPiece === null ? {} : { outlineOf: { pieceId: byPiece, remove: draft.removePiece } }),
    ...(byPiece !== null || isShaped ? {} : { outline: outlineOfDraft(draft, document) }),
    ...(isStill("width", roundMm(width)) ? {} : { width }),
    ...(isStill("height", roundMm(height)) ? {} : { height }),
    ...(same("measures") ? {} : { measures: draft.measures }),
    ...(isSame(stock, document.backer.stock) ? {} : { stock }),
    ...(thickness === document.backer.thickness ? {} : { thickness }),
    ...(isSame(slats, document.backer.slats) ? {} : { slats }),
    ...(isSame(frame, document.frame) ? {} : { frame }),
    ...(same("grainTurn") ? {} : { grainTurn: draft.grainTurn }),
    ...(same("finish") ? {} : { finish: draft.finish.flatMap((coat) => coatOf(coat) ?? []) }),
    ...(same("quantity") || quantity === null ? {} : { quantity }),
    hanging: {
      ...(same("kind") ? {} : { kind: draft.kind }),
      ...(same("gap") || gap === null ? {} : { gap }),
      ...(same("pose") ? {} : { pose: draft.pose }),
      ...(same("carries") ? {} : { carriesKg: carries === null ? null : roundMm(carries * kgOf[unit]) }),
      ...(same("fixings") ? {} : { points }),
    },
    ...(same("azimuth") ? {} : { light: { ...document.presentation.light, azimuth: draft.azimuth } }),
    ...(same("viewingDistance") || viewingDistance === null ? {} : { viewingDistance }),
    ...(same("wall") ? {} : { wall: draft.wall }),
  };
}
