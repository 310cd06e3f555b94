import type { Point } from "../geometry/path.ts";
import type { LengthUnit } from "../units/length.ts";

export type ChangeKind =
  | "board"
  | "backer"
  | "hanging"
  | "quantity"
  | "presentation"
  | "layer"
  | "colour"
  | "thickness"
  | "hold"
  | "offset"
  | "holes"
  | "order"
  | "moved"
  | "resized"
  | "turned"
  | "redrawn"
  | "come"
  | "gone";

/**
 * One difference between two documents, in words. `where` is a spot on the later board, or on the earlier one for what
 * is gone.
 */
export type Change = {
  readonly kind: ChangeKind;
  readonly text: string;
  readonly layerKey: string | null;
  readonly pieceIds: readonly string[];
  readonly where: Point | null;
};

/** How lengths are written in the words. */
export type Wording = { readonly unit: LengthUnit };

/** "pieces" with their number. */
export const countOf = (count: number, one: string, many = `${one}s`): string => `${count} ${count === 1 ? one : many}`;

/** Whether two plain values are the same, whatever stock entry they were copied from. */
export function sameThing(a: unknown, b: unknown): boolean {
  return JSON.stringify(a, withoutStockId) === JSON.stringify(b, withoutStockId);
}

function withoutStockId(key: string, value: unknown): unknown {
  return key === "stockId" ? undefined : value;
}
