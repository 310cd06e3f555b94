import { useState } from "react";
import type { Job } from "#shared/contracts/jobs.ts";
import { canSetJobState } from "#shared/lifecycle/job-states.ts";
import { Button } from "@/components/ui/button.tsx";
import { ConfirmDialog } from "@/components/ui/confirm-dialog.tsx";
import { TextArea } from "@/components/ui/text-area.tsx";
import { messageOf } from "@/lib/form-problem.ts";
import { capitalised } from "@/lib/format.ts";
import { useMoveJob } from "../api/mutations.ts";

const asides = {
  "on hold": {
    button: "Put on hold",
    title: "Put this job on hold?",
    action: "Put on hold",
    says: "It leaves both sides' lists of moves until it is taken up again. Nothing is lost.",
  },
  cancelled: {
    button: "Cancel the job",
    title: "Cancel this job?",
    action: "Cancel the job",
    says: "Nothing can be issued or decided on it any more. Its drawings, notes and log stay readable.",
  },
} as const;

/** The job's state, and the ways out of its usual course. The usual course stands at the top of the page. */
export function JobMoves({ shop, job }: { readonly shop: string; readonly job: Job }) {
  const [asked, setAsked] = useState<keyof typeof asides | null>(null);
  const [reason, setReason] = useState("");
  const move = useMoveJob(shop, job.id);
  const open = (["on hold", "cancelled"] as const).filter((to) => job.can.move && canSetJobState(job.state, to));
  const close = () => {
    setAsked(null);
    setReason("");
    move.reset();
  };
  return (
    <section aria-labelledby="state">
      <h2 id="state" className="mb-2 font-serif text-lg font-bold">
        State
      </h2>
      <p className="text-base">{capitalised(job.state)}</p>
      {open.length > 0 && (
        <div className="mt-3 flex flex-wrap gap-2">
          {open.map((to) => (
            <Button key={to} size="small" kind={to === "cancelled" ? "danger" : "outline"} onClick={() => setAsked(to)}>
              {asides[to].button}
            </Button>
          ))}
        </div>
      )}
      {asked && (
        <ConfirmDialog
          open
          onOpenChange={close}
          title={asides[asked].title}
          action={asides[asked].action}
          refuse="Leave it as it is"
          busy={move.isPending}
          error={move.isError ? messageOf(move.error) : null}
          onConfirm={() => move.mutate({ to: asked, reason }, { onSuccess: close })}
        >
          <p>{asides[asked].says}</p>
          <TextArea
            label="Why? (for the log)"
            rows={2}
            maxLength={400}
            value={reason}
            onChange={(event) => setReason(event.target.value)}
          />
        </ConfirmDialog>
      )}
    </section>
  );
}
