import type { Migration } from "../migration.ts";

/**
 * What the mockup of a job begins with that was opened as another like an earlier one, and which job that was. Written
 * once; the first save of the mockup takes its place. Both jobs are of one shop.
 */
export const mockupStarts: Migration = {
  name: "2026-12-01-14-mockup-starts",
  up: (sql) =>
    sql(`
create table mockup_starts (
  job_id uuid primary key,
  shop_id uuid not null,
  like_job_id uuid not null,
  document text not null,
  made_by uuid not null references people (id),
  made_at timestamptz not null,
  foreign key (shop_id, job_id) references jobs (shop_id, id),
  foreign key (shop_id, like_job_id) references jobs (shop_id, id),
  check (job_id <> like_job_id)
);
`),
  down: (sql) => sql("drop table mockup_starts"),
};
