import { notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { Client } from "../models/client.ts";
import { Contact } from "../models/contact.ts";
import { Person } from "../models/person.ts";
import { clientPolicy } from "../policies/client.ts";

/** The client of this shop that the actor may see, else "not found". */
export async function findClient({ shop, actor, transaction }: ReadContext, clientId: string): Promise<Client> {
  const client = shop ? await Client.findOne({ where: { id: clientId, shopId: shop.id }, transaction }) : null;
  if (!client || !clientPolicy.see(actor, client)) throw notFound("client");
  return client;
}

/** The contact with its person, as long as it is one, else "not found". `lock` takes its row first. */
export async function findContact(
  { shop, actor, transaction }: ReadContext,
  contactId: string,
  { lock = false }: { lock?: boolean } = {},
): Promise<Contact> {
  const contact = shop
    ? await Contact.findOne({
        where: { id: contactId, shopId: shop.id, endedAt: null },
        transaction,
        ...(lock ? { lock: true } : {}),
      })
    : null;
  if (!contact || !clientPolicy.see(actor, contact)) throw notFound("contact");
  const person = await Person.findByPk(contact.personId, { transaction });
  if (!person) throw notFound("contact");
  contact.person = person;
  return contact;
}
