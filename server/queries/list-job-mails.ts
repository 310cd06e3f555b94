import { literal, Op } from "sequelize";
import type { ReadContext } from "../http/context.ts";
import { OutgoingMail } from "../models/outgoing-mail.ts";
import { readTimeCursor } from "./page.ts";

/** A refused mail in whose place another went out needs nobody's hand any more. */
const notFollowed = literal(`not exists (select from outgoing_mails later where later.follows = "OutgoingMail".id)`);

/** Up to `limit + 1` mails about a job of this shop, newest first, each with whether another followed it. */
export async function listJobMails(
  { shop, transaction }: ReadContext,
  jobId: string,
  { cursor, limit, only }: { cursor?: string | undefined; limit: number; only?: "refused" | undefined },
): Promise<{ readonly mail: OutgoingMail; readonly followed: boolean }[]> {
  const after = readTimeCursor(cursor);
  const mails = await OutgoingMail.findAll({
    where: {
      shopId: shop?.id ?? "",
      jobId,
      ...(only ? { state: only, [Op.and]: [notFollowed] } : {}),
      ...(after
        ? { [Op.or]: [{ createdAt: { [Op.lt]: after.at } }, { createdAt: after.at, id: { [Op.lt]: after.id } }] }
        : {}),
    },
    order: [
      ["createdAt", "DESC"],
      ["id", "DESC"],
    ],
    limit: limit + 1,
    transaction,
  });
  const later = await OutgoingMail.findAll({
    where: { follows: mails.map(({ id }) => id) },
    attributes: ["follows"],
    transaction,
  });
  return mails.map((mail) => ({ mail, followed: later.some(({ follows }) => follows === mail.id) }));
}
