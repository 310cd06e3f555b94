import type { Context } from "../../http/context.ts";
import { newId } from "../new-id.ts";
import type { DemoIds } from "./load-demo-people.ts";

const dayMs = 86_400_000;

/** The owner's context as somebody else's, some days ago: the demo's past was made by its people, one after the other. */
export function contextsOf(owner: Context, ids: DemoIds) {
  const ago = (days: number) => new Date(owner.now.getTime() - days * dayMs);
  return {
    asOwner: (days: number): Context => ({ ...owner, now: ago(days) }),
    asMaker: (days: number): Context => ({
      ...owner,
      now: ago(days),
      actor: {
        kind: "staff",
        personId: ids.people.maker,
        name: "Tobin Ashgrove",
        sessionId: newId(),
        shopId: ids.shopId,
        membershipId: newId(),
        role: "maker",
      },
    }),
    asContact: (clientName: string, days: number): Context => {
      const client = ids.clients.find(({ name }) => name === clientName);
      const contact = client?.contacts[0];
      if (!client || !contact) throw new Error(`The demo has no contact at ${clientName}.`);
      return {
        ...owner,
        now: ago(days),
        actor: {
          kind: "contact",
          personId: contact.personId,
          name: contact.name,
          sessionId: newId(),
          shopId: ids.shopId,
          contacts: [{ contactId: contact.contactId, clientId: client.clientId, name: contact.name }],
        },
      };
    },
    /** Days from now as the day of a brief. */
    dueIn: (days: number) => ago(-days).toISOString().slice(0, 10),
  };
}

export type DemoContexts = ReturnType<typeof contextsOf>;
