import { Op, type Transaction } from "sequelize";
import { Contact } from "../models/contact.ts";
import { Membership } from "../models/membership.ts";
import { Session } from "../models/session.ts";

type At = { readonly now: Date; readonly transaction: Transaction };

/** Ends a person's sessions at once: all of them, all but one, or those that began in one way. */
export async function endSessionsOf(
  { now, transaction }: At,
  { personId, except, began }: { personId: string; except?: string; began?: Session["began"] },
): Promise<void> {
  const which = { ...(except ? { id: { [Op.ne]: except } } : {}), ...(began ? { began } : {}) };
  await Session.update({ endedAt: now }, { where: { personId, endedAt: null, ...which }, transaction });
}

/**
 * After a place was taken from a person: ends their sessions when no place is left, and those begun by a mailed link
 * when they are nobody's contact any more. Sessions that still open another place go on, without this one.
 */
export async function endSessionsWithoutPlace({ now, transaction }: At, personId: string): Promise<void> {
  const where = { personId, endedAt: null };
  const contacts = await Contact.count({ where, transaction });
  const memberships = await Membership.count({ where, transaction });
  if (contacts > 0) return;
  await Session.update(
    { endedAt: now },
    { where: { ...where, ...(memberships > 0 ? { began: "link" } : {}) }, transaction },
  );
}
