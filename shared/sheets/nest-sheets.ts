import type { Kernel } from "../geometry/kernel.ts";
import type { Region } from "../geometry/path.ts";
import { smallestBox } from "../geometry/smallest-box.ts";
import { checkNumbers, checkOutline, type NestingProblem } from "./check-nesting.ts";
import { areaOf, type ChosenSheets, chooseSheets, type SheetKind } from "./choose-sheets.ts";
import { type CutShape, cutShape } from "./cut-shape.ts";
import { exchangeLast } from "./exchange-last.ts";
import type { Filler, Filling, Item, OpenField } from "./filler.ts";
import { consumedMm2, nestedSheets } from "./nested-sheets.ts";
import type { NestingControl, NestingRequest, SheetLayout } from "./nesting.ts";
import { rectangleFiller } from "./rectangle-filler.ts";
import { sidesAlongAxes } from "./rectangle-turns.ts";
import { shapeFiller } from "./shape-filler.ts";
import { fieldsOfSheet } from "./sheet-field.ts";
import { unplacedPieces } from "./unplaced.ts";

export type NestingOutcome =
  | { readonly ok: true; readonly value: SheetLayout }
  | { readonly ok: false; readonly problems: readonly NestingProblem[] };

/**
 * Lays pieces on sheets from stock so that the sheets lose little: no two nearer than kerf and spacing, none over a
 * margin, turned and mirrored only as they may be, small ones in the openings of others. The search ends after
 * `request.effort`, which counts work and not time, so that the same request gives the same layout; or with the best so
 * far when told to stop. What can't be laid is listed with the reason.
 */
export function nestSheets(request: NestingRequest, control: NestingControl, kernel: Kernel): NestingOutcome {
  let stopped = false;
  const shouldStop = (): boolean => {
    stopped ||= control.shouldStop?.() ?? false;
    return stopped;
  };
  const read = readRequest(request, kernel);
  if (!read.ok) return read;
  const { kinds, regions, remarks } = read;
  const { rules } = request;
  const gapMm = rules.kerfMm + rules.spacingMm;
  const shapes = request.pieces.map((piece, index) => cutShape(piece, regions[index] ?? [], gapMm / 2, kernel));
  const filler = fillerFor(shapes, kinds, gapMm, kernel);
  const fields = kinds.flatMap((kind) => kind.fields);
  const fitting = shapes.map((_, shape) => shouldStop() || fields.some((field) => filler.fits(shape, field)));
  const items = itemsOf(shapes);
  const toLay = items.filter(({ shape }) => fitting[shape]);

  const chosen = chooseSheets(toLay, kinds, shapes, filler, { seed: request.seed, shouldStop });
  const { open } = chosen;
  const finished = ({ open: used, filling }: ChosenSheets, isStopped: boolean): SheetLayout => {
    const { sheets, laid, faulty } = nestedSheets(filling, used, shapes, rules, kernel);
    const consumed = consumedMm2(laid, used);
    return {
      sheets,
      needed: neededSheets(request.stock, sheets),
      unplaced: unplacedPieces({ items, shapes, laid, faulty, fitting, fields, stopped: isStopped }),
      use: consumed > 0 ? areaOf({ laid, left: [] }, shapes) / consumed : 0,
      consumedMm2: consumed,
      remarks,
      stopped: isStopped,
    };
  };
  if (request.effort === 0 || shouldStop()) return { ok: true, value: finished(chosen, stopped) };

  const probes = request.effort * filler.probesPerSecond;
  const { seed } = request;
  const searched = filler.fill(toLay, open, {
    probes,
    seed,
    shouldStop,
    onProgress: (done, best) => {
      const layout = () => finished({ open, filling: better(best, chosen.filling, open, shapes) }, true);
      control.onProgress?.({ done, ...progressOf(best, open, shapes), layout });
    },
  });
  const filling = better(searched, chosen.filling, open, shapes);
  // A tenth of the search again is enough for one sheet.
  const last = { probes: probes / 10, seed, shouldStop, onProgress: () => undefined };
  return { ok: true, value: finished(exchangeLast({ open, filling }, kinds, filler, last), stopped) };
}

