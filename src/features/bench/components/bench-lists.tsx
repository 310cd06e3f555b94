import { useInfiniteQuery } from "@tanstack/react-query";
import type { ReactNode } from "react";
import { Button } from "@/components/ui/button.tsx";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { itemsOf } from "@/lib/pages-query.ts";
import { type JobFilter, jobsQuery } from "../api/queries.ts";
import { JobRow } from "./job-row.tsx";
import { MoveGroup } from "./move-group.tsx";

const groups = [
  { whoseMove: "ours", title: "Our move" },
  { whoseMove: "client", title: "The client's move" },
  { whoseMove: "nobody", title: "Nobody's move" },
] as const;

/** The staff's jobs in groups by whose move it is. */
export function BenchLists({
  shop,
  filter,
  onClear,
  firstStep,
}: {
  readonly shop: string;
  readonly filter: JobFilter;
  readonly onClear: () => void;
  /** How to open the first job, for an empty shop. */
  readonly firstStep: ReactNode;
}) {
  const { whoseMove, ...rest } = filter;
  const shown = groups.filter((group) => whoseMove === undefined || group.whoseMove === whoseMove);
  // The very lists that the groups show: the counts that come with them are of all jobs, whatever is filtered.
  const lists = {
    ours: useInfiniteQuery(jobsQuery(shop, { ...rest, whoseMove: "ours" })),
    client: useInfiniteQuery(jobsQuery(shop, { ...rest, whoseMove: "client" })),
    nobody: useInfiniteQuery(jobsQuery(shop, { ...rest, whoseMove: "nobody" })),
  };
  const isEmpty = ({ data }: (typeof lists)["ours"]) => data !== undefined && itemsOf(data).length === 0;
  if (shown.every((group) => isEmpty(lists[group.whoseMove]))) {
    return Object.keys(filter).some((name) => name !== "sort") ? (
      <EmptyState title="No job matches" action={<Button onClick={onClear}>Show all jobs</Button>}>
        Try fewer words, or take the filter away.
      </EmptyState>
    ) : (
      <EmptyState title="No jobs yet" action={firstStep}>
        A job begins with a client and what the sign is. Brief, artwork, mockup and proofs follow from there.
      </EmptyState>
    );
  }
  return (
    <div className="space-y-9">
      {shown.map((group) => (
        <MoveGroup key={group.whoseMove} shop={shop} noun="job" filter={rest} {...group}>
          {(job) => <JobRow key={job.id} job={job} shop={shop} />}
        </MoveGroup>
      ))}
    </div>
  );
}
