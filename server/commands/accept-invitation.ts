import { hashPassword } from "../auth/passwords.ts";
import { newId } from "../db/new-id.ts";
import { AppError, invalid } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Invitation } from "../models/invitation.ts";
import { Membership } from "../models/membership.ts";
import { Person } from "../models/person.ts";
import { Shop } from "../models/shop.ts";
import { ownSession } from "../queries/live-sessions.ts";
import { findOrCreatePerson } from "./find-or-create-person.ts";
import { killLinks } from "./kill-links.ts";
import { logEvent } from "./log-event.ts";
import { spendLink } from "./spend-link.ts";

type Newcomer = { name?: string | undefined; password?: string | undefined };

/**
 * Joins the shop of an invitation. Someone with a password must be signed in by it as the invited address; anyone else
 * gives a name and a password. Whatever is refused leaves the link unspent, since all of it is one transaction.
 */
export async function acceptInvitation(
  context: Context,
  { token, ...newcomer }: { token: string } & Newcomer,
): Promise<{ shop: Shop; email: string }> {
  const { now, transaction } = context;
  const link = await spendLink(context, { token, purpose: "join shop" });
  const invitation = await Invitation.findOne({
    where: { id: link.invitationId ?? newId(), acceptedAt: null, revokedAt: null },
    lock: transaction.LOCK.UPDATE,
    transaction,
  });
  const shop = invitation && (await Shop.findByPk(invitation.shopId, { transaction }));
  if (!invitation || !shop) throw new AppError("link_expired");
  const person = await invitee(context, invitation.email, newcomer);
  await invitation.update({ acceptedAt: now }, { transaction });
  await killLinks(context, { invitationId: invitation.id });
  const place = { shopId: shop.id, personId: person.id };
  if ((await Membership.count({ where: { ...place, endedAt: null }, transaction })) === 0) {
    await Membership.create({ id: newId(), ...place, role: invitation.role, createdAt: now }, { transaction });
    const actor = { kind: "person", personId: person.id, name: person.name, sessionId: "" } as const;
    const data = { role: invitation.role };
    await logEvent({ actor, now, transaction }, { shopId: shop.id, kind: "member joined", data });
  }
  return { shop, email: person.email };
}

async function invitee(context: Context, email: string, { name, password }: Newcomer): Promise<Person> {
  const { now, transaction } = context;
  const known = await Person.findOne({ where: { email }, transaction });
  if (known?.passwordHash) {
    const own = await ownSession(context);
    // A session begun by a link shows the mail twice and the password never.
    if (own?.person.id !== known.id || own.session.began !== "password") {
      throw new AppError("not_signed_in", {
        detail: `Sign in as ${email} with the password, then open the link again.`,
      });
    }
    // They hold both the password and the mail.
    return known.update({ addressProvenAt: known.addressProvenAt ?? now }, { transaction });
  }
  if (!name || !password) {
    throw invalid([
      ...(name ? [] : [{ pointer: "/name", detail: "Write your name." }]),
      ...(password ? [] : [{ pointer: "/password", detail: "Choose a password." }]),
    ]);
  }
  const person = await findOrCreatePerson(context, { email, name });
  return person.update({ name, passwordHash: await hashPassword(password), addressProvenAt: now }, { transaction });
}
