import { Op, type Transaction } from "sequelize";
import { AppError } from "../http/app-error.ts";
import { type MailKind, OutgoingMail } from "../models/outgoing-mail.ts";

/** What somebody asks for is needed a few times at most; what work causes may come thick on a busy day. */
const mailsAnHour: Readonly<Record<MailKind, number>> = {
  "sign in link": 5,
  invitation: 5,
  "new password": 5,
  "address changed": 5,
  "proof issued": 30,
  "note added": 30,
  "note answered": 30,
  "revision asked": 30,
  approved: 30,
};

/** Whether an address got as many mails of one kind within the hour as anybody may cause, however often they ask. */
export async function hasEnoughMail(
  { now, transaction }: { now: Date; transaction: Transaction },
  address: string,
  kind: MailKind,
): Promise<boolean> {
  const since = new Date(now.getTime() - 3_600_000);
  const sent = await OutgoingMail.count({ where: { address, kind, createdAt: { [Op.gt]: since } }, transaction });
  return sent >= mailsAnHour[kind];
}

/** The same for those who are told: throws too_many_requests. */
export async function refuseMoreMail(
  at: { now: Date; transaction: Transaction },
  address: string,
  kind: MailKind,
): Promise<void> {
  if (!(await hasEnoughMail(at, address, kind))) return;
  throw new AppError("too_many_requests", {
    detail: `${mailsAnHour[kind]} of these mails went to this address within the hour. Wait a little, and ask whether they arrived.`,
  });
}
