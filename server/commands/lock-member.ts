import { notFound } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Membership } from "../models/membership.ts";
import { Person } from "../models/person.ts";
import { Shop } from "../models/shop.ts";
import { countOwners } from "../queries/count-owners.ts";

export type LockedMember = { readonly member: Membership; readonly person: Person; readonly owners: number };

/** Locks the shop, so that two owners can't remove each other at once, and reads one of its members after that. */
export async function lockMember(
  { transaction }: Context,
  { shopId, memberId }: { shopId: string; memberId: string },
): Promise<LockedMember> {
  await Shop.findByPk(shopId, { lock: transaction.LOCK.UPDATE, transaction });
  const member = await Membership.findOne({ where: { id: memberId, shopId, endedAt: null }, transaction });
  const person = member && (await Person.findByPk(member.personId, { transaction }));
  if (!member || !person) throw notFound("member");
  return { member, person, owners: await countOwners(shopId, transaction) };
}
