import type { ReactNode } from "react";
import type { StockItem } from "#shared/contracts/stock.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { stockFacts } from "./stock-facts.ts";
import { Swatch } from "./swatch.tsx";

/** One item with what a maker chooses by: colour, look, thicknesses, amount; `children` are what can be done with it. */
export function StockRow({
  item,
  unit,
  children,
}: {
  readonly item: StockItem;
  readonly unit: LengthUnit;
  readonly children?: ReactNode;
}) {
  const { colour, swatch, what, amount, more } = stockFacts(item, unit);
  return (
    <li className="flex flex-wrap items-start gap-x-4 gap-y-2 border-b border-rule py-2.5 lg:flex-nowrap">
      {colour ? <Swatch colour={colour} kind={swatch} /> : <span className="hidden w-10 shrink-0 sm:block" />}
      <div className="grid min-w-0 flex-1 gap-x-6 pt-0.5 sm:grid-cols-[minmax(0,1fr)_minmax(0,1.2fr)_minmax(0,1fr)]">
        <p className="font-semibold">{item.name}</p>
        <p className="text-sm text-graphite">{what}</p>
        <div className="text-sm tabular-nums">
          <p>{amount}</p>
          {more.map((line) => (
            <p key={line} className="text-graphite">
              {line}
            </p>
          ))}
        </div>
      </div>
      {children && <div className="flex w-full flex-wrap gap-2 lg:w-64 lg:shrink-0 lg:justify-end">{children}</div>}
    </li>
  );
}
