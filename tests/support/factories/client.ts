import { newId } from "#server/db/new-id.ts";
import { Client } from "#server/models/client.ts";
import { Contact } from "#server/models/contact.ts";
import type { Person } from "#server/models/person.ts";
import type { Shop } from "#server/models/shop.ts";
import { buildPerson } from "./person.ts";
import { buildShop } from "./shop.ts";
import { unique } from "./unique.ts";

export async function buildClient({
  shop,
  ...overrides
}: { shop?: Shop } & Partial<Pick<Client, "name" | "remarks">> = {}): Promise<Client> {
  const shopId = (shop ?? (await buildShop())).id;
  return Client.create({ id: newId(), shopId, name: `Client ${unique()}`, createdAt: new Date(), ...overrides });
}

export type BuiltContact = { contact: Contact; person: Person; client: Client; email: string };

/** A client's contact, without a password; client and person are made unless given. */
export async function buildContact({
  client: givenClient,
  person: givenPerson,
  name,
}: {
  client?: Client;
  person?: Person;
  name?: string;
} = {}): Promise<BuiltContact> {
  const client = givenClient ?? (await buildClient());
  const person = givenPerson ?? (await buildPerson({ passwordHash: null, addressProvenAt: null }));
  const contact = await Contact.create({
    id: newId(),
    shopId: client.shopId,
    clientId: client.id,
    personId: person.id,
    name: name ?? person.name,
    createdAt: new Date(),
  });
  return { contact, person, client, email: person.email };
}
