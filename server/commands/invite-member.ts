import type { Role } from "#shared/contracts/account.ts";
import { newId } from "../db/new-id.ts";
import { AppError, notFound } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Invitation } from "../models/invitation.ts";
import { Membership } from "../models/membership.ts";
import { Person } from "../models/person.ts";
import { Shop } from "../models/shop.ts";
import { refuseMoreMail } from "../queries/has-enough-mail.ts";
import { killLinks } from "./kill-links.ts";
import { logEvent } from "./log-event.ts";
import { queueMail } from "./queue-mail.ts";

/** Invites someone to the team. Inviting an address again ends its old link and mails a fresh one. */
export async function inviteMember(
  context: Context,
  { shopId, personId, email, role }: { shopId: string; personId: string; email: string; role: Role },
): Promise<Invitation> {
  const { now, transaction } = context;
  await Shop.findByPk(shopId, { lock: transaction.LOCK.UPDATE, transaction });
  const known = await Person.findOne({ where: { email }, transaction });
  const places = known ? { shopId, personId: known.id, endedAt: null } : null;
  if (places && (await Membership.count({ where: places, transaction })) > 0) {
    throw new AppError("already_exists", {
      detail: "This address is on the team already.",
      errors: [{ pointer: "/email", detail: "This address is on the team already." }],
    });
  }
  const open = await Invitation.findOne({ where: { shopId, email, acceptedAt: null, revokedAt: null }, transaction });
  const facts = { role, invitedBy: personId, createdAt: now };
  const invitation = open
    ? await open.update(facts, { transaction })
    : await Invitation.create({ id: newId(), shopId, email, ...facts }, { transaction });
  await killLinks(context, { invitationId: invitation.id });
  await refuseMoreMail(context, email, "invitation");
  await queueMail(context, { kind: "invitation", address: email, shopId, data: { invitationId: invitation.id } });
  await logEvent(context, { shopId, kind: "member invited", data: { email, role } });
  return invitation;
}

/** Takes an invitation back: its link stops working at once. */
export async function revokeInvitation(
  context: Context,
  { shopId, invitationId }: { shopId: string; invitationId: string },
): Promise<void> {
  const { now, transaction } = context;
  const invitation = await Invitation.findOne({
    where: { id: invitationId, shopId, acceptedAt: null, revokedAt: null },
    lock: transaction.LOCK.UPDATE,
    transaction,
  });
  if (!invitation) throw notFound("invitation");
  await invitation.update({ revokedAt: now }, { transaction });
  await killLinks(context, { invitationId });
  await logEvent(context, { shopId, kind: "invitation taken back", data: { email: invitation.email } });
}
