import { QueryTypes } from "sequelize";
import type { ReadContext } from "../http/context.ts";
import { Event } from "../models/event.ts";

/** The newest event of each job, by job id. */
export async function lastEvents(
  { services, transaction }: ReadContext,
  jobIds: readonly string[],
): Promise<Map<string, Event>> {
  if (jobIds.length === 0) return new Map();
  const rows = await services.sequelize.query<Event>(
    `select distinct on (job_id) * from events where job_id in (:jobIds) and kind not in ('mail sent', 'mail dropped') order by job_id, id desc`,
    {
      replacements: { jobIds: [...jobIds] },
      type: QueryTypes.SELECT,
      model: Event,
      mapToModel: true,
      ...(transaction ? { transaction } : {}),
    },
  );
  return new Map(rows.flatMap((event) => (event.jobId ? [[event.jobId, event]] : [])));
}
