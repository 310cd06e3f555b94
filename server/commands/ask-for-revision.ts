import { Op } from "sequelize";
import { invalid } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Note } from "../models/note.ts";
import { findDecidable, recordDecision } from "./decide.ts";
import { logEvent } from "./log-event.ts";
import { mailShop } from "./mail-the-other-side.ts";
import { refreshJob } from "./refresh-job.ts";
import { signalJob } from "./signal-job.ts";

/** Asks for a revision. The shop must be able to tell what is wanted: by an open note of the client's or by a summary. */
export async function askForRevision(
  context: Context,
  { revisionId, summary }: { revisionId: string; summary: string },
): Promise<void> {
  const { transaction } = context;
  const decidable = await findDecidable(context, revisionId);
  const { revision, loaded } = decidable;
  const { job } = loaded;
  const open = await Note.count({
    where: { shopId: job.shopId, jobId: job.id, side: "client", state: "open", kind: { [Op.ne]: "fine as is" } },
    transaction,
  });
  if (open === 0 && summary === "")
    throw invalid([{ pointer: "/summary", detail: "Say what should change, or leave a note at the spot first." }]);
  await revision.update({ state: "revision asked" }, { transaction });
  await recordDecision(context, decidable, {
    kind: "revision asked",
    typedName: null,
    acknowledgements: null,
    summary,
  });
  await logEvent(context, {
    shopId: job.shopId,
    jobId: job.id,
    kind: "revision asked",
    data: { letter: revision.letter, summary },
  });
  await mailShop(context, loaded, { kind: "revision asked", data: { revisionId } });
  await signalJob(context, job, { kind: "revision", id: revisionId });
  await refreshJob(context, job);
}
