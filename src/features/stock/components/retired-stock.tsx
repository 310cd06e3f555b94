import { useInfiniteQuery } from "@tanstack/react-query";
import { useState } from "react";
import type { StockItem } from "#shared/contracts/stock.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { itemsOf } from "@/lib/pages-query.ts";
import { retiredStockQuery } from "../api/queries.ts";
import { StockRow } from "./stock-row.tsx";

type RetiredStockProps = {
  readonly shop: string;
  readonly unit: LengthUnit;
  /** null where the reader may only look. */
  readonly onBringBack: ((item: StockItem) => void) | null;
};

/** What was taken out of stock, shown when asked for. */
export function RetiredStock(props: RetiredStockProps) {
  const [open, setOpen] = useState(false);
  return (
    <section aria-labelledby="stock-retired">
      <div className="flex min-h-11 flex-wrap items-end justify-between gap-x-6 gap-y-2 border-b-2 border-ink pb-2">
        <h2 id="stock-retired" className="font-serif text-lg font-bold">
          No longer in stock
        </h2>
        <Button size="small" aria-expanded={open} onClick={() => setOpen(!open)}>
          {open ? "Hide it" : "Show it"}
        </Button>
      </div>
      {open && <RetiredList {...props} />}
    </section>
  );
}

function RetiredList({ shop, unit, onBringBack }: RetiredStockProps) {
  const stock = useInfiniteQuery(retiredStockQuery(shop));
  const rows = itemsOf(stock.data);
  if (stock.isPending) return <Skeleton label="Loading what is no longer in stock" rows={2} />;
  if (stock.isError && rows.length === 0)
    return (
      <ProblemNotice
        what="What is no longer in stock could not be loaded."
        error={stock.error}
        onRetry={() => void stock.refetch()}
      />
    );
  if (rows.length === 0)
    return (
      <p className="py-3 text-base text-graphite">
        Nothing was taken out. What is taken out stays here, since drawings name it.
      </p>
    );
  return (
    <>
      <ul>
        {rows.map((item) => (
          <StockRow key={item.id} item={item} unit={unit}>
            {onBringBack && (
              <Button size="small" aria-label={`Bring back ${item.name}`} onClick={() => onBringBack(item)}>
                Bring back
              </Button>
            )}
          </StockRow>
        ))}
      </ul>
      <ShowMore query={stock} what="of them" />
    </>
  );
}
