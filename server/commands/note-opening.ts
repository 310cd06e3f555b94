import { visibleToClient } from "#shared/lifecycle/revision-states.ts";
import type { Context } from "../http/context.ts";
import { Event } from "../models/event.ts";
import { Job } from "../models/job.ts";
import type { LoadedRevision } from "../queries/find-revision.ts";
import { logEvent } from "./log-event.ts";

/** Writes down the first time each contact opens a revision: the Bench says whether the client has looked. */
export async function noteOpening(context: Context, { revision, loaded }: LoadedRevision): Promise<void> {
  const { actor, transaction } = context;
  if (actor.kind !== "contact" || !visibleToClient(revision.state)) return;
  const where = {
    shopId: revision.shopId,
    jobId: loaded.job.id,
    kind: "revision opened" as const,
    personId: actor.personId,
    data: { letter: revision.letter },
  };
  const known = () => Event.findOne({ where, attributes: ["id"], transaction });
  if (await known()) return;
  // Two pages of one reader may open at the same moment; the job's row lets one write after the other.
  await Job.findByPk(loaded.job.id, { attributes: ["id"], transaction, lock: true });
  if (await known()) return;
  await logEvent(context, {
    shopId: revision.shopId,
    jobId: loaded.job.id,
    kind: "revision opened",
    data: { letter: revision.letter },
  });
}
