import { useInfiniteQuery } from "@tanstack/react-query";
import { Link } from "react-router-dom";
import { Button } from "@/components/ui/button.tsx";
import { EmptyState } from "@/components/ui/empty-state.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { ShowMore } from "@/components/ui/show-more.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { cx } from "@/lib/cx.ts";
import { formatInstant } from "@/lib/format.ts";
import { itemsOf } from "@/lib/pages-query.ts";
import { mailsQuery } from "../api/queries.ts";

/** What was mailed, newest first. */
export function MailList({ shop, chosen }: { readonly shop: string; readonly chosen: string | null }) {
  const mails = useInfiniteQuery(mailsQuery(shop));
  if (mails.isPending) return <Skeleton label="Loading the mail" />;
  if (mails.isError) {
    return (
      <ProblemNotice what="The mail could not be loaded." error={mails.error} onRetry={() => void mails.refetch()} />
    );
  }
  const rows = itemsOf(mails.data);
  const again = (
    <Button size="small" busy={mails.isRefetching} onClick={() => void mails.refetch()}>
      Look again
    </Button>
  );
  if (rows.length === 0) {
    return (
      <EmptyState title="No mail yet" action={again}>
        Issue a revision or mail a contact a sign-in link; what would go out then stands here.
      </EmptyState>
    );
  }
  return (
    <>
      <div className="mb-3">{again}</div>
      <ul className="border-t border-rule">
        {rows.map((mail) => (
          <li key={mail.id} className="border-b border-rule">
            <Link
              to={`?mail=${mail.id}`}
              replace={chosen !== null}
              aria-current={mail.id === chosen ? "true" : undefined}
              className={cx("block px-2 py-3 hover:bg-linen", mail.id === chosen && "bg-linen")}
            >
              <span className="block font-semibold underline underline-offset-4">{mail.subject}</span>
              <span className="block text-sm break-all text-graphite">
                to {mail.to}, {formatInstant(mail.at)}
              </span>
            </Link>
          </li>
        ))}
      </ul>
      <ShowMore query={mails} what="mail" />
    </>
  );
}
