import { type ChosenSheets, countedMm2, type SheetKind } from "./choose-sheets.ts";
import type { FillControl, Filler, LaidCopy, OpenField } from "./filler.ts";

/**
 * Puts what lies on the last sheet on a cheaper one where it fits: the search has drawn pieces forward since the sheets
 * were chosen. Gives the same when there is none.
 */
export function exchangeLast(
  chosen: ChosenSheets,
  kinds: readonly SheetKind[],
  filler: Filler,
  control: FillControl,
): ChosenSheets {
  const { open, filling } = chosen;
  const last = open[filling.laid.reduce((most, { on }) => Math.max(most, on), -1)];
  if (!last) return chosen;
  const isLast = ({ field, sheet }: OpenField) => field.stock.id === last.field.stock.id && sheet === last.sheet;
  const first = open.findIndex(isLast);
  const items = filling.laid.filter(({ on }) => on >= first).map(({ item }) => item);
  const taken = (stockId: string) =>
    new Set(open.slice(0, first).flatMap(({ field, sheet }) => (field.stock.id === stockId ? [sheet] : []))).size;
  const costOf = (stockId: string) => {
    const kind = kinds.find(({ stock }) => stock.id === stockId);
    return kind ? countedMm2(kind) : 0;
  };
  const cheaper = kinds
    .filter(({ stock }) => stock.quantity === null || taken(stock.id) < stock.quantity)
    .filter((kind) => countedMm2(kind) < costOf(last.field.stock.id))
    .toSorted((a, b) => countedMm2(a) - countedMm2(b));
  for (const { stock, fields } of cheaper) {
    const sheet = fields.map((field): OpenField => ({ field, sheet: taken(stock.id) + 1 }));
    const tried = filler.fill(items, sheet, control);
    if (tried.left.length > 0) continue;
    const moved = tried.laid.map((copy): LaidCopy => ({ ...copy, on: first + copy.on }));
    const laid = [...filling.laid.filter(({ on }) => on < first), ...moved];
    return { open: [...open.slice(0, first), ...sheet], filling: { laid, left: filling.left } };
  }
  return chosen;
}
