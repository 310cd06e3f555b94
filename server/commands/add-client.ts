import { newId } from "../db/new-id.ts";
import { type Context, shopIdOf } from "../http/context.ts";
import { Client } from "../models/client.ts";
import { logEvent } from "./log-event.ts";

export async function addClient(
  context: Context,
  { name, remarks }: { name: string; remarks: string },
): Promise<Client> {
  const { now, transaction } = context;
  const shopId = shopIdOf(context);
  const client = await Client.create({ id: newId(), shopId, name, remarks, createdAt: now }, { transaction });
  await logEvent(context, { shopId, kind: "client added", data: { name } });
  return client;
}

/** Changes the given fields; what is not given stays. */
export async function changeClient(
  context: Context,
  { client, name, remarks }: { client: Client; name?: string | undefined; remarks?: string | undefined },
): Promise<Client> {
  const { transaction } = context;
  client.set({ ...(name === undefined ? {} : { name }), ...(remarks === undefined ? {} : { remarks }) });
  if (!client.changed()) return client;
  await client.save({ transaction });
  await logEvent(context, { shopId: client.shopId, kind: "client changed", data: { name: client.name } });
  return client;
}
