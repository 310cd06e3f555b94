import { boxesOverlap, boxGrow, boxOfRegion } from "#shared/geometry/box.ts";
import { flattenPath } from "#shared/geometry/flatten.ts";
import type { Box, Region } from "#shared/geometry/path.ts";
import { placeRegion } from "#shared/geometry/placement.ts";
import { circlePath } from "#shared/geometry/shapes.ts";
import type { Level } from "#shared/hardware/hole-proposals.ts";
import { seenDiameterMm } from "#shared/hardware/standoff-parts.ts";
import type { Hardware, Layer, MockupDocument, Piece } from "#shared/mockup/document.ts";
import { boardPath } from "#shared/stack/board-outline.ts";

/** Coarse: a proposal is looked at and moved, and a layer can have hundreds of pieces. What keeps off keeps off that much more. */
const flatnessMm = 0.2;
/** So many of the largest pieces under a panel are tried as what it stands on. */
const mostGrounds = 3;

/** A piece's outline on the board, good enough to propose holes by. */
export const outlineOf = (piece: Piece): Region => placeRegion(flattenPath(piece.path, flatnessMm), piece.placement);

type Shape = { readonly outlines: Region; readonly box: Box };
type Boxed = Level & Shape;

const outlinesOf = (layers: readonly Layer[]): Shape[] =>
  layers.flatMap(({ pieces }) =>
    pieces.flatMap((piece) => {
      const outlines = outlineOf(piece);
      const box = boxOfRegion(outlines);
      return box ? [{ outlines, box }] : [];
    }),
  );

/**
 * What keeps the caps and feet of a layer's panels on one level, by everything else on the board. For a panel it gives
 * one set of outlines for each thing that it may stand on: the board first, then the largest pieces under it. `reach` is
 * how far from its panel a standoff may stand.
 */
export function holeGrounds(
  layer: Layer,
  {
    hardware,
    document,
    clearanceMm,
    reach,
  }: { hardware: Hardware; document: MockupDocument; clearanceMm: number; reach: number },
): (panel: Region) => Level[][] {
  const place = document.layers.findIndex(({ key }) => key === layer.key);
  const level = place < 0 ? document.layers.length : place;
  const over = document.layers.slice(level + 1);
  const foot = hardware.barrelDiameter;
  const front = (hardware.kind === "edgeGrip" ? foot : seenDiameterMm(hardware)) + 2 * (clearanceMm + flatnessMm);
  const lying = over.filter(({ hold }) => hold.kind !== "standoff");
  const clear = [
    ...outlinesOf(lying).map((shape): Boxed => ({ ...shape, diameter: front, side: "outside" })),
    ...over.flatMap(({ hold }) => barrelsOf(hold, front)),
  ];
  const below = outlinesOf(document.layers.slice(0, level)).toSorted(
    (a, b) => b.box.width * b.box.height - a.box.width * a.box.height,
  );
  const board: Level = { outlines: flattenPath(boardPath(document.board), flatnessMm), diameter: foot, side: "inside" };
  return (panel) => {
    const box = boxOfRegion(panel);
    if (!box) return [];
    const around = boxGrow(box, reach);
    const near = clear.filter((one) => boxesOverlap(one.box, around));
    const under = below.filter((one) => boxesOverlap(one.box, around));
    const standing = (on: Shape | null): Level[] =>
      under.map((shape) =>
        shape === on
          ? { ...shape, diameter: foot, side: "inside" }
          : { ...shape, diameter: foot + 2 * flatnessMm, side: "outside" },
      );
    return [null, ...under.slice(0, mostGrounds)].map((on) => [...near, board, ...standing(on)]);
  };
}

function barrelsOf(hold: Layer["hold"], diameter: number): Boxed[] {
  if (hold.kind !== "standoff") return [];
  const radius = hold.hardware.barrelDiameter / 2;
  return hold.holes.map((hole) => ({
    outlines: flattenPath(circlePath(hole, radius), flatnessMm),
    box: { x: hole.x - radius, y: hole.y - radius, width: 2 * radius, height: 2 * radius },
    diameter,
    side: "outside",
  }));
}
