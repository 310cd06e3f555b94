import { openAnotherLike as anotherLikeContract } from "#shared/contracts/another-like.ts";
import * as contract from "#shared/contracts/jobs.ts";
import { changeJob } from "../commands/change-job.ts";
import { moveJob } from "../commands/move-job.ts";
import { openAnotherLike } from "../commands/open-another-like.ts";
import { openJob } from "../commands/open-job.ts";
import { setConsent } from "../commands/set-consent.ts";
import { notAllowed, notFound } from "../http/app-error.ts";
import { type Routes, read, write } from "../http/route.ts";
import { isStaff } from "../policies/actor.ts";
import { jobPolicy } from "../policies/job.ts";
import { presentEvent } from "../presenters/event.ts";
import { findJob } from "../queries/find-job.ts";
import { placeInJobs } from "../queries/job-order.ts";
import { benchRows, jobView } from "../queries/job-view.ts";
import { listEvents } from "../queries/list-events.ts";
import { countMoves, listJobs } from "../queries/list-jobs.ts";
import { loadJobs } from "../queries/load-jobs.ts";
import { cursorOf, pageOf } from "../queries/page.ts";

export function registerJobRoutes(routes: Routes): void {
  read(routes, contract.listJobs, async (context, { query }) => {
    const jobs = await listJobs(context, query);
    const shown = jobs.slice(0, query.limit);
    const items = await benchRows(context, await loadJobs(context, shown));
    const job = shown.at(-1);
    const move = items.at(-1)?.whoseMove;
    return {
      items,
      next:
        jobs.length > query.limit && job && move
          ? cursorOf(placeInJobs(query.sort, { actor: context.actor, job, move }))
          : null,
      counts: await countMoves(context),
    };
  });

  read(routes, contract.getJob, async (context, { params }) => jobView(context, await findJob(context, params.jobId)));

  write(routes, contract.openJob, async (context, { body }) => {
    const { actor } = context;
    if (!isStaff(actor) || !jobPolicy.open(actor)) throw notAllowed("Jobs are opened by the shop.");
    return jobView(context, await openJob(context, { ...body, personId: actor.personId }));
  });

  write(routes, anotherLikeContract, async (context, { params, body }) =>
    jobView(context, await openAnotherLike(context, { jobId: params.jobId, ...body })),
  );

  write(routes, contract.changeJob, async (context, { params, body }) =>
    jobView(context, await changeJob(context, params.jobId, body)),
  );

  write(routes, contract.moveJob, async (context, { params, body }) =>
    jobView(context, await moveJob(context, params.jobId, body)),
  );

  write(routes, contract.setConsent, async (context, { params, body }) =>
    jobView(context, await setConsent(context, params.jobId, body)),
  );

  read(routes, contract.listEvents, async (context, { params, query }) => {
    const { job, facts } = await findJob(context, params.jobId);
    if (!jobPolicy.seeLog(context.actor, facts)) throw notFound("log");
    return pageOf(await listEvents(context, job.id, query), query.limit, presentEvent, (event) => [String(event.id)]);
  });
}
