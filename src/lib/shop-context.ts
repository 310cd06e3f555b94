import { createContext, useContext } from "react";
import type { Me, Role } from "#shared/contracts/account.ts";
import type { Shop } from "#shared/contracts/shop.ts";

export type Reader = {
  readonly shop: Shop;
  readonly person: NonNullable<Me["person"]>;
  /** A session begun by a mailed link acts for the client, whatever else the person is. */
  readonly side: "shop" | "client";
  readonly role: Role | null;
  /** The company that a contact belongs to. */
  readonly client: string | null;
};

export const ReaderContext = createContext<Reader | null>(null);

/** Who reads a page of a shop. Only below the shop's layout. */
export function useReader(): Reader {
  const reader = useContext(ReaderContext);
  if (reader === null) throw new Error("useReader is used outside a shop's page");
  return reader;
}

export const useShop = (): Shop => useReader().shop;

/** Which side the signed-in person is on in this shop, or null when on none. */
export function readerOf(me: Me, shop: Shop): Reader | null {
  if (me.person === null) return null;
  const member = me.session === "password" ? me.memberOf.find((place) => place.shop === shop.slug) : undefined;
  if (member) return { shop, person: me.person, side: "shop", role: member.role, client: null };
  const contact = me.contactOf.find((place) => place.shop === shop.slug);
  if (contact) return { shop, person: me.person, side: "client", role: null, client: contact.client };
  return null;
}
