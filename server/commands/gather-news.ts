import { Op } from "sequelize";
import type { Context } from "../http/context.ts";
import { MailChoices } from "../models/mail-choices.ts";
import { type NoteNews, OutgoingMail } from "../models/outgoing-mail.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { approversToMail, type MailReader, membersToMail } from "../queries/mail-readers.ts";
import { queueMail } from "./queue-mail.ts";

/** How long a mail waits for more to tell after the first of it, seconds. */
const gatheringSeconds = 10 * 60;

/**
 * Has the other side told what happened to a note: the shop what the client did, the client's approvers what the shop did. It goes into
 * the mail that gathers for each of them, which leaves ten minutes after the first of its news. The caller holds the job's row locked.
 */
export async function gatherNews(
  context: Pick<Context, "actor" | "now" | "transaction">,
  loaded: LoadedJob,
  news: NoteNews,
): Promise<void> {
  const readers =
    context.actor.kind === "contact"
      ? await membersToMail(context, loaded.job)
      : await approversToMail(context, loaded);
  const { shopId } = loaded.job;
  const stopped = await MailChoices.findAll({
    where: { shopId, notes: false, personId: { [Op.in]: readers.map(({ personId }) => personId) } },
    transaction: context.transaction,
  });
  for (const reader of readers) {
    if (stopped.some(({ personId }) => personId === reader.personId)) continue;
    await gatherFor(context, loaded, { reader, news });
  }
}

async function gatherFor(
  context: Pick<Context, "now" | "transaction">,
  { job: { id: jobId, shopId } }: LoadedJob,
  { reader: { personId: recipientId, address, contactId }, news }: { reader: MailReader; news: NoteNews },
): Promise<void> {
  const { transaction } = context;
  const gathering = await OutgoingMail.findAll({
    where: { jobId, recipientId, kind: "notes gathered", state: "queued", closedAt: null },
    lock: true,
    transaction,
  });
  const mail = gathering.find(({ data }) => (data.contactId ?? null) === contactId);
  if (mail) {
    // Who got another address in these minutes is told there.
    await mail.update({ address, data: { ...mail.data, news: [...(mail.data.news ?? []), news] } }, { transaction });
    return;
  }
  const data = { ...(contactId ? { contactId } : {}), news: [news] };
  await queueMail(context, {
    kind: "notes gathered",
    data,
    address,
    shopId,
    jobId,
    recipientId,
    inSeconds: gatheringSeconds,
  });
}
