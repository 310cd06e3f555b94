import type { Box, Path, Region } from "../geometry/path.ts";

/**
 * How a piece may be turned on a sheet. "steps" are degrees clockwise against the sheet's grain: `from`, and on from there
 * by `every`, so that { from: 0, every: 180 } keeps the piece's own x axis along the grain and { from: 0, every: 360 }
 * leaves it as it is drawn.
 */
export type AllowedTurns =
  | { readonly kind: "free" }
  | { readonly kind: "steps"; readonly from: number; readonly every: number };

/** A shape to be cut, in its own plane, and how often. Rings inside rings are openings, which other pieces may use. */
export type SheetPiece = {
  readonly id: string;
  /** What messages call it. */
  readonly name: string;
  readonly path: Path;
  readonly quantity: number;
  readonly turns: AllowedTurns;
  /** Whether it may be cut face down: only where both faces of the sheet are alike. */
  readonly mayMirror: boolean;
};

/** A kind of sheet in stock: full sheets or offcuts of any closed outline, with openings where something was cut out before. */
export type StockSheet = {
  readonly id: string;
  readonly name: string;
  readonly path: Path;
  /** How many there are; null when more can be bought. */
  readonly quantity: number | null;
  /** Direction of grain or brush in degrees clockwise from the sheet's x axis; 0 where there is none. */
  readonly grainTurn: number;
  /** Left over from another job: taken before a full sheet when it is filled half as well. */
  readonly isOffcut: boolean;
};

export type CuttingRules = {
  /** Between a piece and the sheet's edge, at least. */
  readonly marginMm: number;
  /** What the cut takes away. */
  readonly kerfMm: number;
  /** What must stand between two neighbours beside one kerf. */
  readonly spacingMm: number;
  /** What the machine takes; a larger sheet is cut up for it or not used. Null when every sheet goes on it. */
  readonly bed: {
    readonly widthMm: number;
    readonly heightMm: number;
    readonly larger: "split" | "refuse";
  } | null;
  /** An offcut is kept when both its sides are at least this long. */
  readonly leastOffcutMm: number;
};

export type NestingRequest = {
  readonly pieces: readonly SheetPiece[];
  readonly stock: readonly StockSheet[];
  readonly rules: CuttingRules;
  /** Same request, same seed: same layout. */
  readonly seed: number;
  /** How much is searched, in units that take a workshop's computer about a second; 0 for the first layout only. */
  readonly effort: number;
};

/** Where a copy lies: mirrored left to right first if at all, turned clockwise about its own origin, then moved. */
export type PiecePlacement = {
  readonly pieceId: string;
  /** From 1. */
  readonly copy: number;
  readonly x: number;
  readonly y: number;
  readonly turn: number;
  readonly mirrored: boolean;
};

/** One sheet, or one part of a sheet that was too large for the bed, with what is cut from it. */
export type NestedSheet = {
  readonly stockId: string;
  /** Which sheet of its kind, from 1. */
  readonly sheet: number;
  /** Which part of the sheet, from 1, out of `parts`; a sheet that goes on the bed has one. */
  readonly part: number;
  readonly parts: number;
  readonly region: Region;
  readonly placements: readonly PiecePlacement[];
  /** Area of the pieces as a share of the whole sheet. */
  readonly use: number;
  /** Around all pieces; null for a part that nothing is cut from. */
  readonly usedBox: Box | null;
  /** What straight cuts beside the pieces leave for another job. */
  readonly offcuts: readonly Region[];
};

export type UnplacedReason = "larger than every sheet" | "no sheet left" | "stopped" | "no safe place";

export type UnplacedPiece = {
  readonly pieceId: string;
  readonly copies: number;
  readonly reason: UnplacedReason;
  readonly words: string;
};

export type SheetLayout = {
  readonly sheets: readonly NestedSheet[];
  /** Sheets of each kind that are cut into: what must be on hand or bought. */
  readonly needed: readonly { readonly stockId: string; readonly sheets: number }[];
  readonly unplaced: readonly UnplacedPiece[];
  /** Area of the pieces as a share of what the sheets lose to them: all of a sheet, of the last only up to the last piece. */
  readonly use: number;
  /** That area in mm². */
  readonly consumedMm2: number;
  /** What a reader must know of the stock, as a sheet that is larger than the bed. */
  readonly remarks: readonly string[];
  /** True when it was told to stop before its search was over. */
  readonly stopped: boolean;
};

/** What the work says of itself now and then. */
export type NestingProgress = {
  /** Of the search, 0 to 1. */
  readonly done: number;
  readonly placedCopies: number;
  readonly sheets: number;
  /** Of the best layout so far, as SheetLayout has it. */
  readonly use: number;
  /** That layout, finished as if the search had been stopped here: some work, so asked for now and then only. */
  readonly layout: () => SheetLayout;
};

/** Both are called during the work: who must hear of messages meanwhile keeps the last layout told and ends the worker. */
export type NestingControl = {
  /** Asked every few milliseconds; true ends the search with the best so far. */
  readonly shouldStop?: () => boolean;
  readonly onProgress?: (progress: NestingProgress) => void;
};
