import { useQuery } from "@tanstack/react-query";
import { useState } from "react";
import { Navigate, Outlet, useLocation, useParams } from "react-router-dom";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { ApiProblem } from "@/lib/api-client.ts";
import { meQuery, shopQuery } from "@/lib/me.ts";
import { ReaderContext, readerOf } from "@/lib/shop-context.ts";
import { HeaderSlot } from "./header-tools.tsx";
import { NotFoundScreen } from "./not-found-screen.tsx";
import { signInTo } from "./paths.ts";
import { PlainHeader, ShopHeader } from "./shop-header.tsx";

/** Everything within a shop: finds out who reads, then draws the header and the page. */
export function ShopLayout() {
  const { shop: slug = "" } = useParams();
  const location = useLocation();
  const me = useQuery(meQuery);
  const shop = useQuery({ ...shopQuery(slug), enabled: me.data?.person != null });
  const [slot, setSlot] = useState<HTMLElement | null>(null);

  if (me.data?.person === null) return <Navigate replace to={signInTo(location.pathname + location.search)} />;
  const error = me.error ?? shop.error;
  const reader = me.data && shop.data ? readerOf(me.data, shop.data) : undefined;
  if (reader === null || (error instanceof ApiProblem && error.code === "not_found")) {
    return (
      <PlainHeader>
        <NotFoundScreen />
      </PlainHeader>
    );
  }
  if (error) {
    return (
      <PlainHeader>
        <h1 className="mb-4 font-serif text-2xl font-bold text-ink">The shop could not be loaded</h1>
        <ProblemNotice
          what="What was saved is safe."
          error={error}
          onRetry={() => void (me.error ? me.refetch() : shop.refetch())}
        />
      </PlainHeader>
    );
  }
  if (reader === undefined) {
    return (
      <PlainHeader>
        <Skeleton label="Loading the shop" />
      </PlainHeader>
    );
  }
  return (
    <ReaderContext value={reader}>
      <HeaderSlot value={slot}>
        <a
          href="#content"
          className="sr-only z-50 bg-sheet px-4 py-2 text-indigo underline focus:not-sr-only focus:fixed focus:top-2 focus:left-2"
        >
          Skip to the page
        </a>
        <ShopHeader reader={reader} slotRef={setSlot} />
        <main id="content" tabIndex={-1}>
          <Outlet />
        </main>
      </HeaderSlot>
    </ReaderContext>
  );
}
