import { type Brief, emptyBrief } from "#shared/contracts/jobs.ts";
import { newId } from "../db/new-id.ts";
import { notFound } from "../http/app-error.ts";
import type { Context } from "../http/context.ts";
import { Client } from "../models/client.ts";
import { Job } from "../models/job.ts";
import { Shop } from "../models/shop.ts";
import type { LoadedJob } from "../queries/load-jobs.ts";
import { logEvent } from "./log-event.ts";
import { refreshJob } from "./refresh-job.ts";

/** Opens a job with the shop's next number and an empty brief, unless one is given. */
export async function openJob(
  context: Context,
  {
    clientId,
    title,
    dueOn,
    personId,
    brief = emptyBrief,
  }: { clientId: string; title: string; dueOn: string | null; personId: string; brief?: Brief },
): Promise<LoadedJob> {
  const { transaction, now } = context;
  const shop = await Shop.findByPk(context.shop?.id ?? "", { transaction, lock: true, rejectOnEmpty: true });
  const client = await Client.findOne({ where: { id: clientId, shopId: shop.id }, transaction });
  if (!client) throw notFound("client");
  const job = await Job.create(
    {
      id: newId(),
      shopId: shop.id,
      clientId: client.id,
      number: `${shop.jobPrefix}-${String(shop.nextJobNumber).padStart(4, "0")}`,
      title,
      dueOn,
      brief,
      state: "brief",
      whoseMove: "ours",
      createdBy: personId,
      createdAt: now,
    },
    { transaction },
  );
  await shop.update({ nextJobNumber: shop.nextJobNumber + 1 }, { transaction });
  await logEvent(context, { shopId: shop.id, jobId: job.id, kind: "job opened", data: { title } });
  return refreshJob(context, job);
}
