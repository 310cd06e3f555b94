import { QueryTypes } from "sequelize";
import { type ReadContext, shopIdOf } from "../http/context.ts";
import type { Client } from "../models/client.ts";
import { Contact } from "../models/contact.ts";
import { Person } from "../models/person.ts";

export type LoadedContact = { readonly contact: Contact; readonly email: string; readonly lastSeenAt: Date | null };
export type LoadedClient = {
  readonly client: Client;
  readonly contacts: readonly LoadedContact[];
  readonly openJobs: number;
};

/** What belongs to clients, in three queries for any number of them. */
export async function loadClients(context: ReadContext, clients: readonly Client[]): Promise<LoadedClient[]> {
  const clientIds = clients.map(({ id }) => id);
  if (clientIds.length === 0) return [];
  const contacts = await loadContacts(
    context,
    await Contact.findAll({
      where: { shopId: shopIdOf(context), clientId: clientIds, endedAt: null },
      include: [{ model: Person, as: "person" }],
      order: ["createdAt", "id"],
      transaction: context.transaction,
    }),
  );
  const openJobs = await countOpenJobs(context, clientIds);
  return clients.map((client) => ({
    client,
    contacts: contacts.filter(({ contact }) => contact.clientId === client.id),
    openJobs: openJobs.get(client.id) ?? 0,
  }));
}

/** Contacts (read with their person) with what they last did in this shop; what they do in others is not ours to tell. */
export async function loadContacts(context: ReadContext, contacts: readonly Contact[]): Promise<LoadedContact[]> {
  const personIds = [...new Set(contacts.map(({ personId }) => personId))];
  if (personIds.length === 0) return [];
  const rows = await context.services.sequelize.query<{ personId: string; at: Date }>(
    `select person_id as "personId", max(at) as at from events
     where shop_id = :shopId and person_id in (:personIds) and side = 'client' group by person_id`,
    {
      replacements: { shopId: shopIdOf(context), personIds },
      type: QueryTypes.SELECT,
      transaction: context.transaction ?? null,
    },
  );
  const seen = new Map(rows.map(({ personId, at }) => [personId, at]));
  return contacts.map((contact) => ({
    contact,
    email: contact.person?.email ?? "",
    lastSeenAt: seen.get(contact.personId) ?? null,
  }));
}

async function countOpenJobs(context: ReadContext, clientIds: readonly string[]): Promise<Map<string, number>> {
  const rows = await context.services.sequelize.query<{ clientId: string; count: number }>(
    `select client_id as "clientId", count(*)::int as count from jobs
     where shop_id = :shopId and client_id in (:clientIds) and state not in ('handed over', 'closed', 'cancelled')
     group by client_id`,
    {
      replacements: { shopId: shopIdOf(context), clientIds: [...clientIds] },
      type: QueryTypes.SELECT,
      transaction: context.transaction ?? null,
    },
  );
  return new Map(rows.map(({ clientId, count }) => [clientId, count]));
}
