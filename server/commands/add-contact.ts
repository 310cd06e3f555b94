import type { Transaction } from "sequelize";
import { newId } from "../db/new-id.ts";
import { AppError } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Client } from "../models/client.ts";
import { Contact } from "../models/contact.ts";
import type { Person } from "../models/person.ts";
import { findOrCreatePerson } from "./find-or-create-person.ts";
import { logEvent } from "./log-event.ts";

/** Adds a contact to a client. No mail goes out: that is asked for by itself. */
export async function addContact(
  context: Context,
  { client, name, email }: { client: Client; name: string; email: string },
): Promise<Contact> {
  const { now, transaction } = context;
  const { id: clientId, shopId } = client;
  const person = await findOrCreatePerson(context, { email, name });
  await refuseSecond({ clientId, person, transaction });
  const row = { id: newId(), shopId, clientId, personId: person.id, name, createdAt: now };
  const contact = await Contact.create(row, { transaction });
  contact.person = person;
  await logEvent(context, { shopId, kind: "contact added", data: { name, email } });
  return contact;
}

/** One person is one contact of a client. Locks the client, so that two requests can't both find none. */
export async function refuseSecond({
  clientId,
  person,
  transaction,
}: {
  clientId: string;
  person: Person;
  transaction: Transaction;
}): Promise<void> {
  await Client.findByPk(clientId, { lock: transaction.LOCK.UPDATE, transaction });
  const where = { clientId, personId: person.id, endedAt: null };
  if ((await Contact.count({ where, transaction })) === 0) return;
  throw new AppError("already_exists", {
    detail: "This address is a contact of this client already.",
    errors: [{ pointer: "/email", detail: "This address is a contact of this client already." }],
  });
}
