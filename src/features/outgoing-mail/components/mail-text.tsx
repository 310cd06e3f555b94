import { useQuery } from "@tanstack/react-query";
import { FileButton } from "@/components/ui/link-button.tsx";
import { ProblemNotice } from "@/components/ui/problem-notice.tsx";
import { Skeleton } from "@/components/ui/skeleton.tsx";
import { formatExact } from "@/lib/format.ts";
import { mailQuery } from "../api/queries.ts";

/** One mail as its reader gets it, with its links to press. */
export function MailText({ shop, mailId }: { readonly shop: string; readonly mailId: string }) {
  const mail = useQuery(mailQuery(shop, mailId));
  if (mail.isPending) return <Skeleton label="Loading the mail" />;
  if (mail.isError) {
    return (
      <ProblemNotice what="This mail could not be loaded." error={mail.error} onRetry={() => void mail.refetch()} />
    );
  }
  const { subject, from, to, at, text, links } = mail.data;
  return (
    <article className="border border-ink bg-sheet px-5 py-5" aria-label={subject}>
      <h2 className="font-serif text-lg font-bold">{subject}</h2>
      <dl className="mt-2 grid grid-cols-[auto_minmax(0,1fr)] gap-x-3 text-sm break-all text-graphite">
        <dt>From</dt>
        <dd>{from}</dd>
        <dt>To</dt>
        <dd>{to}</dd>
        <dt>Sent</dt>
        <dd>{formatExact(at)}</dd>
      </dl>
      <p className="mt-4 border-t border-rule pt-4 text-base whitespace-pre-line [overflow-wrap:anywhere]">{text}</p>
      {links.length > 0 && (
        <div className="mt-5 flex flex-wrap gap-3">
          {links.map((link, index) => (
            <FileButton key={link} href={link} target="_blank" rel="noreferrer">
              {links.length === 1 ? "Open the link" : `Open link ${index + 1}`}
            </FileButton>
          ))}
        </div>
      )}
    </article>
  );
}
