import { literal, Op, type WhereOptions } from "sequelize";
import type { z } from "zod";
import type { listJobs as contract } from "#shared/contracts/jobs.ts";
import type { ReadContext } from "../http/context.ts";
import { Client } from "../models/client.ts";
import { Job } from "../models/job.ts";
import type { Actor } from "../policies/actor.ts";
import { readCursor } from "./page.ts";

type Query = z.output<typeof contract.query>;

/** The ordering of each list as SQL expressions; the job's id breaks ties. */
const orders = {
  due: {
    by: [
      `case "Job"."whose_move" when 'ours' then 0 when 'client' then 1 else 2 end`,
      `coalesce("Job"."due_on", '9999-12-31')`,
    ],
    down: false,
    place: (job: Job) => [
      job.whoseMove === "ours" ? 0 : job.whoseMove === "client" ? 1 : 2,
      job.dueOn ?? "9999-12-31",
      job.id,
    ],
  },
  number: { by: [`"Job"."number"`], down: true, place: (job: Job) => [job.number, job.id] },
  newest: { by: [`"Job"."created_at"`], down: true, place: (job: Job) => [job.createdAt.toISOString(), job.id] },
} as const;

/** Where a row stands in the list, for the cursor. */
export function placeInJobs(sort: Query["sort"], job: Job): (string | number)[] {
  return [...orders[sort].place(job)];
}

/** Up to `limit + 1` jobs of the shop that the actor may see. */
export async function listJobs({ shop, actor, transaction }: ReadContext, query: Query): Promise<Job[]> {
  const { by, down } = orders[query.sort];
  const keys = [...by, `"Job"."id"`];
  const after = readCursor(query.cursor, keys.length);
  const replacements: Record<string, string | number | null> = { q: `%${(query.q ?? "").replace(/[\\%_]/g, "\\$&")}%` };
  after?.forEach((value, index) => {
    replacements[`after${index}`] = value;
  });
  const conditions: WhereOptions[] = [visibleJobs(actor, shop?.id ?? "")];
  if (after)
    conditions.push(
      literal(`(${keys.join(", ")}) ${down ? "<" : ">"} (${after.map((_, index) => `:after${index}`).join(", ")})`),
    );
  if (query.whoseMove) conditions.push({ whoseMove: query.whoseMove });
  if (query.state) conditions.push({ state: query.state });
  if (query.clientId) conditions.push({ clientId: query.clientId });
  if (query.q?.trim()) {
    conditions.push(
      literal(
        `("Job"."number" ilike :q or "Job"."title" ilike :q or "client"."name" ilike :q or "Job"."brief"->>'words' ilike :q)`,
      ),
    );
  }
  return Job.findAll({
    where: { [Op.and]: conditions },
    include: [{ model: Client, as: "client", attributes: [], required: true }],
    order: keys.map((key): [ReturnType<typeof literal>, string] => [literal(key), down ? "desc" : "asc"]),
    limit: query.limit + 1,
    replacements,
    subQuery: false,
    transaction,
  });
}

/** How many jobs stand at each side, whatever else is filtered. */
export async function countMoves({
  shop,
  actor,
  transaction,
}: ReadContext): Promise<{ ours: number; client: number; nobody: number }> {
  const rows = await Job.count({ where: visibleJobs(actor, shop?.id ?? ""), group: ["whose_move"], transaction });
  const of = (move: string) => rows.find((row) => row.whose_move === move)?.count ?? 0;
  return { ours: of("ours"), client: of("client"), nobody: of("nobody") };
}

/** Staff see all of the shop; a contact the jobs of their own company of which something was issued. */
function visibleJobs(actor: Actor, shopId: string): WhereOptions {
  if (actor.kind !== "contact") return { shopId };
  const shown = literal(
    `exists (select 1 from revisions r where r.job_id = "Job"."id" and r.state in ('issued', 'approved', 'revision asked', 'superseded'))`,
  );
  return { [Op.and]: [{ shopId, clientId: actor.contacts.map(({ clientId }) => clientId) }, shown] };
}
