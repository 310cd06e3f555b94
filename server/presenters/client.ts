import type { z } from "zod";
import type { clientSchema, contactSchema } from "#shared/contracts/clients.ts";
import type { Actor } from "../policies/actor.ts";
import { clientPolicy } from "../policies/client.ts";
import type { LoadedClient, LoadedContact } from "../queries/load-clients.ts";

export function presentContact({ contact, email, lastSeenAt }: LoadedContact): z.input<typeof contactSchema> {
  return { id: contact.id, name: contact.name, email, lastSeenAt: lastSeenAt?.toISOString() ?? null };
}

export function presentClient(
  actor: Actor,
  { client, contacts, openJobs }: LoadedClient,
): z.input<typeof clientSchema> {
  return {
    id: client.id,
    name: client.name,
    remarks: client.remarks,
    contacts: contacts.map(presentContact),
    openJobs,
    can: { change: clientPolicy.change(actor, client) },
  };
}
