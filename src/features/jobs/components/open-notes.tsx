import type { Job } from "#shared/contracts/jobs.ts";
import { paths } from "@/app/paths.ts";
import { TextLink } from "@/components/ui/text-link.tsx";
import { capitalised, counted } from "@/lib/format.ts";

/** How many notes are open, with the way to the sheet that holds them. */
export function OpenNotes({ shop, job }: { readonly shop: string; readonly job: Job }) {
  return (
    <section aria-labelledby="notes">
      <h2 id="notes" className="mb-2 font-serif text-lg font-bold">
        Notes
      </h2>
      <p className="text-base">
        {capitalised(counted(job.openNotes, "open note"))}
        {job.latest && (
          <>
            .{" "}
            <TextLink to={paths.sheet(shop, job.latest.revisionId)}>
              {job.openNotes > 0 ? `See them on sheet ${job.latest.letter}` : `Sheet ${job.latest.letter}`}
            </TextLink>
          </>
        )}
      </p>
    </section>
  );
}
