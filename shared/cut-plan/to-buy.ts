import { boxOfPath } from "../geometry/box.ts";
import type { Hardware, Screw } from "../mockup/document.ts";
import type { SheetLayout } from "../sheets/nesting.ts";
import type { CuttingPlan } from "../stock-lengths/plan-cutting.ts";
import { formatLengthWithUnit, formatSize } from "../units/format-length.ts";
import type { LengthUnit } from "../units/length.ts";
import type { BarTask } from "./bar-tasks.ts";
import type { Counts } from "./counts.ts";
import type { SheetTask } from "./sheet-tasks.ts";
import type { ShopSaws } from "./shop-saws.ts";

/** A line of what the build takes. Null where nobody counted, so that nothing can be said of it. */
export type ToBuy = {
  readonly what: string;
  readonly need: number;
  readonly onHand: number | null;
  readonly buy: number | null;
};

/** Pieces that the shop counted. */
export type CountedParts = {
  readonly hardware: readonly { readonly hardware: Hardware; readonly quantity: number | null }[];
  readonly screws: readonly { readonly screw: Screw; readonly quantity: number | null }[];
};

/** A task and how it came out; null while it is not laid out. */
export type SheetResult = {
  readonly task: SheetTask;
  readonly layout: SheetLayout | null;
  readonly bought: SheetLayout | null;
};
export type BarResult = { readonly task: BarTask; readonly plan: CuttingPlan | null };

/** What all signs of a document take, against what is on hand: sheets, boards, bars, hardware and screws, in that order. */
export function listToBuy({
  sheets,
  bars,
  counts,
  counted,
  saws,
  unit,
}: {
  readonly sheets: readonly SheetResult[];
  readonly bars: readonly BarResult[];
  readonly counts: Counts;
  readonly counted: CountedParts;
  readonly saws: Pick<ShopSaws, "usualSheetWidthMm" | "usualSheetHeightMm">;
  readonly unit: LengthUnit;
}): ToBuy[] {
  const usual = formatSize(saws.usualSheetWidthMm, saws.usualSheetHeightMm, unit);
  return [
    ...sheets.flatMap((result) => sheetLines(result, usual, unit)),
    boardLine(counts, unit),
    ...bars.flatMap(({ task, plan }) =>
      plan === null
        ? []
        : task.job.stock.flatMap(({ id }): ToBuy[] => {
            const need = plan.needed.find(({ stockId }) => stockId === id)?.bars ?? 0;
            return need > 0 ? [{ what: task.title, need, onHand: null, buy: null }] : [];
          }),
    ),
    ...counts.hardware.map(({ hardware, count }) =>
      against(
        hardware.name,
        count,
        quantityOf(counted.hardware, ({ hardware: one }) => isSameHardware(one, hardware)),
      ),
    ),
    ...counts.screws.map(({ screw, count }) =>
      against(
        screw.name,
        count,
        quantityOf(counted.screws, ({ screw: one }) => one.name === screw.name),
      ),
    ),
  ];
}

function sheetLines({ task, layout, bought }: SheetResult, usual: string, unit: LengthUnit): ToBuy[] {
  if (layout === null) return [];
  const stock = new Map(task.request.stock.map((sheet) => [sheet.id, sheet]));
  const lines = layout.needed.map(({ stockId, sheets: need }): ToBuy => {
    if (!task.sheetsAreCounted) return { what: `${task.title}, sheet ${usual}`, need, onHand: 0, buy: need };
    const sheet = stock.get(stockId);
    const box = sheet && boxOfPath(sheet.path);
    const size = box ? ` ${formatSize(box.width, box.height, unit)}` : "";
    return against(`${task.title}, sheet${size}`, need, sheet?.quantity ?? null);
  });
  const more = bought?.needed.reduce((sum, { sheets }) => sum + sheets, 0) ?? 0;
  return more > 0 ? [...lines, { what: `${task.title}, sheet ${usual}`, need: more, onHand: 0, buy: more }] : lines;
}

/** Wood is not counted in the stock list. */
function boardLine({ board: { stock, thicknessMm, widthMm, heightMm, count } }: Counts, unit: LengthUnit): ToBuy {
  const size = `${formatLengthWithUnit(thicknessMm, unit)}, ${formatSize(widthMm, heightMm, unit)}`;
  return { what: `Backer: ${stock}, ${size}`, need: count, onHand: null, buy: null };
}

const against = (what: string, need: number, onHand: number | null): ToBuy => ({
  what,
  need,
  onHand,
  buy: onHand === null ? null : Math.max(0, need - onHand),
});

const isSameHardware = (one: Hardware, other: Hardware): boolean =>
  one.stockId !== null && other.stockId !== null ? one.stockId === other.stockId : one.name === other.name;

/** Null when it is not in the list, or was not counted. */
function quantityOf<T extends { readonly quantity: number | null }>(
  list: readonly T[],
  isMeant: (one: T) => boolean,
): number | null {
  return list.find(isMeant)?.quantity ?? null;
}
