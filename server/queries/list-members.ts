import { literal, Op } from "sequelize";
import { type ReadContext, shopIdOf } from "../http/context.ts";
import { Membership } from "../models/membership.ts";
import { Person } from "../models/person.ts";
import { readTimeCursor } from "./page.ts";

/** Up to `limit + 1` members of the shop, the longest there first. */
export function listMembers(
  context: ReadContext,
  { cursor, limit }: { cursor?: string | undefined; limit: number },
): Promise<Membership[]> {
  const after = readTimeCursor(cursor);
  return Membership.findAll({
    where: {
      shopId: shopIdOf(context),
      endedAt: null,
      ...(after ? { [Op.and]: literal(`("Membership"."created_at", "Membership"."id") > (:at, :id)`) } : {}),
    },
    replacements: after ?? {},
    include: [{ model: Person, as: "person" }],
    order: ["createdAt", "id"],
    limit: limit + 1,
    transaction: context.transaction,
  });
}
