import type { SignalKind } from "#shared/contracts/job-signals.ts";
import type { Context } from "../http/context.ts";
import type { Job } from "../models/job.ts";

/**
 * Tells all who look at a job that something of it changed, once the transaction is committed: what kind of thing and its id, never what
 * is in it. `shopOnly` is what its client must not hear of. The caller holds the job's row locked, which makes the numbers one row.
 */
export async function signalJob(
  { services, transaction, now }: Pick<Context, "services" | "transaction" | "now">,
  { id: jobId, shopId }: Pick<Job, "id" | "shopId">,
  { kind, id, shopOnly = false }: { kind: SignalKind; id: string; shopOnly?: boolean },
): Promise<void> {
  await services.sequelize.query(
    `with counted as (
       update jobs set last_signal = last_signal + 1,
         last_open_signal = last_open_signal + (case when $5::boolean then 0 else 1 end)
       where id = $1::uuid and shop_id = $2::uuid returning last_signal, last_open_signal)
     insert into job_signals (shop_id, job_id, number, open_number, kind, subject_id, at)
     select $2::uuid, $1::uuid, last_signal, case when $5::boolean then null else last_open_signal end, $3::text, $4::uuid, $6::timestamptz
     from counted`,
    { bind: [jobId, shopId, kind, id, shopOnly, now], transaction },
  );
}
