import { jobState, staffStates } from "#shared/lifecycle/job-states.ts";
import { whoseMove } from "#shared/lifecycle/whose-move.ts";
import type { Context } from "../http/context.ts";
import type { Job } from "../models/job.ts";
import { moveFactsOf } from "../queries/job-moves.ts";
import { type LoadedJob, loadJobs } from "../queries/load-jobs.ts";

/**
 * Works out state and whose move anew from what is in the database and keeps both on the job's row, which the caller
 * holds locked. Called at the end of every command that touches brief, approvers, revisions or notes.
 */
export async function refreshJob(context: Pick<Context, "transaction">, job: Job): Promise<LoadedJob> {
  const [loaded] = await loadJobs(context, [job]);
  if (!loaded) throw new Error("A job that exists can be loaded.");
  const [facts] = await moveFactsOf(context, [loaded]);
  if (!facts) throw new Error("A loaded job has its facts.");
  const setByStaff = staffStates.find((state) => state === job.state) ?? null;
  await job.update(
    { state: jobState({ ...facts, setByStaff }), whoseMove: whoseMove(facts).move },
    { transaction: context.transaction },
  );
  return loaded;
}
