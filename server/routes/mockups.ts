import * as contract from "#shared/contracts/mockups.ts";
import { saveMockup } from "../commands/save-mockup.ts";
import { notFound } from "../http/app-error.ts";
import { type Routes, read, write } from "../http/route.ts";
import { mockupPolicy } from "../policies/mockup.ts";
import { presentMockup } from "../presenters/mockup.ts";
import { findJob } from "../queries/find-job.ts";
import { findMockup } from "../queries/find-mockup.ts";
import { findMockupStart } from "../queries/find-mockup-start.ts";

export function registerMockupRoutes(routes: Routes): void {
  read(routes, contract.getMockup, async (context, { params }) => {
    const loaded = await findJob(context, params.jobId);
    if (!mockupPolicy.see(context.actor, loaded.facts)) throw notFound("mockup");
    const of = { shopId: loaded.job.shopId, jobId: loaded.job.id };
    const mockup = await findMockup(context, of);
    return presentMockup(context.actor, loaded, mockup, mockup ? null : await findMockupStart(context, of));
  });

  write(routes, contract.saveMockup, async (context, { params, body }) => {
    const { loaded, mockup } = await saveMockup(context, { jobId: params.jobId, ...body });
    return presentMockup(context.actor, loaded, mockup);
  });
}
