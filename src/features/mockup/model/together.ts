import { boxOfPath, boxUnion } from "#shared/geometry/box.ts";
import type { Box, Path } from "#shared/geometry/path.ts";
import { placePath } from "#shared/geometry/placement.ts";
import { pathTransform, rotateMatrix } from "#shared/geometry/transform.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { Stretch } from "#shared/setting-out/step-along.ts";
import { movableOf } from "./commands/piece-motion.ts";
import { layerOfPiece } from "./selection.ts";

/** What of the chosen keeps its places to one another while it is set out. */
export type Together = "each piece" | "each layer" | "all as one";
export const togethers: readonly Together[] = ["each piece", "each layer", "all as one"];

/** The chosen pieces that can be moved, in heaps that move as one, in the order chosen. */
export function heapsOf(document: MockupDocument, pieceIds: readonly string[], together: Together): string[][] {
  const ids = movableOf(document, pieceIds);
  if (ids.length === 0) return [];
  if (together === "all as one") return [ids];
  if (together === "each piece") return ids.map((id) => [id]);
  const byLayer = new Map<string, string[]>();
  for (const id of ids) {
    const key = layerOfPiece(document, id)?.key ?? "";
    byLayer.set(key, [...(byLayer.get(key) ?? []), id]);
  }
  return [...byLayer.values()];
}

/** Pieces are set out one by one, unless whole layers are chosen: then those. */
export function usualTogether(document: MockupDocument, pieceIds: readonly string[]): Together {
  const chosen = new Set(pieceIds);
  const touched = document.layers.filter(({ pieces }) => pieces.some(({ id }) => chosen.has(id)));
  const areWhole = touched.every(({ pieces }) => pieces.every(({ id }) => chosen.has(id)));
  if (!areWhole) return "each piece";
  return touched.length > 1 ? "each layer" : "all as one";
}

/** Outlines of pieces where they lie on the board. */
export function outlinesOf(document: MockupDocument, pieceIds: readonly string[]): Path[] {
  const chosen = new Set(pieceIds);
  return document.layers.flatMap(({ pieces }) =>
    pieces.filter(({ id }) => chosen.has(id)).map(({ path, placement }) => placePath(path, placement)),
  );
}

/** The boxes of heaps, one each; heaps without an outline are left out. */
export function boxesOfHeaps(document: MockupDocument, heaps: readonly string[][]): { ids: string[]; box: Box }[] {
  return heaps.flatMap((ids) => {
    const box = boxUnion(outlinesOf(document, ids).map(boxOfPath));
    return box ? [{ ids, box }] : [];
  });
}

/** What pieces take of a line that runs at an angle, degrees clockwise from the x axis; null when they have no outline. */
export function stretchOf(document: MockupDocument, pieceIds: readonly string[], angle: number): Stretch | null {
  const level = rotateMatrix(-angle);
  const box = boxUnion(outlinesOf(document, pieceIds).map((path) => boxOfPath(pathTransform(path, level))));
  return box && { from: box.x, to: box.x + box.width };
}
