import type { Transaction } from "sequelize";
import { type MailChoice, MailChoices } from "../models/mail-choices.ts";

export const wantsAll: Readonly<Record<MailChoice, boolean>> = { notes: true, reminders: true };

/** What a person wants of a shop's mails; all of them until they say otherwise. */
export async function findMailChoices(
  where: { personId: string; shopId: string },
  transaction: Transaction | undefined,
): Promise<Readonly<Record<MailChoice, boolean>>> {
  const row = await MailChoices.findOne({ where, transaction });
  return row ? { notes: row.notes, reminders: row.reminders } : wantsAll;
}
