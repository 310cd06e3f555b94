import type { Job } from "#shared/contracts/jobs.ts";
import { Button } from "@/components/ui/button.tsx";
import { LinkButton } from "@/components/ui/link-button.tsx";
import { Notice } from "@/components/ui/notice.tsx";
import { cx } from "@/lib/cx.ts";
import { messageOf } from "@/lib/form-problem.ts";
import { useMoveJob } from "../api/mutations.ts";
import { nextActionOf } from "./next-action.ts";

const tones: Record<Job["whoseMove"], string> = {
  ours: "border-madder text-madder",
  client: "border-ochre text-ochre",
  nobody: "border-graphite text-graphite",
};

const words = {
  shop: { ours: "Our move", client: "The client's move", nobody: "Nobody's move" },
  client: { ours: "The shop's move", client: "Your move", nobody: "Nothing to do" },
} as const;

const goToPart = (id: string) => {
  const part = document.getElementById(id);
  part?.scrollIntoView({ block: "start" });
  part?.focus({ preventScroll: true });
};

/** What is to be done next and by whom, with the only madder button of the page. */
export function NextStep({
  job,
  shop,
  side,
}: {
  readonly job: Job;
  readonly shop: string;
  readonly side: "shop" | "client";
}) {
  const move = useMoveJob(shop, job.id);
  const action = nextActionOf(job, shop, side);
  return (
    <section
      aria-label="Next step"
      className={cx(
        "flex flex-wrap items-center justify-between gap-4 border bg-sheet px-5 py-4",
        tones[job.whoseMove],
      )}
    >
      <div className="min-w-0">
        <p className="text-sm font-semibold">{words[side][job.whoseMove]}</p>
        <p className="font-serif text-lg font-bold text-ink">{job.nextStep}</p>
        {move.isError && (
          <Notice tone="error" className="mt-2">
            {messageOf(move.error)}
          </Notice>
        )}
      </div>
      {action?.kind === "go" && (
        <LinkButton kind="primary" to={action.to}>
          {action.label}
        </LinkButton>
      )}
      {action?.kind === "part" && (
        <Button kind="primary" onClick={() => goToPart(action.id)}>
          {action.label}
        </Button>
      )}
      {action?.kind === "move" && (
        <Button kind="primary" busy={move.isPending} onClick={() => move.mutate({ to: action.move, reason: "" })}>
          {action.label}
        </Button>
      )}
    </section>
  );
}
