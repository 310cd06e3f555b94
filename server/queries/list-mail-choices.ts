import type { LiveSession } from "../http/session.ts";
import { placesOf } from "../http/session.ts";
import { type MailChoice, MailChoices } from "../models/mail-choices.ts";
import { Shop } from "../models/shop.ts";
import { wantsAll } from "./find-mail-choices.ts";

export type ChoicesAt = { readonly shop: string; readonly shopName: string } & Readonly<Record<MailChoice, boolean>>;

/** What the person of a session wants of each shop that it opens, by the shop's name. */
export async function listMailChoices(live: LiveSession): Promise<ChoicesAt[]> {
  const { memberOf, contactOf } = await placesOf(live);
  const slug = [...new Set([...memberOf, ...contactOf].map(({ shop }) => shop))];
  const shops = await Shop.findAll({ where: { slug }, order: ["name", "id"] });
  const rows = await MailChoices.findAll({ where: { personId: live.person.id, shopId: shops.map(({ id }) => id) } });
  return shops.map(({ id, slug: shop, name: shopName }) => {
    const { notes, reminders } = rows.find(({ shopId }) => shopId === id) ?? wantsAll;
    return { shop, shopName, notes, reminders };
  });
}
