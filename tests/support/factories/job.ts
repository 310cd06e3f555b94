import { type Brief, changeJob, openJob } from "#shared/contracts/jobs.ts";
import type { World } from "./work.ts";

/** The same shop and people with another job, its brief complete unless the overrides say otherwise. */
export async function buildJob(
  world: World,
  {
    title = "Lobby sign",
    dueOn = "2031-05-06",
    brief = {},
    approverIds = [world.approver.contact.id],
  }: { title?: string; dueOn?: string | null; brief?: Partial<Brief>; approverIds?: string[] } = {},
): Promise<World> {
  const { params, visitors, approver } = world;
  const opened = await visitors.owner.get(openJob, { params, body: { clientId: approver.client.id, title, dueOn } });
  const job = await visitors.owner.get(changeJob, {
    params: { ...params, jobId: opened.id },
    body: { brief: { ...world.job.brief, ...brief }, approverIds },
  });
  return { ...world, job };
}
