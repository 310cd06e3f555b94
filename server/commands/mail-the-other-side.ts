import { Op } from "sequelize";
import type { Context } from "../http/context.ts";
import { Contact } from "../models/contact.ts";
import { Membership } from "../models/membership.ts";
import type { MailData, MailKind } from "../models/outgoing-mail.ts";
import { hasEnoughMail } from "../queries/has-enough-mail.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { queueMail } from "./queue-mail.ts";

type News = { readonly kind: MailKind; readonly data: MailData };
type Sender = Pick<Context, "actor" | "now" | "transaction">;

/** Tells the shop what the client did, and the client's approvers what the shop did. Whoever got enough within the hour is not mailed again. */
export async function mailTheOtherSide(context: Sender, loaded: LoadedJob, news: News): Promise<void> {
  if (context.actor.kind === "contact") await mailShop(context, loaded, news);
  else await mailApprovers(context, loaded, news);
}

/** Those who draw and own: each member but the actor. */
export async function mailShop({ actor, ...context }: Sender, { job }: LoadedJob, news: News): Promise<void> {
  const members = await Membership.findAll({
    where: {
      shopId: job.shopId,
      endedAt: null,
      ...(actor.kind === "nobody" ? {} : { personId: { [Op.ne]: actor.personId } }),
    },
    include: ["person"],
    order: ["createdAt", "id"],
    transaction: context.transaction,
  });
  for (const { person } of members) {
    if (!person || (await hasEnoughMail(context, person.email, news.kind))) continue;
    await queueMail(context, {
      ...news,
      address: person.email,
      shopId: job.shopId,
      jobId: job.id,
      recipientId: person.id,
    });
  }
}

/** Each approver whom the brief names gets a link of their own. */
export async function mailApprovers(
  context: Pick<Context, "now" | "transaction">,
  { job, approvers }: LoadedJob,
  news: News,
): Promise<void> {
  const contacts = await Contact.findAll({
    where: { id: approvers.map(({ contactId }) => contactId), shopId: job.shopId, endedAt: null },
    include: ["person"],
    order: ["id"],
    transaction: context.transaction,
  });
  for (const { id, person } of contacts) {
    if (!person || (await hasEnoughMail(context, person.email, news.kind))) continue;
    await queueMail(context, {
      kind: news.kind,
      data: { ...news.data, contactId: id },
      address: person.email,
      shopId: job.shopId,
      jobId: job.id,
      recipientId: person.id,
    });
  }
}
