import { Op, type Transaction } from "sequelize";
import { tokenHash } from "../auth/tokens.ts";
import { AppError } from "../http/app-error.ts";
import { OneTimeLink } from "../models/one-time-link.ts";

/**
 * Spends a link: of any number of tries at once exactly one gets it, since the one statement both asks and marks.
 * Throws link_spent, link_expired, or not_found for a token we never made.
 */
export async function spendLink(
  { now, transaction }: { now: Date; transaction: Transaction },
  { token, purpose }: { token: string; purpose: OneTimeLink["purpose"] },
): Promise<OneTimeLink> {
  const hash = tokenHash(token);
  const [, [link]] = await OneTimeLink.update(
    { spentAt: now },
    {
      where: { tokenHash: hash, purpose, spentAt: null, killedAt: null, expiresAt: { [Op.gt]: now } },
      returning: true,
      transaction,
    },
  );
  if (link) return link;
  const known = await OneTimeLink.findOne({ where: { tokenHash: hash, purpose }, transaction });
  throw new AppError(!known ? "not_found" : known.spentAt ? "link_spent" : "link_expired");
}
