import { QueryTypes } from "sequelize";
import type { JobSignal } from "#shared/contracts/job-signals.ts";
import type { ReadContext } from "../http/context.ts";
import { isStaff } from "../policies/actor.ts";
import type { LoadedJob } from "./load-jobs.ts";

export type NumberedSignal = JobSignal & { readonly number: number };

/** As many as are read at once; who missed more reads on. */
export const mostSignals = 500;

/**
 * The signals of a job after a number, in order, that this actor may hear of. For a client they are those that clients may hear, by
 * their own numbers: what is the shop's alone leaves no gap.
 */
export async function signalsAfter(
  { services, actor, transaction }: Pick<ReadContext, "services" | "actor" | "transaction">,
  { job }: LoadedJob,
  after: number,
): Promise<NumberedSignal[]> {
  const number = numberColumn(actor);
  const rows = await services.sequelize.query<{ number: string; kind: JobSignal["kind"]; id: string }>(
    `select ${number} as number, kind, subject_id as id from job_signals
     where shop_id = $1::uuid and job_id = $2::uuid and ${number} > $3::bigint order by ${number} limit ${mostSignals}`,
    { bind: [job.shopId, job.id, after], type: QueryTypes.SELECT, ...(transaction ? { transaction } : {}) },
  );
  return rows.map((row) => ({ ...row, number: Number(row.number) }));
}

/** The number of the last signal that this actor could have heard; 0 before the first. */
export async function lastSignal(
  { services, actor, transaction }: Pick<ReadContext, "services" | "actor" | "transaction">,
  { job }: LoadedJob,
): Promise<number> {
  const column = isStaff(actor) ? "last_signal" : "last_open_signal";
  const [row] = await services.sequelize.query<{ last: string }>(
    `select ${column} as last from jobs where shop_id = $1::uuid and id = $2::uuid`,
    { bind: [job.shopId, job.id], type: QueryTypes.SELECT, ...(transaction ? { transaction } : {}) },
  );
  return Number(row?.last ?? 0);
}

const numberColumn = (actor: ReadContext["actor"]): "number" | "open_number" =>
  isStaff(actor) ? "number" : "open_number";
