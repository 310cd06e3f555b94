import type { Transaction } from "sequelize";
import { tokenHash } from "../auth/tokens.ts";
import { Contact } from "../models/contact.ts";
import { Invitation } from "../models/invitation.ts";
import { OneTimeLink } from "../models/one-time-link.ts";
import { OutgoingMail } from "../models/outgoing-mail.ts";
import { Person } from "../models/person.ts";
import { hasEnoughMail } from "../queries/has-enough-mail.ts";
import { killLinks } from "./kill-links.ts";
import { queueMail } from "./queue-mail.ts";

type At = { readonly now: Date; readonly transaction: Transaction };

/** Mails a sign-in link to the contact of an address, one for each shop they are a contact of. None when unknown. */
export async function mailSignInLinks(at: At, email: string): Promise<void> {
  const person = await Person.findOne({ where: { email }, transaction: at.transaction });
  if (!person || (await hasEnoughMail(at, email, "sign in link"))) return;
  const contacts = await Contact.findAll({
    where: { personId: person.id, endedAt: null },
    order: ["createdAt", "id"],
    transaction: at.transaction,
  });
  const oneEach = new Map(contacts.map((contact) => [contact.shopId, contact]));
  for (const { id: contactId, shopId } of oneEach.values()) {
    await queueMail(at, { kind: "sign in link", address: email, shopId, recipientId: person.id, data: { contactId } });
  }
}

/** Mails a link that sets a new password. Nothing when the address is unknown. */
export async function mailPasswordLink(at: At, email: string): Promise<void> {
  const person = await Person.findOne({ where: { email }, transaction: at.transaction });
  if (!person || (await hasEnoughMail(at, email, "new password"))) return;
  const data = { personId: person.id };
  await queueMail(at, { kind: "new password", address: email, shopId: null, recipientId: person.id, data });
}

/**
 * Mails a fresh link in place of one, to the address that one went to, and ends the old one. Nothing when the link was
 * never ours, or when its address does not belong to the contact, the person or the invitation any more.
 */
export async function mailFreshLink(at: At, token: string): Promise<void> {
  const { transaction } = at;
  const link = await OneTimeLink.findOne({ where: { tokenHash: tokenHash(token) }, transaction });
  if (!link) return;
  switch (link.purpose) {
    case "sign in":
      return freshSignIn(at, link);
    case "join shop":
      return freshInvitation(at, link);
    case "new password":
      await killLinks(at, { personId: link.personId ?? null, purpose: "new password" });
      return mailPasswordLink(at, link.address);
  }
}

async function freshSignIn(at: At, link: OneTimeLink): Promise<void> {
  const { transaction } = at;
  const contact =
    link.contactId &&
    (await Contact.findOne({
      where: { id: link.contactId, endedAt: null },
      include: [{ model: Person, as: "person" }],
      transaction,
    }));
  if (!contact || contact.person?.email !== link.address || (await hasEnoughMail(at, link.address, "sign in link")))
    return;
  await OneTimeLink.update(
    { killedAt: at.now },
    { where: { contactId: contact.id, goTo: link.goTo ?? null, spentAt: null, killedAt: null }, transaction },
  );
  const first = await OutgoingMail.findByPk(link.mailId, { transaction });
  const revisionId = first?.data.revisionId;
  await queueMail(at, {
    kind: "sign in link",
    address: link.address,
    shopId: contact.shopId,
    jobId: first?.jobId ?? null,
    recipientId: contact.personId,
    data: { contactId: contact.id, ...(revisionId ? { revisionId } : {}) },
  });
}

async function freshInvitation(at: At, { invitationId, address }: OneTimeLink): Promise<void> {
  const invitation =
    invitationId &&
    (await Invitation.findOne({
      where: { id: invitationId, email: address, acceptedAt: null, revokedAt: null },
      transaction: at.transaction,
    }));
  if (!invitation || (await hasEnoughMail(at, address, "invitation"))) return;
  await killLinks(at, { invitationId: invitation.id });
  await queueMail(at, {
    kind: "invitation",
    address,
    shopId: invitation.shopId,
    data: { invitationId: invitation.id },
  });
}
