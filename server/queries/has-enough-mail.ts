import { Op, type Transaction } from "sequelize";
import { AppError } from "../http/app-error.ts";
import { OutgoingMail } from "../models/outgoing-mail.ts";

/** What somebody asks for is needed a few times at most. What work causes is gathered, or needed and never held back. */
const mailsAnHour = { "sign in link": 5, invitation: 5, "new password": 5, "address changed": 5 } as const;
type AskedMail = keyof typeof mailsAnHour;

/** Whether an address got as many mails of one kind within the hour as anybody may cause, however often they ask. */
export async function hasEnoughMail(
  { now, transaction }: { now: Date; transaction: Transaction },
  address: string,
  kind: AskedMail,
): Promise<boolean> {
  const since = new Date(now.getTime() - 3_600_000);
  const sent = await OutgoingMail.count({ where: { address, kind, createdAt: { [Op.gt]: since } }, transaction });
  return sent >= mailsAnHour[kind];
}

/** The same for those who are told: throws too_many_requests. */
export async function refuseMoreMail(
  at: { now: Date; transaction: Transaction },
  address: string,
  kind: AskedMail,
): Promise<void> {
  if (!(await hasEnoughMail(at, address, kind))) return;
  throw new AppError("too_many_requests", {
    detail: `${mailsAnHour[kind]} of these mails went to this address within the hour. Wait a little, and ask whether they arrived.`,
  });
}
