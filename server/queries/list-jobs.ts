import { col, fn, literal, Op, type WhereOptions } from "sequelize";
import { z } from "zod";
import type { listJobs as contract } from "#shared/contracts/jobs.ts";
import type { ReadContext } from "../http/context.ts";
import { Client } from "../models/client.ts";
import { Job } from "../models/job.ts";
import type { Actor } from "../policies/actor.ts";
import { type Move, moveFor, orderOf } from "./job-order.ts";
import { readCursor } from "./page.ts";

type Query = z.output<typeof contract.query>;

/** Up to `limit + 1` jobs of the shop that the actor may see. */
export async function listJobs({ shop, actor, transaction }: ReadContext, query: Query): Promise<Job[]> {
  const { by, down, place } = orderOf(query.sort, actor);
  const keys = [...by, `"Job"."id"`];
  const after = readCursor(query.cursor, place);
  const wanted = query.q?.trim() ?? "";
  const replacements: Record<string, string | number> = { q: `%${wanted.replace(/[\\%_]/g, "\\$&")}%` };
  after?.forEach((value, index) => {
    replacements[`after${index}`] = value;
  });
  const conditions: WhereOptions[] = [visibleJobs(actor, shop?.id ?? "")];
  if (after)
    conditions.push(
      literal(`(${keys.join(", ")}) ${down ? "<" : ">"} (${after.map((_, index) => `:after${index}`).join(", ")})`),
    );
  if (query.whoseMove) conditions.push(literal(`${moveFor(actor)} = '${query.whoseMove}'`));
  if (query.state) conditions.push({ state: query.state });
  if (query.clientId) conditions.push({ clientId: query.clientId });
  if (wanted) {
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
  const rows = await Job.findAll({
    where: visibleJobs(actor, shop?.id ?? ""),
    attributes: [
      [literal(moveFor(actor)), "move"],
      [fn("count", col("id")), "count"],
    ],
    group: ["move"],
    raw: true,
    transaction,
  });
  const counted = z.array(z.object({ move: z.string(), count: z.coerce.number() })).parse(rows);
  const of = (move: Move) => counted.find((row) => row.move === move)?.count ?? 0;
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
