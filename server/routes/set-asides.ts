import * as contract from "#shared/contracts/set-asides.ts";
import { setAsideFinding } from "../commands/set-aside-finding.ts";
import { takeBackSetAside } from "../commands/take-back-set-aside.ts";
import { notFound } from "../http/app-error.ts";
import { type Routes, read, write } from "../http/route.ts";
import { setAsidePolicy } from "../policies/set-aside.ts";
import { presentSetAside } from "../presenters/set-aside.ts";
import { findJob } from "../queries/find-job.ts";
import { listSetAsides } from "../queries/list-set-asides.ts";
import { pageOf } from "../queries/page.ts";

export function registerSetAsideRoutes(routes: Routes): void {
  read(routes, contract.listSetAsides, async (context, { params, query }) => {
    const { facts } = await findJob(context, params.jobId);
    if (!setAsidePolicy.see(context.actor, facts)) throw notFound("set-aside");
    const rows = await listSetAsides(context, params.jobId, query);
    return pageOf(
      rows,
      query.limit,
      (row) => presentSetAside(context.actor, facts, row),
      ({ setAsideAt, id }) => [setAsideAt.toISOString(), id],
    );
  });

  write(routes, contract.setAsideFinding, async (context, { params, body }) => {
    const row = await setAsideFinding(context, { jobId: params.jobId, ...body });
    const { facts } = await findJob(context, params.jobId);
    return presentSetAside(context.actor, facts, row);
  });

  write(routes, contract.takeBackSetAside, async (context, { params }) => {
    await takeBackSetAside(context, params);
    return undefined;
  });
}
