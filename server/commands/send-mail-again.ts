import { notFound, wrongState } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Contact } from "../models/contact.ts";
import { Membership } from "../models/membership.ts";
import { OutgoingMail } from "../models/outgoing-mail.ts";
import { Person } from "../models/person.ts";
import { jobPolicy } from "../policies/job.ts";
import { findJob } from "../queries/find-job.ts";
import { logEvent } from "./log-event.ts";
import { queueMail } from "./queue-mail.ts";
import { signalJob } from "./signal-job.ts";

/** Sends what a refused mail said once more, as it reads now, to the address that its reader has now. Each refused mail is followed once. */
export async function sendMailAgain(
  context: Context,
  { jobId, mailId }: { jobId: string; mailId: string },
): Promise<void> {
  const { actor, transaction, now } = context;
  const { job, facts } = await findJob(context, jobId, { lock: true });
  if (!jobPolicy.seeLog(actor, facts)) throw notFound("mail");
  const mail = await OutgoingMail.findOne({ where: { id: mailId, jobId, shopId: job.shopId }, transaction });
  if (!mail) throw notFound("mail");
  if (mail.state !== "refused") throw wrongState("Only a mail that was refused is sent again.");
  if (await OutgoingMail.findOne({ where: { follows: mailId }, attributes: ["id"], transaction }))
    throw wrongState("This mail was sent again already.");
  const reader = await readerOf(context, mail);
  if (!reader) throw wrongState("Whom this mail was for is no longer here. Nobody would get it.");
  const { kind, shopId, data } = mail;
  await queueMail(context, {
    kind,
    data,
    shopId,
    jobId,
    address: reader.email,
    recipientId: reader.id,
    follows: mailId,
    gathersNoMore: true,
  });
  await logEvent(context, { shopId: job.shopId, jobId, kind: "mail sent again", data: { kind, to: reader.email } });
  await signalJob({ services: context.services, transaction, now }, job, { kind: "job", id: jobId, shopOnly: true });
}

/** Who reads in the place of the one whom the mail was for: a contact may have another address by now. */
async function readerOf(
  { transaction }: Context,
  { data: { contactId }, recipientId, shopId }: OutgoingMail,
): Promise<Person | null> {
  const include = [{ model: Person, as: "person" }];
  const place = contactId
    ? await Contact.findOne({ where: { id: contactId, shopId: shopId ?? "", endedAt: null }, include, transaction })
    : await Membership.findOne({
        where: { personId: recipientId ?? "", shopId: shopId ?? "", endedAt: null },
        include,
        transaction,
      });
  return place?.person ?? null;
}
