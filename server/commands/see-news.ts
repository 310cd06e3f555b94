import { takesNotes } from "#shared/lifecycle/revision-states.ts";
import type { Context } from "../http/context.ts";
import { isInsider } from "../policies/actor.ts";
import type { LoadedRevision } from "../queries/find-revision.ts";

/** Whoever opens the sheet that is talked about sees what was said so far: the mail that gathers for them need not tell it. */
export async function seeNews(
  { services, actor, transaction }: Context,
  { revision: { jobId, shopId, state } }: LoadedRevision,
): Promise<void> {
  if (!isInsider(actor) || !takesNotes(state)) return;
  await services.sequelize.query(
    `update outgoing_mails set data = jsonb_set(data, '{seen}', to_jsonb(jsonb_array_length(data->'news')))
     where shop_id = $1::uuid and job_id = $2::uuid and recipient_id = $3::uuid
       and kind = 'notes gathered' and state = 'queued' and closed_at is null`,
    { bind: [shopId, jobId, actor.personId], transaction },
  );
}
