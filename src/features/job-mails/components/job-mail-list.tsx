import { useInfiniteQuery } from "@tanstack/react-query";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { formatExact } from "@/lib/format.ts";
import { itemsOf } from "@/lib/pages-query.ts";
import { jobMailsQuery } from "../api/queries.ts";
import { mailName, mailState } from "./mail-words.ts";

/** Every mail about the job with what became of it, newest first. */
export function JobMailList({ shop, jobId }: { readonly shop: string; readonly jobId: string }) {
  const mails = useInfiniteQuery(jobMailsQuery(shop, jobId));
  const items = mails.data ? itemsOf(mails.data) : [];
  return (
    <section aria-labelledby="job-mail">
      <h2 id="job-mail" className="mb-3 font-serif text-lg font-bold">
        Mail
      </h2>
      {mails.isPending ? (
        <Skeleton label="Loading the mail" rows={2} />
      ) : mails.isError ? (
        <ProblemNotice what="The mail could not be loaded." error={mails.error} onRetry={() => void mails.refetch()} />
      ) : items.length === 0 ? (
        <p className="text-base text-graphite">No mail has gone out about this job yet.</p>
      ) : (
        <ul className="border-t border-rule">
          {items.map((mail) => (
            <li key={mail.id} className="border-b border-rule py-2 text-sm [overflow-wrap:anywhere]">
              <span className="block text-ink">
                {mailName(mail)} to {mail.to}
              </span>
              <span
                className={mail.state === "refused" ? "block text-fine text-oxblood" : "block text-fine text-graphite"}
                title={formatExact(mail.queuedAt)}
              >
                {mailState(mail)}
              </span>
            </li>
          ))}
        </ul>
      )}
      <ShowMore query={mails} what="mail" />
    </section>
  );
}
