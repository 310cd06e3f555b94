import { useQuery } from "@tanstack/react-query";
import { useMemo } from "react";
import { useSearchParams } from "react-router-dom";
import { z } from "zod";
import { stockOfItems } from "#shared/contracts/stock-on-hand.ts";
import { thingsToPrice } from "#shared/cost/things-to-price.ts";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { PricesForm } from "@/features/prices/components/prices-form.tsx";
import { PricesToRead } from "@/features/prices/components/prices-to-read.tsx";
import { pricesQuery } from "@/lib/prices-query.ts";
import { useShop } from "@/lib/shop-context.ts";
import { stockQuery } from "@/lib/stock-query.ts";
import { NotFoundScreen } from "../not-found-screen.tsx";
import { Page } from "../page.tsx";

export function PricesPage() {
  return useShop().can.seePrices ? <PriceBookOfShop /> : <NotFoundScreen />;
}

const wantedSchema = z.tuple([z.string().max(20), z.string().min(1).max(200), z.string().min(1).max(120)]);

/** What a drawing asks a price for, as paths.prices writes it; anything else in the address is left alone. */
function wantedOf(search: URLSearchParams) {
  return search.getAll("wanted").flatMap((text) => {
    try {
      const read = wantedSchema.safeParse(JSON.parse(text));
      if (!read.success) return [];
      const [group, id, name] = read.data;
      return [{ group, id, name }];
    } catch {
      return [];
    }
  });
}

function PriceBookOfShop() {
  const { slug, unit } = useShop();
  const [search] = useSearchParams();
  const prices = useQuery(pricesQuery(slug));
  const items = useQuery(stockQuery(slug));
  const stock = useMemo(() => (items.data ? stockOfItems(items.data) : null), [items.data]);
  const wanted = useMemo(() => wantedOf(search), [search]);
  const failed = [prices, items].find((query) => query.isError && query.data === undefined);
  return (
    <Page
      title="Prices"
      under="What things and work cost the shop. Mockups reckon with it; clients, guests and sales reps never see it."
    >
      {failed ? (
        <ProblemNotice
          what="The prices could not be loaded."
          error={failed.error}
          onRetry={() => void failed.refetch()}
        />
      ) : prices.data === undefined || stock === null ? (
        <Skeleton label="Loading the prices" rows={8} rowClassName="h-16" />
      ) : prices.data.can.change ? (
        <PricesForm shop={slug} unit={unit} prices={prices.data} stock={stock} wanted={wanted} />
      ) : prices.data.book === null ? (
        <EmptyState title="No prices yet">An owner writes them; then mockups say what a sign costs.</EmptyState>
      ) : (
        <PricesToRead book={prices.data.book} things={thingsToPrice(stock, unit)} unit={unit} />
      )}
    </Page>
  );
}
