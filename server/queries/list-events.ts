import { Op } from "sequelize";
import type { ReadContext } from "../http/context.ts";
import { Event } from "../models/event.ts";
import { readCursor } from "./page.ts";

/** Up to `limit + 1` events of a job of this shop, newest first. */
export async function listEvents(
  { shop, transaction }: ReadContext,
  jobId: string,
  { cursor, limit }: { cursor?: string | undefined; limit: number },
): Promise<Event[]> {
  const after = readCursor(cursor, 1);
  return Event.findAll({
    where: { shopId: shop?.id ?? "", jobId, ...(after ? { id: { [Op.lt]: String(after[0]) } } : {}) },
    order: [["id", "desc"]],
    limit: limit + 1,
    transaction,
  });
}
