import type { Transaction } from "sequelize";
import { Job } from "../models/job.ts";
import type { OutgoingMail } from "../models/outgoing-mail.ts";
import { Revision } from "../models/revision.ts";
import { Shop } from "../models/shop.ts";
import { revisionColumns } from "./load-jobs.ts";

export type AboutRevision = { readonly revision: Revision; readonly job: Job; readonly shop: Shop };

/** The revision that a mail of a shop is about, with its job; null when the mail names none. */
export async function aboutRevision(
  { data, shopId }: Pick<OutgoingMail, "data" | "shopId">,
  transaction: Transaction,
): Promise<AboutRevision | null> {
  if (!shopId || !data.revisionId) return null;
  const revision = await Revision.findOne({
    where: { id: data.revisionId, shopId },
    attributes: revisionColumns,
    include: [{ model: Job, as: "job" }],
    transaction,
  });
  const shop = await Shop.findByPk(shopId, { transaction });
  return revision?.job && shop ? { revision, job: revision.job, shop } : null;
}
