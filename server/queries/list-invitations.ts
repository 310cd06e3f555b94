import { literal, Op } from "sequelize";
import { type ReadContext, shopIdOf } from "../http/context.ts";
import { Invitation } from "../models/invitation.ts";
import { Person } from "../models/person.ts";
import { readTimeCursor } from "./page.ts";

/** Up to `limit + 1` invitations still open, the oldest first. */
export function listInvitations(
  context: ReadContext,
  { cursor, limit }: { cursor?: string | undefined; limit: number },
): Promise<Invitation[]> {
  const after = readTimeCursor(cursor);
  return Invitation.findAll({
    where: {
      shopId: shopIdOf(context),
      acceptedAt: null,
      revokedAt: null,
      ...(after ? { [Op.and]: literal(`("Invitation"."created_at", "Invitation"."id") > (:at, :id)`) } : {}),
    },
    replacements: after ?? {},
    include: [{ model: Person, as: "inviter" }],
    order: ["createdAt", "id"],
    limit: limit + 1,
    transaction: context.transaction,
  });
}
