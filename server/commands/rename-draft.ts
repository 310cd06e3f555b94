import type { Context } from "../http/context.ts";
import type { NamedDraft } from "../models/named-draft.ts";
import { findNamedDraft } from "../queries/find-named-draft.ts";
import { jobToChange, refuseUsedName } from "./keep-draft.ts";
import { logEvent } from "./log-event.ts";

/** Gives a draft another name; the one it has changes nothing. */
export async function renameDraft(
  context: Context,
  { jobId, draftId, name }: { jobId: string; draftId: string; name: string },
): Promise<NamedDraft> {
  const { job } = await jobToChange(context, jobId);
  const draft = await findNamedDraft(context, { jobId, draftId });
  if (draft.name === name) return draft;
  await refuseUsedName(context, { jobId, name, exceptId: draftId });
  const from = draft.name;
  await draft.update({ name }, { transaction: context.transaction });
  await logEvent(context, { shopId: job.shopId, jobId, kind: "draft renamed", data: { from, to: name } });
  return draft;
}
