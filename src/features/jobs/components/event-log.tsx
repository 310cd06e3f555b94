import { useInfiniteQuery } from "@tanstack/react-query";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { formatExact, formatInstant } from "@/lib/format.ts";
import { itemsOf } from "@/lib/pages-query.ts";
import { eventsQuery } from "../api/queries.ts";

/** What happened on the job, newest first. Nothing in it can be changed. */
export function EventLog({ shop, jobId }: { readonly shop: string; readonly jobId: string }) {
  const events = useInfiniteQuery(eventsQuery(shop, jobId));
  return (
    <section aria-labelledby="log">
      <h2 id="log" className="mb-3 font-serif text-lg font-bold">
        Log
      </h2>
      {events.isPending ? (
        <Skeleton label="Loading the log" rows={3} />
      ) : events.isError ? (
        <ProblemNotice what="The log could not be loaded." error={events.error} onRetry={() => void events.refetch()} />
      ) : (
        <ol className="border-l border-rule">
          {itemsOf(events.data).map((event) => (
            <li key={event.id} className="relative pb-3 pl-4 text-sm">
              <span
                aria-hidden="true"
                className="absolute top-1.5 -left-1 size-2 rounded-full border border-graphite bg-paper"
              />
              <span className="text-ink">{event.text}</span>
              <span className="block text-fine text-graphite">
                {event.who},{" "}
                <time dateTime={event.at} title={formatExact(event.at)}>
                  {formatInstant(event.at)}
                </time>
              </span>
            </li>
          ))}
        </ol>
      )}
      <ShowMore query={events} what="entries" />
    </section>
  );
}
