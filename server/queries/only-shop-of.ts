import type { Transaction } from "sequelize";
import { Contact } from "../models/contact.ts";
import { Membership } from "../models/membership.ts";

/** The one shop that a person has a place in; null when there are several or none. */
export async function onlyShopOf(personId: string, transaction: Transaction): Promise<string | null> {
  const where = { personId, endedAt: null };
  const memberships = await Membership.findAll({ where, attributes: ["shopId"], transaction });
  const contacts = await Contact.findAll({ where, attributes: ["shopId"], transaction });
  const [shopId, ...others] = new Set([...memberships, ...contacts].map((place) => place.shopId));
  return shopId !== undefined && others.length === 0 ? shopId : null;
}
