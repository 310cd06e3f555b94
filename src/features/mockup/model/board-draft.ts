import type { Board, MockupDocument, Wood } from "#shared/mockup/document.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { gramsPerPound } from "#shared/units/mass.ts";
import { type CoatDraft, coatOf, draftOfCoat } from "./coat-draft.ts";
import type { BoardFields } from "./commands/set-board.ts";
import { roundMm } from "./limits.ts";
import { isSame } from "./same.ts";

type Hanging = MockupDocument["hanging"];

/** A fixing by its way from the middle of the board, so that it keeps its place while the board's measures are written. */
export type FixingDraft = { readonly id: string; readonly fromX: number; readonly fromY: number };

/**
 * The board while it is being written: null is an empty field, NaN one that can't be read. Lengths mm; `carries` in the
 * shop's own unit, kg or lb.
 */
export type BoardDraft = {
  readonly outline: Board["outline"]["kind"] | "piece";
  readonly radius: number | null;
  readonly pieceId: string | null;
  readonly removePiece: boolean;
  readonly width: number | null;
  readonly height: number | null;
  readonly stock: Wood;
  readonly thickness: number;
  readonly grainTurn: number;
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
export function draftOfBoard(document: MockupDocument, unit: LengthUnit): BoardDraft {
  const { board, backer, hanging, presentation, quantity } = document;
  return {
    outline: board.outline.kind,
    radius: board.outline.kind === "rounded" ? board.outline.radius : Math.min(board.width, board.height) / 10,
    pieceId: null,
    removePiece: false,
    width: board.width,
    height: board.height,
    stock: backer.stock,
    thickness: backer.thickness,
    grainTurn: backer.grainTurn,
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

/** The measures that a draft stands for just now: those of the document where what is written is no length. */
export function measuresOf({ width, height }: Pick<BoardDraft, "width" | "height">, { board }: MockupDocument) {
  const known = (written: number | null, before: number) => (written !== null && written > 0 ? written : before);
  return { width: known(width, board.width), height: known(height, board.height) };
}

/** The board's outline as the draft has it, for a picture or a check; the document's own for the outline of a piece. */
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
    ...(same("width") ? {} : { width }),
    ...(same("height") ? {} : { height }),
    ...(same("stock") ? {} : { stock: draft.stock }),
    ...(same("thickness") ? {} : { thickness: draft.thickness }),
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
