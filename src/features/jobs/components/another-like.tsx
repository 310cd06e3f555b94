import { useState } from "react";
import type { Job } from "#shared/contracts/jobs.ts";
import { Button } from "@/components/ui/button.tsx";
import { Dialog } from "@/components/ui/dialog.tsx";
import { AnotherLikeForm } from "./another-like-form.tsx";

type AnotherLikeProps = {
  readonly shop: string;
  readonly job: Job;
  readonly onOpened: (jobId: string) => void;
};

/** The way from a sign that was drawn to the next one of its kind. */
export function AnotherLike({ shop, job, onOpened }: AnotherLikeProps) {
  const [open, setOpen] = useState(false);
  return (
    <section aria-labelledby="another">
      <h2 id="another" className="mb-2 font-serif text-lg font-bold">
        Another like this
      </h2>
      <p className="text-base">A new job of the same format, stack and hardware, with new words.</p>
      <Button size="small" className="mt-3" onClick={() => setOpen(true)}>
        Open another like this
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title={`Another like ${job.number}`}
        description={`A new job like “${job.title}” of ${job.client.name}. That one stays as it is.`}
      >
        <AnotherLikeForm shop={shop} job={job} onOpened={onOpened} />
      </Dialog>
    </section>
  );
}
