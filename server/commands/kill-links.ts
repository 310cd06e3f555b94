import type { Transaction, WhereOptions } from "sequelize";
import { OneTimeLink } from "../models/one-time-link.ts";

/** Makes open links useless at once. Their pages then say that they have run out. */
export async function killLinks(
  { now, transaction }: { now: Date; transaction: Transaction },
  which: Pick<OneTimeLink, "contactId"> | Pick<OneTimeLink, "invitationId"> | Pick<OneTimeLink, "personId" | "purpose">,
): Promise<void> {
  const where: WhereOptions<OneTimeLink> = { ...which, spentAt: null, killedAt: null };
  await OneTimeLink.update({ killedAt: now }, { where, transaction });
}
