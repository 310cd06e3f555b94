import { Op } from "sequelize";
import { z } from "zod";
import type { ReadContext } from "../http/context.ts";
import { Event } from "../models/event.ts";
import { places, readCursor } from "./page.ts";

/** Up to `limit + 1` events of a job of this shop, newest first. */
export async function listEvents(
  { shop, transaction }: ReadContext,
  jobId: string,
  { cursor, limit }: { cursor?: string | undefined; limit: number },
): Promise<Event[]> {
  const after = readCursor(cursor, z.tuple([places.bigNumber]));
  return Event.findAll({
    where: { shopId: shop?.id ?? "", jobId, ...(after ? { id: { [Op.lt]: after[0] } } : {}) },
    order: [["id", "desc"]],
    limit: limit + 1,
    transaction,
  });
}
