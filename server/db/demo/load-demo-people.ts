import type { Transaction } from "sequelize";
import type { Role } from "#shared/contracts/account.ts";
import { logEvent } from "../../commands/log-event.ts";
import type { Context, Services } from "../../http/context.ts";
import { Client } from "../../models/client.ts";
import { Contact } from "../../models/contact.ts";
import { Membership } from "../../models/membership.ts";
import { Person } from "../../models/person.ts";
import { Shop } from "../../models/shop.ts";
import { demoAccounts } from "../../start/demo-accounts.mjs";
import { newId } from "../new-id.ts";
import { demoClients, demoShop, demoStaffNames } from "./demo-people.ts";

/** What the demo's jobs build on. */
export type DemoIds = {
  readonly shopId: string;
  readonly people: Readonly<Record<Role, string>>;
  readonly clients: readonly DemoClient[];
};
type DemoClient = { readonly name: string; readonly clientId: string; readonly contacts: readonly DemoContact[] };
type DemoContact = { readonly contactId: string; readonly personId: string; readonly name: string };

type Loading = { readonly transaction: Transaction; readonly now: Date; readonly passwordHash: string };

/** Writes the demo's shop, staff, clients and contacts. The context acts as the owner, for what is loaded next. */
export async function loadDemoPeople(
  services: Services,
  loading: Loading,
): Promise<{ context: Context; ids: DemoIds }> {
  const { transaction, now } = loading;
  const shop = await Shop.create({ id: newId(), ...demoShop, demo: true, createdAt: now }, { transaction });
  const owner = await addMember(loading, shop.id, "owner");
  const maker = await addMember(loading, shop.id, "maker");
  const rep = await addMember(loading, shop.id, "rep");
  const context: Context = {
    services,
    actor: {
      kind: "staff",
      personId: owner.personId,
      name: demoStaffNames.owner,
      sessionId: newId(),
      shopId: shop.id,
      membershipId: owner.id,
      role: "owner",
    },
    shop: { id: shop.id, slug: shop.slug },
    now,
    requestId: "demo",
    address: "127.0.0.1",
    agent: "demo",
    log: services.log,
    transaction,
  };
  await logEvent(context, { shopId: shop.id, kind: "shop opened", data: { name: shop.name } });
  const clients: DemoClient[] = [];
  for (const client of demoClients) {
    clients.push(await addClient(loading, shop.id, client));
    await logEvent(context, { shopId: shop.id, kind: "client added", data: { name: client.name } });
  }
  const people = { owner: owner.personId, maker: maker.personId, rep: rep.personId };
  return { context, ids: { shopId: shop.id, people, clients } };
}

async function addMember(loading: Loading, shopId: string, role: Role): Promise<Membership> {
  const { transaction, now, passwordHash } = loading;
  const account = demoAccounts.find((candidate) => candidate.role === role);
  if (!account) throw new Error(`The demo has no ${role}.`);
  const person = await Person.create(
    {
      id: newId(),
      email: account.email,
      name: demoStaffNames[role],
      passwordHash,
      addressProvenAt: now,
      createdAt: now,
    },
    { transaction },
  );
  return Membership.create({ id: newId(), shopId, personId: person.id, role, createdAt: now }, { transaction });
}

async function addClient(
  { transaction, now }: Loading,
  shopId: string,
  { name, remarks, contacts }: (typeof demoClients)[number],
): Promise<DemoClient> {
  const client = await Client.create({ id: newId(), shopId, name, remarks, createdAt: now }, { transaction });
  const added: DemoContact[] = [];
  for (const { email, name: contactName } of contacts) {
    const person = await Person.create({ id: newId(), email, name: contactName, createdAt: now }, { transaction });
    const contact = await Contact.create(
      { id: newId(), shopId, clientId: client.id, personId: person.id, name: contactName, createdAt: now },
      { transaction },
    );
    added.push({ contactId: contact.id, personId: person.id, name: contactName });
  }
  return { name, clientId: client.id, contacts: added };
}
