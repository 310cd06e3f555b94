import { newId } from "#server/db/new-id.ts";
import { Membership } from "#server/models/membership.ts";
import type { Person } from "#server/models/person.ts";
import type { Shop } from "#server/models/shop.ts";
import type { Role } from "#shared/contracts/account.ts";
import { buildPerson } from "./person.ts";
import { buildShop } from "./shop.ts";

export type Member = { membership: Membership; person: Person; shop: Shop; email: string };

/** A member of a shop; shop and person are made unless given. */
export async function buildMember({
  role = "owner",
  shop: givenShop,
  person: givenPerson,
}: {
  role?: Role;
  shop?: Shop;
  person?: Person;
} = {}): Promise<Member> {
  const shop = givenShop ?? (await buildShop());
  const person = givenPerson ?? (await buildPerson());
  const membership = await Membership.create({
    id: newId(),
    shopId: shop.id,
    personId: person.id,
    role,
    createdAt: new Date(),
  });
  return { membership, person, shop, email: person.email };
}
