import { Link } from "react-router-dom";
import type { BenchRow } from "#shared/contracts/jobs.ts";
import { paths } from "@/app/paths.ts";
import { LetterMark, type MarkTone } from "@/components/ui/letter-mark.tsx";
import { cx } from "@/lib/cx.ts";
import { daysUntil, formatDue, formatInstant } from "@/lib/format.ts";
import { SignPicture } from "./sign-picture.tsx";

const toneOf = ({ whoseMove, state }: BenchRow): MarkTone =>
  whoseMove === "nobody"
    ? "quiet"
    : ["approved", "in build"].includes(state)
      ? "settled"
      : whoseMove === "client"
        ? "client"
        : "ours";

/** One job of the Bench: a row on a desk, a card on a phone. The whole of it leads to the job. */
export function JobRow({ job, shop }: { readonly job: BenchRow; readonly shop: string }) {
  const late = job.dueOn !== null && job.whoseMove !== "nobody" && daysUntil(job.dueOn) <= 3;
  return (
    <li className="relative border-b border-rule hover:bg-linen">
      <div className="grid grid-cols-[1fr_auto] items-center gap-x-4 gap-y-1 py-3 lg:grid-cols-[104px_5.5rem_minmax(0,1.3fr)_minmax(0,1.6fr)_minmax(0,1fr)_7.5rem] lg:gap-x-5 lg:px-1">
        <div className="hidden lg:block">
          <SignPicture shop={shop} revisionId={job.latest?.revisionId ?? null} name={job.client.name} />
        </div>
        <p className="font-serif text-sm font-bold text-ink tabular-nums">{job.number}</p>
        <p className="order-first col-span-2 min-w-0 lg:order-none lg:col-span-1">
          <Link
            to={paths.job(shop, job.id)}
            className="font-semibold text-ink underline decoration-rule underline-offset-4 after:absolute after:inset-0 hover:decoration-ink"
          >
            {job.client.name}
          </Link>
          <span className="block text-base text-graphite lg:text-sm">{job.title}</span>
        </p>
        <p className="order-last col-span-2 flex min-w-0 items-start gap-2.5 lg:order-none lg:col-span-1">
          <LetterMark tone={toneOf(job)}>{job.latest?.letter ?? "–"}</LetterMark>
          <span className="min-w-0 pt-0.5 text-base text-ink lg:text-sm">
            <span className="sr-only">{job.latest ? `Revision ${job.latest.letter}, ` : "No revision yet, "}</span>
            {job.nextStep}
          </span>
        </p>
        <p className="order-last col-span-2 text-fine text-graphite lg:order-none lg:col-span-1 lg:text-sm">
          {job.lastEvent && (
            <>
              {job.lastEvent.text} <span className="whitespace-nowrap">{formatInstant(job.lastEvent.at)}</span>
            </>
          )}
        </p>
        <p className={cx("text-right text-sm lg:text-left", late ? "font-semibold text-madder" : "text-graphite")}>
          {job.dueOn ? formatDue(job.dueOn) : "no due day"}
        </p>
      </div>
    </li>
  );
}
