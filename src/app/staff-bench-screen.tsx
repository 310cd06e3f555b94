import { useInfiniteQuery } from "@tanstack/react-query";
import { useCallback, useState } from "react";
import { useNavigate } from "react-router-dom";
import { Button } from "@/components/ui/button.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { jobsQuery } from "@/features/bench/api/queries.ts";
import { useBenchFilter } from "@/features/bench/components/bench-filter.ts";
import { BenchLists } from "@/features/bench/components/bench-lists.tsx";
import { BenchSearch } from "@/features/bench/components/bench-search.tsx";
import { benchSentence } from "@/features/bench/components/bench-sentence.ts";
import { FilterBar } from "@/features/bench/components/filter-bar.tsx";
import { OpenJobDialog } from "@/features/jobs/components/open-job-dialog.tsx";
import { useShop } from "@/lib/shop-context.ts";
import { HeaderTools } from "./header-tools.tsx";
import { Page } from "./page.tsx";
import { paths } from "./paths.ts";

export function StaffBenchScreen() {
  const shop = useShop();
  const navigate = useNavigate();
  const [opening, setOpening] = useState(false);
  const { filter, change, clear } = useBenchFilter();
  const { whoseMove: _, ...rest } = filter;
  const ours = useInfiniteQuery(jobsQuery(shop.slug, { ...rest, whoseMove: "ours" }));
  const counts = ours.data?.pages[0]?.counts;
  const first = ours.data?.pages[0]?.items[0];
  const find = useCallback((q: string) => change("q", q), [change]);
  return (
    <Page
      title="Bench"
      heading={counts ? benchSentence(counts.ours) : "Bench"}
      under={first && `Next: ${first.client.name}, ${first.title}. ${first.nextStep}.`}
      actions={<FilterBar filter={filter} onChange={change} />}
    >
      <HeaderTools>
        <BenchSearch value={filter.q ?? ""} onChange={find} />
        {shop.can.openJob && (
          <Button kind="primary" onClick={() => setOpening(true)}>
            Open a job
          </Button>
        )}
      </HeaderTools>
      <BenchLists
        shop={shop.slug}
        filter={filter}
        onClear={clear}
        firstStep={
          shop.can.openJob && (
            <>
              <Button onClick={() => setOpening(true)}>Open the first job</Button>
              {shop.can.changeShop && (
                <p className="mt-5 max-w-prose text-base text-graphite">
                  Before that, say whether you measure in mm or inches and on which paper proofs go out, under{" "}
                  <TextLink to={paths.shop(shop.slug)}>Shop</TextLink>, and invite who works with you, under{" "}
                  <TextLink to={paths.team(shop.slug)}>Team</TextLink>.
                </p>
              )}
            </>
          )
        }
      />
      <OpenJobDialog
        shop={shop.slug}
        open={opening}
        onOpenChange={setOpening}
        onOpened={(jobId) => void navigate(paths.job(shop.slug, jobId))}
      />
    </Page>
  );
}
