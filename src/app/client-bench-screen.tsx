import { useInfiniteQuery } from "@tanstack/react-query";
import { jobsQuery } from "@/features/bench/api/queries.ts";
import { clientSentence } from "@/features/bench/components/bench-sentence.ts";
import { ClientBench } from "@/features/bench/components/client-bench.tsx";
import { useReader } from "@/lib/shop-context.ts";
import { Page } from "./page.tsx";

export function ClientBenchScreen() {
  const { shop, client } = useReader();
  const jobs = useInfiniteQuery(jobsQuery(shop.slug, { whoseMove: "client" }));
  const counts = jobs.data?.pages[0]?.counts;
  return (
    <Page
      title="Your signs"
      heading={counts ? clientSentence(counts.client) : "Your signs"}
      under={`${client}, made by ${shop.name}`}
    >
      <ClientBench shop={shop.slug} shopName={shop.name} />
    </Page>
  );
}
