import { Op } from "sequelize";
import type { Context } from "../http/context.ts";
import { Contact } from "../models/contact.ts";
import { Membership } from "../models/membership.ts";
import type { LoadedJob } from "./load-jobs.ts";

export type MailReader = {
  readonly personId: string;
  readonly address: string;
  /** Of whom reads as a client's contact. */
  readonly contactId: string | null;
};

/** Those who draw and own: each member but the actor. */
export async function membersToMail(
  { actor, transaction }: Pick<Context, "actor" | "transaction">,
  { shopId }: LoadedJob["job"],
): Promise<MailReader[]> {
  const members = await Membership.findAll({
    where: { shopId, endedAt: null, ...("personId" in actor ? { personId: { [Op.ne]: actor.personId } } : {}) },
    include: ["person"],
    order: ["createdAt", "id"],
    transaction,
  });
  return members.flatMap(({ person }) =>
    person ? [{ personId: person.id, address: person.email, contactId: null }] : [],
  );
}

/** Each approver whom the brief names and who is still a contact. */
export async function approversToMail(
  { transaction }: Pick<Context, "transaction">,
  { job, approvers }: LoadedJob,
): Promise<MailReader[]> {
  const contacts = await Contact.findAll({
    where: { id: approvers.map(({ contactId }) => contactId), shopId: job.shopId, endedAt: null },
    include: ["person"],
    order: ["id"],
    transaction,
  });
  return contacts.flatMap(({ id, person }) =>
    person ? [{ personId: person.id, address: person.email, contactId: id }] : [],
  );
}
