import { notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { Job } from "../models/job.ts";
import { jobPolicy } from "../policies/job.ts";
import { type LoadedJob, loadJobs } from "./load-jobs.ts";

/**
 * The job of this shop that the actor may see, else "not found".
 * `lock` takes the job's row FOR UPDATE first: everything that depends on a state is then read after it.
 */
export async function findJob(
  context: ReadContext,
  jobId: string,
  { lock = false }: { lock?: boolean } = {},
): Promise<LoadedJob> {
  const { shop, transaction } = context;
  const job = shop
    ? await Job.findOne({ where: { id: jobId, shopId: shop.id }, transaction, ...(lock ? { lock: true } : {}) })
    : null;
  const [loaded] = job ? await loadJobs(context, [job]) : [];
  if (!loaded || !jobPolicy.see(context.actor, loaded.facts)) throw notFound("job");
  return loaded;
}
