import type { BenchRow, Job as JobView } from "#shared/contracts/jobs.ts";
import type { ReadContext } from "../http/context.ts";
import { Note } from "../models/note.ts";
import { isStaff } from "../policies/actor.ts";
import { type JobExtras, presentBenchRow, presentJob } from "../presenters/job.ts";
import { moveFactsOf } from "./job-moves.ts";
import { lastEvents } from "./last-events.ts";
import type { LoadedJob } from "./load-jobs.ts";

/** What the presenter shows beside each job, for the lot at once. */
async function extrasOf(context: ReadContext, loaded: readonly LoadedJob[]): Promise<JobExtras[]> {
  const jobId = loaded.map(({ job }) => job.id);
  const moves = await moveFactsOf(context, loaded);
  const events = await lastEvents(context, jobId);
  const open = await Note.findAll({
    where: { jobId, state: "open", ...(isStaff(context.actor) ? {} : { shopOnly: false }) },
    attributes: ["id", "jobId"],
    transaction: context.transaction,
  });
  return loaded.flatMap(({ job }, index) => {
    const move = moves[index];
    return move
      ? [
          {
            move,
            openNotes: open.filter((note) => note.jobId === job.id).length,
            lastEvent: events.get(job.id) ?? null,
          },
        ]
      : [];
  });
}

/** Jobs as rows of the Bench. */
export async function benchRows(context: ReadContext, loaded: readonly LoadedJob[]): Promise<BenchRow[]> {
  const extras = await extrasOf(context, loaded);
  return loaded.flatMap((one, index) => {
    const extra = extras[index];
    return extra ? [presentBenchRow(context.actor, one, extra)] : [];
  });
}

/** One job in full. */
export async function jobView(context: ReadContext, loaded: LoadedJob): Promise<JobView> {
  const [extra] = await extrasOf(context, [loaded]);
  if (!extra) throw new Error("A loaded job has its extras.");
  return presentJob(context.actor, loaded, extra);
}
