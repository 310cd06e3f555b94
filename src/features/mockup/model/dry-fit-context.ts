import type { Brief } from "#shared/contracts/jobs.ts";
import type { StockItem } from "#shared/contracts/stock.ts";
import { stockOfItems } from "#shared/contracts/stock-on-hand.ts";
import type { DryFitContext } from "#shared/dry-fit/rule.ts";
import type { LengthUnit } from "#shared/units/length.ts";

/** What the dry fit knows besides the sign, as the server puts it together when it issues. */
export function dryFitContextOf({
  unit,
  brief,
  stock,
}: {
  unit: LengthUnit;
  brief: Brief;
  stock: readonly StockItem[];
}): DryFitContext {
  return {
    unit,
    place: brief.place ?? "inside",
    walkway: brief.walkway,
    overhead: brief.overhead,
    electrical: brief.electrical,
    words: brief.words,
    stock: stockOfItems(stock),
  };
}
