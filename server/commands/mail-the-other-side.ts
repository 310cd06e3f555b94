import type { Context } from "../http/context.ts";
import type { MailData, MailKind } from "../models/outgoing-mail.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { approversToMail, type MailReader, membersToMail } from "../queries/mail-readers.ts";
import { queueMail } from "./queue-mail.ts";

type News = { readonly kind: MailKind; readonly data: MailData };
type Sender = Pick<Context, "actor" | "now" | "transaction">;

/** A mail that each of the shop needs, but the actor. Needed mail is never held back, however much there is. */
export async function mailShop(context: Sender, { job }: LoadedJob, news: News): Promise<void> {
  await mailEach(context, job, await membersToMail(context, job), news);
}

/** Likewise one that each approver whom the brief names needs, with a link of their own. */
export async function mailApprovers(
  context: Pick<Context, "now" | "transaction">,
  loaded: LoadedJob,
  news: News,
): Promise<void> {
  await mailEach(context, loaded.job, await approversToMail(context, loaded), news);
}

async function mailEach(
  context: Pick<Context, "now" | "transaction">,
  { id: jobId, shopId }: LoadedJob["job"],
  readers: readonly MailReader[],
  { kind, data }: News,
): Promise<void> {
  for (const { personId: recipientId, address, contactId } of readers) {
    const about = { ...data, ...(contactId ? { contactId } : {}) };
    await queueMail(context, { kind, data: about, address, shopId, jobId, recipientId });
  }
}
