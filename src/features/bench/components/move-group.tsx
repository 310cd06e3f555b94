import { useInfiniteQuery } from "@tanstack/react-query";
import type { ReactNode } from "react";
import type { BenchRow } from "#shared/contracts/jobs.ts";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { cx } from "@/lib/cx.ts";
import { counted } from "@/lib/format.ts";
import { itemsOf } from "@/lib/pages-query.ts";
import { type JobFilter, jobsQuery } from "../api/queries.ts";

type Move = BenchRow["whoseMove"];

const tones: Record<Move, string> = { ours: "text-madder", client: "text-ochre", nobody: "text-verdigris" };

/** The jobs of one side, due first. A side without any is left out. */
export function MoveGroup({
  shop,
  whoseMove,
  title,
  noun,
  filter,
  children,
}: {
  readonly shop: string;
  readonly whoseMove: Move;
  readonly title: string;
  /** What is counted: a job, a sign. */
  readonly noun: string;
  readonly filter: JobFilter;
  readonly children: (job: BenchRow) => ReactNode;
}) {
  const jobs = useInfiniteQuery(jobsQuery(shop, { ...filter, whoseMove }));
  if (jobs.isPending) return <Skeleton label={`Loading ${title}`} rows={2} rowClassName="h-20" />;
  if (jobs.isError) {
    return (
      <ProblemNotice what={`${title} could not be loaded.`} error={jobs.error} onRetry={() => void jobs.refetch()} />
    );
  }
  const rows = itemsOf(jobs.data);
  if (rows.length === 0) return null;
  const isNarrowed = filter.q !== undefined || filter.state !== undefined || filter.clientId !== undefined;
  const total = jobs.data.pages[0]?.counts[whoseMove] ?? rows.length;
  const count = isNarrowed
    ? `${counted(rows.length, noun)}${jobs.hasNextPage ? " and more" : ""}`
    : counted(total, noun);
  return (
    <section>
      <h2 className="flex items-baseline gap-3">
        <span className={cx("font-serif text-lg font-bold", tones[whoseMove])}>{title}</span>
        <span className="font-sans text-fine text-graphite">{count}</span>
      </h2>
      <ul className="mt-2 border-t border-rule lg:border-t-0">{rows.map(children)}</ul>
      <ShowMore query={jobs} what={`${noun}s`} />
    </section>
  );
}
