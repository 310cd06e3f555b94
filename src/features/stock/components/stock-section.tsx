import { useInfiniteQuery } from "@tanstack/react-query";
import type { StockItem } from "#shared/contracts/stock.ts";
import type { StockKind } from "#shared/contracts/stock-entry.ts";
import type { LengthUnit } from "#shared/units/length.ts";
import { Button } from "@/components/ui/button.tsx";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { itemsOf } from "@/lib/pages-query.ts";
import { stockQuery } from "../api/queries.ts";
import { kindWords } from "./kind-words.ts";
import { StockRow } from "./stock-row.tsx";

export type StockActions = {
  readonly onAdd: (kind: StockKind) => void;
  readonly onChange: (item: StockItem) => void;
  readonly onCount: (item: Extract<StockItem, { kind: "hardware" | "screw" }>) => void;
  readonly onTakeOut: (item: StockItem) => void;
};

/** One kind of stock by name. */
export function StockSection({
  shop,
  kind,
  q,
  unit,
  actions,
}: {
  readonly shop: string;
  readonly kind: StockKind;
  /** A part of the name that is looked for. */
  readonly q: string;
  readonly unit: LengthUnit;
  /** null where the reader may only look. */
  readonly actions: StockActions | null;
}) {
  const stock = useInfiniteQuery(stockQuery(shop, { kind, q }));
  const rows = itemsOf(stock.data);
  const { title, one } = kindWords[kind];
  const add = actions && (
    <Button size="small" onClick={() => actions.onAdd(kind)}>
      Add {one}
    </Button>
  );
  return (
    <section aria-labelledby={`stock-${kind}`}>
      <div className="flex min-h-11 flex-wrap items-end justify-between gap-x-6 gap-y-2 border-b-2 border-ink pb-2">
        <h2 id={`stock-${kind}`} className="font-serif text-lg font-bold">
          {title}
        </h2>
        {add}
      </div>
      {stock.isPending ? (
        <div className="mt-3">
          <Skeleton label={`Loading ${title}`} rows={3} />
        </div>
      ) : stock.isError && rows.length === 0 ? (
        <ProblemNotice
          what={`${title} could not be loaded.`}
          error={stock.error}
          onRetry={() => void stock.refetch()}
        />
      ) : rows.length === 0 ? (
        q === "" ? (
          <EmptyState title={`No ${title.toLowerCase()} in stock yet`}>
            {actions
              ? `Mockups offer what stands here. Add ${one}, or bring in the usual list at the end of this page.`
              : "Owners and makers add to the stock."}
          </EmptyState>
        ) : (
          <p className="py-3 text-base text-graphite">Nothing here has “{q}” in its name.</p>
        )
      ) : (
        <ul>
          {rows.map((item) => (
            <StockRow key={item.id} item={item} unit={unit}>
              {actions && <RowActions item={item} actions={actions} />}
            </StockRow>
          ))}
        </ul>
      )}
      <ShowMore query={stock} what={title.toLowerCase()} />
    </section>
  );
}

function RowActions({ item, actions }: { readonly item: StockItem; readonly actions: StockActions }) {
  return (
    <>
      {(item.kind === "hardware" || item.kind === "screw") && (
        <Button size="small" aria-label={`Count ${item.name}`} onClick={() => actions.onCount(item)}>
          Count
        </Button>
      )}
      <Button size="small" aria-label={`Change ${item.name}`} onClick={() => actions.onChange(item)}>
        Change
      </Button>
      <Button
        size="small"
        kind="bare"
        aria-label={`Take ${item.name} out of stock`}
        onClick={() => actions.onTakeOut(item)}
      >
        Take out
      </Button>
    </>
  );
}
