import { useQuery } from "@tanstack/react-query";
import { paths } from "@/app/paths.ts";
import { Button } from "@/components/ui/button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { TextLink } from "@/components/ui/text-link.tsx";
import { ApiProblem } from "@/lib/api-client.ts";
import { messageOf } from "@/lib/form-problem.ts";
import { usePageTitle } from "@/lib/page-title.ts";
import { useUnsubscribe } from "../api/mutations.ts";
import { unsubscribeQuery } from "../api/queries.ts";

/** Where the foot of a mail leads. Nothing is stopped until the button is pressed, since mail scanners open links too. */
export function UnsubscribePanel({ token }: { readonly token: string }) {
  const link = useQuery({ ...unsubscribeQuery(token), retry: false });
  const stop = useUnsubscribe();
  const isUnknown =
    link.error instanceof ApiProblem && (link.error.code === "not_found" || link.error.code === "validation_failed");
  const stopped = link.data && !link.data.notes && !link.data.reminders;
  const heading = isUnknown
    ? "This link is not known"
    : stopped
      ? "These mails are stopped"
      : `Stop mails${link.data ? ` from ${link.data.shopName}` : ""}`;
  usePageTitle(heading);
  return (
    <>
      <h1 className="mb-3 font-serif text-2xl font-bold text-ink">{heading}</h1>
      {isUnknown ? (
        <p className="text-base text-graphite">
          It may have been cut short on its way. Open it from the mail again, or choose your mails in{" "}
          <TextLink to={paths.account()}>your account</TextLink>.
        </p>
      ) : link.isPending ? (
        <Skeleton label="Reading the link" rows={2} />
      ) : link.isError ? (
        <ProblemNotice what="Nothing is stopped yet." error={link.error} onRetry={() => void link.refetch()} />
      ) : stopped ? (
        <p className="text-base text-graphite">
          {link.data.shopName} no longer sends {link.data.addressHint} what was said about notes, nor reminders. Proofs,
          decisions and links still come. Turn the others on again in{" "}
          <TextLink to={paths.account()}>your account</TextLink>.
        </p>
      ) : (
        <>
          <p className="mb-5 text-base text-graphite">
            {link.data.shopName} writes to {link.data.addressHint} what was said about notes, and reminds of the day a
            yes is needed. Both are stopped here. Proofs, decisions and links still come: without them nobody could go
            on.
          </p>
          {stop.isError && (
            <Notice tone="error" className="mb-4">
              {messageOf(stop.error)}
            </Notice>
          )}
          <Button kind="primary" busy={stop.isPending} onClick={() => stop.mutate(token)}>
            Stop these mails
          </Button>
        </>
      )}
    </>
  );
}
