import { literal, Op } from "sequelize";
import type { FrozenSetAside } from "#shared/dry-fit/set-aside.ts";
import type { ReadContext } from "../http/context.ts";
import { SetAside } from "../models/set-aside.ts";
import { readTimeCursor } from "./page.ts";

/** Up to `limit + 1` of what is set aside on a job of this shop, newest first. */
export async function listSetAsides(
  { shop, transaction }: ReadContext,
  jobId: string,
  { cursor, limit }: { cursor?: string | undefined; limit: number },
): Promise<SetAside[]> {
  const after = readTimeCursor(cursor);
  return SetAside.findAll({
    where: {
      [Op.and]: [
        inForce(shop, jobId),
        ...(after ? [literal(`("SetAside"."set_aside_at", "SetAside"."id") < (:at, :id)`)] : []),
      ],
    },
    order: [
      ["setAsideAt", "desc"],
      ["id", "desc"],
    ],
    limit: limit + 1,
    replacements: { ...after },
    transaction,
  });
}

/** Everything that is set aside on a job, as a revision freezes it. */
export async function setAsidesToFreeze({ shop, transaction }: ReadContext, jobId: string): Promise<FrozenSetAside[]> {
  const rows = await SetAside.findAll({ where: inForce(shop, jobId), order: ["setAsideAt", "id"], transaction });
  return rows.map(({ finding, reason, setAsideBy, setAsideName, setAsideAt }) => ({
    finding,
    reason,
    by: setAsideBy,
    name: setAsideName,
    at: setAsideAt.toISOString(),
  }));
}

const inForce = (shop: ReadContext["shop"], jobId: string) => ({ shopId: shop?.id ?? "", jobId, takenBackAt: null });
