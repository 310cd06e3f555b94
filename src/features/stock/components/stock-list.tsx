import { useInfiniteQuery } from "@tanstack/react-query";
import type { StockItem } from "#shared/contracts/stock.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { itemsOf } from "@/lib/pages-query.ts";
import { stockQuery } from "../api/queries.ts";
import { stockFacts } from "./stock-facts.ts";
import { Swatch } from "./swatch.tsx";

/** One kind of stock with what a maker chooses by: colour, look, thicknesses. */
export function StockList({
  shop,
  kind,
  title,
  unit,
}: {
  readonly shop: string;
  readonly kind: StockItem["kind"];
  readonly title: string;
  readonly unit: LengthUnit;
}) {
  const stock = useInfiniteQuery(stockQuery(shop, kind));
  const rows = itemsOf(stock.data);
  return (
    <section aria-labelledby={`stock-${kind}`}>
      <h2 id={`stock-${kind}`} className="mb-2 font-serif text-lg font-bold">
        {title}
      </h2>
      {stock.isPending ? (
        <Skeleton label={`Loading ${title}`} rows={3} />
      ) : stock.isError ? (
        <ProblemNotice
          what={`${title} could not be loaded.`}
          error={stock.error}
          onRetry={() => void stock.refetch()}
        />
      ) : rows.length === 0 ? (
        <EmptyState title="None on hand">Nothing of this kind is in the shop's stock list yet.</EmptyState>
      ) : (
        <ul className="border-t border-rule">
          {rows.map((item) => {
            const { colour, swatch, what, amount } = stockFacts(item, unit);
            return (
              <li key={item.id} className="flex items-center gap-4 border-b border-rule py-2.5">
                {colour && <Swatch colour={colour} kind={swatch} />}
                <span className="grid min-w-0 flex-1 gap-x-6 sm:grid-cols-[minmax(0,1fr)_minmax(0,1.2fr)_minmax(0,0.8fr)]">
                  <span className="font-semibold">{item.name}</span>
                  <span className="text-sm text-graphite">{what}</span>
                  <span className="text-sm tabular-nums">{amount}</span>
                </span>
              </li>
            );
          })}
        </ul>
      )}
      <ShowMore query={stock} what="stock" />
    </section>
  );
}
