import * as contract from "#shared/contracts/clients.ts";
import { addClient, changeClient } from "../commands/add-client.ts";
import { addContact } from "../commands/add-contact.ts";
import { changeContact, inviteContact, removeContact } from "../commands/change-contact.ts";
import { notAllowed, notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { type Routes, read, write } from "../http/route.ts";
import type { Client } from "../models/client.ts";
import type { Contact } from "../models/contact.ts";
import { clientPolicy } from "../policies/client.ts";
import { presentClient, presentContact } from "../presenters/client.ts";
import { findClient, findContact } from "../queries/find-client.ts";
import { listClients } from "../queries/list-clients.ts";
import { loadClients, loadContacts } from "../queries/load-clients.ts";
import { cursorOf } from "../queries/page.ts";

export function registerClientRoutes(routes: Routes): void {
  read(routes, contract.listClients, async (context, { query }) => {
    seeClients(context);
    const clients = await listClients(context, query);
    const shown = clients.slice(0, query.limit);
    const last = clients.length > query.limit ? shown.at(-1) : undefined;
    return {
      items: (await loadClients(context, shown)).map((client) => presentClient(context.actor, client)),
      next: last ? cursorOf([last.id]) : null,
    };
  });

  read(routes, contract.getClient, async (context, { params }) =>
    clientView(context, await findClient(context, params.clientId)),
  );

  write(routes, contract.addClient, async (context, { body }) => {
    seeClients(context);
    if (!clientPolicy.add(context.actor)) throw notAllowed("Clients are added by the shop.");
    return clientView(context, await addClient(context, body));
  });

  write(routes, contract.changeClient, async (context, { params, body }) => {
    const client = await changeableClient(context, params.clientId);
    return clientView(context, await changeClient(context, { client, ...body }));
  });

  write(routes, contract.addContact, async (context, { params, body }) => {
    const client = await changeableClient(context, params.clientId);
    return contactView(context, await addContact(context, { client, ...body }));
  });

  write(routes, contract.changeContact, async (context, { params, body }) => {
    await changeableContact(context, params.contactId);
    return contactView(context, await changeContact(context, { contactId: params.contactId, ...body }));
  });

  write(routes, contract.removeContact, async (context, { params }) => {
    await changeableContact(context, params.contactId);
    await removeContact(context, params.contactId);
    return undefined;
  });

  write(routes, contract.inviteContact, async (context, { params }) => {
    await changeableContact(context, params.contactId);
    await inviteContact(context, params.contactId);
    return undefined;
  });
}

function seeClients({ actor }: ReadContext): void {
  if (!clientPolicy.list(actor)) throw notFound("page");
}

async function changeableClient(context: ReadContext, clientId: string): Promise<Client> {
  const client = await findClient(context, clientId);
  if (!clientPolicy.change(context.actor, client)) throw notAllowed("Clients are looked after by the shop.");
  return client;
}

async function changeableContact(context: ReadContext, contactId: string): Promise<void> {
  const contact = await findContact(context, contactId);
  if (!clientPolicy.change(context.actor, contact)) throw notAllowed("Contacts are looked after by the shop.");
}

async function clientView(context: ReadContext, client: Client) {
  const [loaded] = await loadClients(context, [client]);
  if (!loaded) throw notFound("client");
  return presentClient(context.actor, loaded);
}

async function contactView(context: ReadContext, contact: Contact) {
  const [loaded] = await loadContacts(context, [contact]);
  if (!loaded) throw notFound("contact");
  return presentContact(loaded);
}
