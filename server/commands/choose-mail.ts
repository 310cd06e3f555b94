import type { Context } from "../http/context.ts";
import { type MailChoice, MailChoices } from "../models/mail-choices.ts";
import { findMailChoices } from "../queries/find-mail-choices.ts";

/** Keeps which mails a person wants of a shop; what is not said stays as it was. */
export async function chooseMail(
  { now, transaction }: Pick<Context, "now" | "transaction">,
  whom: { personId: string; shopId: string },
  changes: Partial<Record<MailChoice, boolean | undefined>>,
): Promise<Readonly<Record<MailChoice, boolean>>> {
  const before = await findMailChoices(whom, transaction);
  const choices = { notes: changes.notes ?? before.notes, reminders: changes.reminders ?? before.reminders };
  await MailChoices.upsert({ ...whom, ...choices, changedAt: now }, { transaction });
  return choices;
}