/** How many sheets of each kind are cut into, in the order of the stock. */
function neededSheets(stock: NestingRequest["stock"], sheets: SheetLayout["sheets"]): SheetLayout["needed"] {
  return stock.flatMap(({ id }) => {
    const numbers = new Set(sheets.flatMap(({ stockId, sheet }) => (stockId === id ? [sheet] : [])));
    return numbers.size > 0 ? [{ stockId: id, sheets: numbers.size }] : [];
  });
}

type ReadRequest =
  | {
      readonly ok: true;
      readonly kinds: readonly SheetKind[];
      readonly regions: readonly Region[];
      readonly remarks: readonly string[];
    }
  | { readonly ok: false; readonly problems: readonly NestingProblem[] };

function readRequest(request: NestingRequest, kernel: Kernel): ReadRequest {
  const problems = checkNumbers(request);
  if (problems.length > 0) return { ok: false, problems };
  const regions: Region[] = [];
  for (const [index, piece] of request.pieces.entries()) {
    const outline = checkOutline(piece.name, piece.path, kernel);
    if (outline.ok) regions.push(outline.region);
    else problems.push({ field: `pieces.${index}.path`, words: outline.words });
  }
  const kinds: SheetKind[] = [];
  const remarks: string[] = [];
  for (const [index, stock] of request.stock.entries()) {
    const outline = checkOutline(stock.name, stock.path, kernel);
    if (!outline.ok) {
      problems.push({ field: `stock.${index}.path`, words: outline.words });
      continue;
    }
    const cut = fieldsOfSheet(stock, outline.region, request.rules, kernel);
    if (cut.remark !== null) remarks.push(cut.remark);
    if (cut.ok) kinds.push({ stock, fields: cut.fields });
  }
  if (problems.length === 0 && kinds.length === 0)
    problems.push({ field: "stock", words: ["No sheet in stock can be used.", ...remarks].join(" ") });
  return problems.length > 0 ? { ok: false, problems } : { ok: true, kinds, regions, remarks };
}

/**
 * Rectangles on rectangles have a way of their own, which is exact and quicker. It lays them along the sheet's sides; one
 * that may be turned freely and fits only aslant needs the other.
 */
function fillerFor(shapes: readonly CutShape[], kinds: readonly SheetKind[], gapMm: number, kernel: Kernel): Filler {
  const isAllRectangles = kinds.every(
    ({ stock, fields }) =>
      fields.every(({ allowed }) => allowed === null) &&
      shapes.every((shape) => sidesAlongAxes(shape, stock.grainTurn).length > 0),
  );
  if (!isAllRectangles) return shapeFiller(shapes, gapMm / 2, kernel);
  const straight = rectangleFiller(shapes, gapMm);
  const fields = kinds.flatMap((kind) => kind.fields);
  const mayFitAslant = shapes.some(({ piece, region }, shape) => {
    if (piece.turns.kind !== "free" || fields.some((field) => straight.fits(shape, field))) return false;
    const length = smallestBox(region)?.length ?? 0;
    return fields.some(({ inner }) => length < Math.hypot(inner.width, inner.height));
  });
  return mayFitAslant ? shapeFiller(shapes, gapMm / 2, kernel) : straight;
}

function itemsOf(shapes: readonly CutShape[]): Item[] {
  const items: Item[] = [];
  for (const [shape, { piece }] of shapes.entries())
    for (let copy = 1; copy <= piece.quantity; copy++) items.push({ index: items.length, shape, copy });
  return items;
}

/** Of two fillings the one that leaves less, then the one whose sheets lose less. */
function better(a: Filling, b: Filling, open: readonly OpenField[], shapes: readonly CutShape[]): Filling {
  const laidA = areaOf(a, shapes);
  const laidB = areaOf(b, shapes);
  if (Math.abs(laidA - laidB) > 1e-6) return laidA > laidB ? a : b;
  return consumedMm2(a.laid, open) <= consumedMm2(b.laid, open) ? a : b;
}

function progressOf(filling: Filling, open: readonly OpenField[], shapes: readonly CutShape[]) {
  const consumed = consumedMm2(filling.laid, open);
  const sheets = new Set(filling.laid.map(({ on }) => `${open[on]?.field.stock.id} ${open[on]?.sheet}`));
  return {
    placedCopies: filling.laid.length,
    sheets: sheets.size,
    use: consumed > 0 ? areaOf(filling, shapes) / consumed : 0,
  };
}
