import type { Migration } from "../migration.ts";

/**
 * Photos of the wall that a sign is to hang on. What is taken off the job's list keeps its row and its file, since mockups, kept drafts
 * and issued revisions show it.
 */
export const wallPhotos: Migration = {
  name: "2026-12-01-12-wall-photos",
  up: (sql) =>
    sql(`
create table wall_photos (
  id uuid primary key,
  shop_id uuid not null,
  job_id uuid not null,
  file_id uuid not null,
  name text not null,
  width_px integer not null check (width_px between 1 and 4096),
  height_px integer not null check (height_px between 1 and 4096),
  added_by uuid not null references people (id),
  added_at timestamptz not null,
  removed_at timestamptz,
  unique (shop_id, id),
  foreign key (shop_id, job_id) references jobs (shop_id, id),
  foreign key (shop_id, file_id) references stored_files (shop_id, id)
);
create index wall_photos_of_job on wall_photos (shop_id, job_id, added_at, id) where removed_at is null;
`),
  down: (sql) => sql("drop table wall_photos"),
};
