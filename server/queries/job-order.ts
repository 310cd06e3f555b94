import { z } from "zod";
import type { listJobs } from "#shared/contracts/jobs.ts";
import type { Job } from "../models/job.ts";
import type { Actor } from "../policies/actor.ts";
import { places } from "./page.ts";

export type JobSort = z.output<typeof listJobs.query>["sort"];
export type Move = Job["whoseMove"];
type Place = (string | number)[];
type Order = {
  /** SQL expressions; the job's id breaks ties. */
  readonly by: readonly string[];
  readonly down: boolean;
  readonly placeOf: (job: Job, move: Move) => Place;
  readonly place: z.ZodType<Place>;
};
/** Its own moves first for whoever reads. */
const rankOf: Readonly<Record<Actor["kind"], readonly Move[]>> = {
  staff: ["ours", "client", "nobody"],
  contact: ["client", "ours", "nobody"],
  person: [],
  nobody: [],
};

/** How each list of jobs is ordered for a reader. */
export function orderOf(sort: JobSort, actor: Actor): Order {
  switch (sort) {
    case "due": {
      const rank = rankOf[actor.kind];
      return {
        by: [
          `case ${moveFor(actor)} ${rank.map((move, index) => `when '${move}' then ${index}`).join(" ")} end`,
          `coalesce("Job"."due_on", '9999-12-31')`,
        ],
        down: false,
        placeOf: (job, move) => [rank.indexOf(move), job.dueOn ?? "9999-12-31", job.id],
        place: z.tuple([places.count, places.day, places.id]),
      };
    }
    case "number":
      return {
        by: [`"Job"."number"`],
        down: true,
        placeOf: (job) => [job.number, job.id],
        place: z.tuple([places.text, places.id]),
      };
    case "newest":
      return {
        by: [`"Job"."created_at"`],
        down: true,
        placeOf: (job) => [job.createdAt.toISOString(), job.id],
        place: z.tuple([places.instant, places.id]),
      };
  }
}

/**
 * Whose move it is as the reader is told, in SQL. A revision that is still on the shop's table makes the move ours, but
 * its client, who is not told of it, can still decide on the one that is out.
 */
export function moveFor(actor: Actor): string {
  if (actor.kind !== "contact") return `"Job"."whose_move"`;
  return `(case when "Job"."state" in ('out for proof', 'in build')
      and exists (select 1 from revisions r where r.job_id = "Job"."id" and r.state = 'issued')
      and not exists (select 1 from notes n where n.job_id = "Job"."id" and n.state = 'open' and n.side = 'client' and n.kind <> 'fine as is')
    then 'client' else "Job"."whose_move" end)`;
}

/** Where a row stands in the list, for the cursor. `move` is whose move its reader was told. */
export function placeInJobs(sort: JobSort, { actor, job, move }: { actor: Actor; job: Job; move: Move }): Place {
  return orderOf(sort, actor).placeOf(job, move);
}
