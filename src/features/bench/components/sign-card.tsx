import { Link } from "react-router-dom";
import type { BenchRow } from "#shared/contracts/jobs.ts";
import { paths } from "@/app/paths.ts";
import { LetterMark } from "@/components/ui/letter-mark.tsx";
import { formatDay } from "@/lib/format.ts";
import { SignPicture } from "./sign-picture.tsx";

/** One of the client's own jobs, in plain words. */
export function SignCard({ job, shop }: { readonly job: BenchRow; readonly shop: string }) {
  return (
    <li className="relative flex gap-4 border-b border-rule py-4 hover:bg-linen">
      <SignPicture shop={shop} revisionId={job.latest?.revisionId ?? null} name={job.title} />
      <div className="min-w-0">
        <Link
          to={paths.job(shop, job.id)}
          className="font-serif text-lg font-bold text-ink underline decoration-rule underline-offset-4 after:absolute after:inset-0 hover:decoration-ink"
        >
          {job.title}
        </Link>
        <p className="mt-1 flex items-start gap-2.5">
          {job.latest && (
            <LetterMark tone={job.whoseMove === "client" ? "client" : "quiet"}>{job.latest.letter}</LetterMark>
          )}
          <span className="pt-0.5 text-base">{job.nextStep}</span>
        </p>
        <p className="mt-1 text-fine text-graphite">
          {job.number}
          {job.dueOn && `, planned for ${formatDay(job.dueOn)}`}
        </p>
      </div>
    </li>
  );
}
