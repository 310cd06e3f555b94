import type { Context } from "../http/context.ts";
import type { Contact } from "../models/contact.ts";
import { findContact } from "../queries/find-client.ts";
import { refuseMoreMail } from "../queries/has-enough-mail.ts";
import { refuseSecond } from "./add-contact.ts";
import { endSessionsWithoutPlace } from "./end-sessions.ts";
import { findOrCreatePerson } from "./find-or-create-person.ts";
import { killLinks } from "./kill-links.ts";
import { logEvent } from "./log-event.ts";
import { queueMail } from "./queue-mail.ts";

/**
 * Changes a contact's name or address. A new address is a new person: the old one is signed out where nothing else of
 * theirs is open, open links stop working, and the old address is told.
 */
export async function changeContact(
  context: Context,
  { contactId, name, email }: { contactId: string; name?: string | undefined; email?: string | undefined },
): Promise<Contact> {
  const { transaction } = context;
  const contact = await findContact(context, contactId, { lock: true });
  if (name !== undefined && name !== contact.name) {
    await contact.update({ name }, { transaction });
    await logEvent(context, { shopId: contact.shopId, kind: "contact changed", data: { name } });
  }
  if (email !== undefined && email !== contact.person?.email) await changeAddress(context, contact, email);
  return contact;
}

async function changeAddress(context: Context, contact: Contact, email: string): Promise<void> {
  const { transaction } = context;
  const { shopId, clientId, name, personId: oldPersonId } = contact;
  const from = contact.person?.email ?? "";
  await refuseMoreMail(context, from, "address changed");
  const person = await findOrCreatePerson(context, { email, name });
  await refuseSecond({ clientId, person, transaction });
  await contact.update({ personId: person.id }, { transaction });
  contact.person = person;
  await killLinks(context, { contactId: contact.id });
  await endSessionsWithoutPlace(context, oldPersonId);
  const data = { contactId: contact.id };
  await queueMail(context, { kind: "address changed", address: from, shopId, recipientId: oldPersonId, data });
  await logEvent(context, { shopId, kind: "contact address changed", data: { name, from, to: email } });
}

/** Ends a contact's access at once. What they wrote and decided stays. */
export async function removeContact(context: Context, contactId: string): Promise<void> {
  const { now, transaction } = context;
  const contact = await findContact(context, contactId, { lock: true });
  await contact.update({ endedAt: now }, { transaction });
  await killLinks(context, { contactId });
  await endSessionsWithoutPlace(context, contact.personId);
  await logEvent(context, { shopId: contact.shopId, kind: "contact removed", data: { name: contact.name } });
}

/** Mails the contact a sign-in link. */
export async function inviteContact(context: Context, contactId: string): Promise<void> {
  const { id, shopId, personId, name, person } = await findContact(context, contactId);
  const address = person?.email ?? "";
  await refuseMoreMail(context, address, "sign in link");
  await queueMail(context, { kind: "sign in link", address, shopId, recipientId: personId, data: { contactId: id } });
  await logEvent(context, { shopId, kind: "contact sent a link", data: { name } });
}
