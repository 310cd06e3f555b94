import { boxOfPoints } from "../geometry/box.ts";
import type { Kernel } from "../geometry/kernel.ts";
import type { CutShape } from "./cut-shape.ts";
import type { FillControl, Filler, Filling, Item, OpenField } from "./filler.ts";
import { mostSlackMm } from "./grown-outline.ts";
import { seededNumbers } from "./random.ts";
import { type Arrangement, arrangementOf, improve, layInOrder } from "./shape-search.ts";
import type { SheetField } from "./sheet-field.ts";
import { type Bin, findLaying, type Ground, groundOf, openBin } from "./yard.ts";

/** More copies than this are laid in one order only before the search. */
const manyItems = 300;
/** About how many cells a piece's box is long: fewer where there are many pieces, so that a first layout takes no longer. */
function cellsPerPiece(pieces: number): number {
  if (pieces <= 400) return 70;
  return pieces <= 1500 ? 45 : 25;
}

/** Grids are not made larger than this, nor cells smaller. */
const mostCells = 600_000;
const leastCellMm = 0.2;

/** Fills fields of any outline with shapes of any outline, on cells. */
export function shapeFiller(shapes: readonly CutShape[], halfGapMm: number, kernel: Kernel): Filler {
  const padMm = halfGapMm + mostSlackMm;
  const grounds = new Map<SheetField, Ground>();
  const groundOn = (field: SheetField): Ground => {
    const known = grounds.get(field);
    if (known) return known;
    const made = groundOf(field, shapes, { cellMm: cellOf(field, shapes), padMm }, kernel);
    grounds.set(field, made);
    return made;
  };

  const fill = (items: readonly Item[], open: readonly OpenField[], control: FillControl): Filling => {
    const meter = { probes: 0 };
    const openBins = () => open.map(({ field, sheet }) => openBin(groundOn(field), sheet));
    let best: { bins: Bin[]; arrangement: Arrangement } | null = null;
    const orders = startingOrders(items, shapes);
    for (const order of items.length > manyItems ? orders.slice(0, 1) : orders) {
      const bins = openBins();
      const left = layInOrder(order, bins, meter, control.shouldStop);
      const arrangement = arrangementOf(bins, left, shapes);
      if (!best || arrangement.cost < best.arrangement.cost) best = { bins, arrangement };
      if (control.shouldStop()) break;
    }
    if (!best) return { laid: [], left: items };
    const { bins } = best;
    const found = improve(best.arrangement, bins, shapes, {
      meter,
      probes: control.probes,
      random: seededNumbers(control.seed),
      shouldStop: control.shouldStop,
      onProgress: (done, better) => control.onProgress(done, fillingOf(better, bins)),
    });
    return fillingOf(found, bins);
  };

  // Nothing is ever laid in these, so one of each kind is enough.
  const emptyBins = new Map<SheetField, Bin>();
  const fits = (shape: number, field: SheetField): boolean => {
    const bin = emptyBins.get(field) ?? openBin(groundOn(field), 1);
    emptyBins.set(field, bin);
    return findLaying({ index: 0, shape, copy: 1 }, bin, { probes: 0 }) !== null;
  };

  return { fill, fits, probesPerSecond: 80_000_000 };
}

function fillingOf({ layings, left }: Arrangement, bins: readonly Bin[]): Filling {
  const on = new Map(bins.map((bin, index) => [bin, index]));
  const laid = layings.map(({ item, bin, way, column, row }) => {
    const { cell, field } = bin.ground;
    const [x, y] = cell.along === "x" ? [column * cell.u, row * cell.v] : [row * cell.v, column * cell.u];
    return { item, on: on.get(bin) ?? 0, laid: way.laid, x: field.inner.x + x, y: field.inner.y + y };
  });
  return { laid, left };
}

function cellOf({ inner }: SheetField, shapes: readonly CutShape[]): number {
  const sizes = shapes.map(({ region }) => Math.sqrt(boxArea(region.flat()))).sort((a, b) => a - b);
  const usual = sizes[Math.floor(sizes.length / 2)] ?? 0;
  const coarsest = Math.max(inner.width, inner.height) / 30_000;
  return Math.max(
    leastCellMm,
    usual / cellsPerPiece(shapes.length),
    Math.sqrt((inner.width * inner.height) / mostCells),
    coarsest,
  );
}

function boxArea(points: readonly { readonly x: number; readonly y: number }[]): number {
  const box = boxOfPoints(points);
  return box ? box.width * box.height : 0;
}

function startingOrders(items: readonly Item[], shapes: readonly CutShape[]): Item[][] {
  const box = shapes.map(({ region }) => boxOfPoints(region.flat()) ?? { x: 0, y: 0, width: 0, height: 0 });
  const keys: readonly ((shape: number) => number)[] = [
    (shape) => shapes[shape]?.areaMm2 ?? 0,
    (shape) => (box[shape]?.width ?? 0) * (box[shape]?.height ?? 0),
    (shape) => Math.max(box[shape]?.width ?? 0, box[shape]?.height ?? 0),
  ];
  return keys.map((key) => items.toSorted((a, b) => key(b.shape) - key(a.shape) || a.index - b.index));
}
