import type { Transaction } from "sequelize";
import { Client } from "../../models/client.ts";
import { Contact } from "../../models/contact.ts";
import { Invitation } from "../../models/invitation.ts";
import type { OutgoingMail } from "../../models/outgoing-mail.ts";
import { Person } from "../../models/person.ts";
import { Shop } from "../../models/shop.ts";
import { type Draft, linkHours, linkRemarks, type NotSent, notSent } from "../draft.ts";
import { pages } from "../pages.ts";

/** The contact a mail is for, as long as they are one and the address is still theirs. */
export async function recipientContact(
  { data, address, shopId }: OutgoingMail,
  transaction: Transaction,
): Promise<{ contact: Contact; client: Client; shop: Shop } | null> {
  if (!data.contactId || !shopId) return null;
  const contact = await Contact.findOne({
    where: { id: data.contactId, shopId, endedAt: null },
    include: [
      { model: Client, as: "client" },
      { model: Shop, as: "shop" },
      { model: Person, as: "person" },
    ],
    transaction,
  });
  const { client, shop, person } = contact ?? {};
  return contact && client && shop && person?.email === address ? { contact, client, shop } : null;
}

export async function signInLink(mail: OutgoingMail, transaction: Transaction): Promise<Draft | NotSent> {
  const found = await recipientContact(mail, transaction);
  if (!found) return notSent.gone;
  const { contact, client, shop } = found;
  const { revisionId } = mail.data;
  return {
    greeting: contact.name,
    sender: shop.name,
    letter: {
      subject: `Your link to ${shop.name}`,
      paragraphs: [`Here is your link to what ${shop.name} has drawn for ${client.name}.`],
      after: [linkRemarks["sign in"]],
    },
    button: {
      label: "Open it",
      leadsTo: {
        purpose: "sign in",
        hours: linkHours["sign in"],
        contactId: contact.id,
        personId: contact.personId,
        goTo: revisionId ? pages.sheet(shop.slug, revisionId) : null,
      },
    },
  };
}

export async function invitation(mail: OutgoingMail, transaction: Transaction): Promise<Draft | NotSent> {
  const { shopId, data, address } = mail;
  if (!shopId || !data.invitationId) return notSent.missing;
  const invited = await Invitation.findOne({
    where: { id: data.invitationId, shopId, email: address, acceptedAt: null, revokedAt: null },
    include: [{ model: Person, as: "inviter" }],
    transaction,
  });
  const shop = await Shop.findByPk(shopId, { transaction });
  if (!invited || !shop) return notSent.missing;
  const by = invited.inviter?.name ?? shop.name;
  return {
    greeting: address,
    sender: shop.name,
    letter: {
      subject: `Join ${shop.name}`,
      paragraphs: [`${by} asks you to join ${shop.name} as ${invited.role}.`],
      after: [linkRemarks["join shop"], "If you do not know them, you need not do anything."],
    },
    button: {
      label: "Join the shop",
      leadsTo: {
        purpose: "join shop",
        hours: linkHours["join shop"],
        invitationId: invited.id,
        goTo: pages.bench(shop.slug),
      },
    },
  };
}

export async function newPassword(mail: OutgoingMail, transaction: Transaction): Promise<Draft | NotSent> {
  if (!mail.data.personId) return notSent.gone;
  const person = await Person.findOne({ where: { id: mail.data.personId, email: mail.address }, transaction });
  if (!person) return notSent.gone;
  return {
    greeting: person.name,
    sender: null,
    letter: {
      subject: "Set a new password",
      paragraphs: ["Someone asked to set a new password for this address."],
      after: [linkRemarks["new password"]],
    },
    button: {
      label: "Set a new password",
      leadsTo: { purpose: "new password", hours: linkHours["new password"], personId: person.id, goTo: null },
    },
  };
}

/** Goes to the address that no longer counts, so it is sent whatever the contact's address is now. */
export async function addressChanged(mail: OutgoingMail, transaction: Transaction): Promise<Draft | NotSent> {
  const { shopId, data } = mail;
  if (!shopId || !data.contactId) return notSent.missing;
  const contact = await Contact.findOne({
    where: { id: data.contactId, shopId },
    include: [
      { model: Client, as: "client" },
      { model: Shop, as: "shop" },
    ],
    transaction,
  });
  if (!contact?.client || !contact.shop) return notSent.missing;
  return {
    greeting: contact.name,
    sender: contact.shop.name,
    letter: {
      subject: `${contact.shop.name} writes to another address now`,
      paragraphs: [
        `${contact.shop.name} has changed the address for ${contact.name} at ${contact.client.name}. This address was signed out, and links that were sent to it no longer work.`,
      ],
      after: ["If that is not right, please tell the shop."],
    },
    button: null,
  };
}
