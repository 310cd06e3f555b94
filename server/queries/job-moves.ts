import { Op } from "sequelize";
import { briefMissing } from "#shared/lifecycle/brief.ts";
import { staffStates } from "#shared/lifecycle/job-states.ts";
import { revisionOut } from "#shared/lifecycle/revision-row.ts";
import type { MoveFacts } from "#shared/lifecycle/whose-move.ts";
import type { ReadContext } from "../http/context.ts";
import { Event } from "../models/event.ts";
import { Note } from "../models/note.ts";
import type { LoadedJob } from "./load-jobs.ts";

/** A job's brief and approvers as the lifecycle asks about them. */
export function missingOf({ job, approvers }: LoadedJob): string[] {
  return briefMissing({ ...job.brief, dueOn: job.dueOn, approvers: approvers.length });
}

/** What whoseMove of shared/lifecycle asks about each job, in the same order, in two queries for the lot. */
export async function moveFactsOf(
  { transaction }: Pick<ReadContext, "transaction">,
  loaded: readonly LoadedJob[],
): Promise<MoveFacts[]> {
  const jobId = loaded.map(({ job }) => job.id);
  const open = await Note.findAll({
    where: { jobId, state: "open", side: "client", shopOnly: false, kind: { [Op.ne]: "fine as is" } },
    attributes: ["id", "jobId"],
    transaction,
  });
  const openings = await Event.findAll({
    where: { jobId, kind: "revision opened", side: "client" },
    attributes: ["jobId", "data"],
    transaction,
  });
  return loaded.map((one) => {
    const { job, revisions } = one;
    const out = revisionOut(revisions);
    return {
      briefComplete: missingOf(one).length === 0,
      briefSent: false,
      revisions: revisions.map(({ letter, state }) => ({ letter, state })),
      setByStaff: staffStates.find((state) => state === job.state) ?? null,
      openClientNotes: open.filter((note) => note.jobId === job.id).length,
      openedByClient:
        out !== null &&
        openings.some((event) => event.jobId === job.id && "letter" in event.data && event.data.letter === out.letter),
      depositOwed: false,
    };
  });
}
