import type { z } from "zod";
import type { inspectLink as contract } from "#shared/contracts/account.ts";
import { tokenHash } from "../auth/tokens.ts";
import type { ReadContext } from "../http/context.ts";
import { Invitation } from "../models/invitation.ts";
import { OneTimeLink } from "../models/one-time-link.ts";
import { Person } from "../models/person.ts";
import { Shop } from "../models/shop.ts";

type Answer = z.input<typeof contract.result>;

const unknown: Answer = {
  state: "unknown",
  purpose: null,
  shopName: null,
  addressHint: null,
  knownPerson: false,
  role: null,
  goTo: null,
};

/** What a link is for and whether it still holds. Reads only: looking never spends it. */
export async function inspectLink({ now, transaction }: ReadContext, token: string): Promise<Answer> {
  const link = await OneTimeLink.findOne({ where: { tokenHash: tokenHash(token) }, transaction });
  if (!link) return unknown;
  const shop = link.shopId ? await Shop.findByPk(link.shopId, { transaction }) : null;
  const invitation = link.invitationId ? await Invitation.findByPk(link.invitationId, { transaction }) : null;
  const invitee = invitation ? await Person.findOne({ where: { email: invitation.email }, transaction }) : null;
  return {
    state: stateOf(link, now),
    purpose: link.purpose,
    shopName: shop?.name ?? null,
    addressHint: addressHint(link.address),
    knownPerson: Boolean(invitee?.passwordHash),
    role: invitation?.role ?? null,
    goTo: link.goTo ?? null,
  };
}

function stateOf({ spentAt, killedAt, expiresAt }: OneTimeLink, now: Date): Answer["state"] {
  if (spentAt) return "spent";
  return killedAt || expiresAt <= now ? "expired" : "open";
}

/** Enough for the addressee to know it, too little for anyone else: c•••••@orrery.example. */
export function addressHint(address: string): string {
  const at = address.lastIndexOf("@");
  return `${address.slice(0, 1)}•••••${address.slice(at)}`;
}
