import { useInfiniteQuery } from "@tanstack/react-query";
import { paths } from "@/app/paths.ts";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { itemsOf } from "@/lib/pages-query.ts";
import { clientJobsQuery } from "../api/queries.ts";

/** What is and was made for a client, newest first. */
export function ClientJobs({ shop, clientId }: { readonly shop: string; readonly clientId: string }) {
  const jobs = useInfiniteQuery(clientJobsQuery(shop, clientId));
  if (jobs.isPending) return <Skeleton label="Loading the jobs" rows={2} />;
  if (jobs.isError) {
    return (
      <ProblemNotice what="The jobs could not be loaded." error={jobs.error} onRetry={() => void jobs.refetch()} />
    );
  }
  const rows = itemsOf(jobs.data);
  return (
    <section aria-labelledby="client-jobs">
      <h2 id="client-jobs" className="mb-3 font-serif text-lg font-bold">
        Jobs
      </h2>
      {rows.length === 0 ? (
        <p className="text-base text-graphite">No job yet. Open one from the Bench.</p>
      ) : (
        <ul className="border-t border-rule">
          {rows.map((job) => (
            <li key={job.id} className="flex flex-wrap items-baseline gap-x-4 border-b border-rule py-3">
              <span className="font-serif text-sm font-bold tabular-nums">{job.number}</span>
              <TextLink to={paths.job(shop, job.id)} className="font-semibold">
                {job.title}
              </TextLink>
              <span className="text-sm text-graphite">{job.state}</span>
            </li>
          ))}
        </ul>
      )}
      <ShowMore query={jobs} what="jobs" />
    </section>
  );
}
