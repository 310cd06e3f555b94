import type { Context } from "../http/context.ts";
import { findNamedDraft } from "../queries/find-named-draft.ts";
import { jobToChange } from "./keep-draft.ts";
import { logEvent } from "./log-event.ts";

/** Removes a draft with what it holds. Its row stays, so that the log has what it names. */
export async function removeDraft(
  context: Context,
  { jobId, draftId }: { jobId: string; draftId: string },
): Promise<void> {
  const { job } = await jobToChange(context, jobId);
  const draft = await findNamedDraft(context, { jobId, draftId });
  await draft.update({ document: null, removedAt: context.now }, { transaction: context.transaction });
  await logEvent(context, { shopId: job.shopId, jobId, kind: "draft removed", data: { name: draft.name } });
}
