import { literal, Op, type WhereOptions } from "sequelize";
import { z } from "zod";
import { type ReadContext, shopIdOf } from "../http/context.ts";
import { Client } from "../models/client.ts";
import { places, readCursor } from "./page.ts";

const byName = literal('lower("Client"."name")');

/** Up to `limit + 1` clients of the shop by name; `q` is looked for in their name and in their contacts' names and addresses. */
export function listClients(
  context: ReadContext,
  { cursor, limit, q }: { cursor?: string | undefined; limit: number; q?: string | undefined },
): Promise<Client[]> {
  const after = readCursor(cursor, z.tuple([places.id]));
  const wanted = q?.trim();
  const shopId = shopIdOf(context);
  const conditions: WhereOptions[] = [{ shopId }];
  if (after) {
    conditions.push(
      literal(`(lower("Client"."name"), "Client"."id") > (
        select lower(before.name), before.id from clients before where before.shop_id = :shopId and before.id = :id)`),
    );
  }
  if (wanted) {
    conditions.push(
      literal(`("Client"."name" ilike :q or exists (
        select from contacts join people on people.id = contacts.person_id
        where contacts.client_id = "Client"."id" and contacts.ended_at is null
          and (contacts.name ilike :q or people.email ilike :q)))`),
    );
  }
  return Client.findAll({
    where: { [Op.and]: conditions },
    replacements: {
      shopId,
      id: after?.[0] ?? null,
      q: `%${(wanted ?? "").replace(/[\\%_]/g, "\\$&")}%`,
    },
    order: [byName, "id"],
    limit: limit + 1,
    transaction: context.transaction,
  });
}
