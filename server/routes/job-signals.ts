import * as contract from "#shared/contracts/job-signals.ts";
import { notFound } from "../http/app-error.ts";
import { type Routes, stream } from "../http/route.ts";
import { type JobStream, openJobStream, wantedAfter } from "../live/job-stream.ts";
import { isInsider } from "../policies/actor.ts";
import { findJob } from "../queries/find-job.ts";
import { lastSignal, signalsAfter } from "../queries/signals-after.ts";

export function registerJobSignalRoutes(routes: Routes): void {
  stream(routes, contract.streamJobSignals, async (ask, { params, query, lastEventId }, response) => {
    const context = await ask();
    const { actor, services } = context;
    const { jobId } = params;
    const loaded = await findJob(context, jobId);
    if (!isInsider(actor)) throw notFound("job");
    const after = wantedAfter(lastEventId, query.after) ?? (await lastSignal(context, loaded));

    /** Rights are asked anew for each look: of a job that one may not see any more nothing is told. */
    const look = async (sent: number) => {
      const now = await ask();
      if (now.actor.kind !== actor.kind) throw notFound("job");
      return signalsAfter(now, await findJob(now, jobId), sent);
    };

    // Watched before it is opened: what is told in between, the first look finds.
    let opened: JobStream | null = null;
    const leave = await services.watchers.add({
      jobId,
      personId: actor.personId,
      look: () => opened?.look(),
      end: () => opened?.end(),
    });
    opened = openJobStream(response, { after, look, log: services.log, once: query.once === "1", onEnd: leave });
  });
}
