import { tokenHash } from "../auth/tokens.ts";
import { notFound } from "../http/app-error.ts";
import type { ReadContext } from "../http/context.ts";
import { Person } from "../models/person.ts";
import { Shop } from "../models/shop.ts";
import { UnsubscribeToken } from "../models/unsubscribe-token.ts";

/** Whose mails of which shop a token stops, else "not found". */
export async function findSubscriber(
  { transaction }: Pick<ReadContext, "transaction">,
  token: string,
): Promise<{ readonly person: Person; readonly shop: Shop }> {
  const known = await UnsubscribeToken.findOne({ where: { tokenHash: tokenHash(token) }, transaction });
  const person = known && (await Person.findByPk(known.personId, { transaction }));
  const shop = known && (await Shop.findByPk(known.shopId, { transaction }));
  if (!person || !shop) throw notFound("link");
  return { person, shop };
}
