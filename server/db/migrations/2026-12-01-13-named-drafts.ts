import type { Migration } from "../migration.ts";

/**
 * States of a mockup that were kept under a name. The row of a removed one stays, as the log names it, without its
 * document.
 */
export const namedDrafts: Migration = {
  name: "2026-12-01-13-named-drafts",
  up: (sql) =>
    sql(`
create table named_drafts (
  id uuid primary key,
  shop_id uuid not null,
  job_id uuid not null,
  name text not null check (length(btrim(name, E' \\t\\n')) > 0 and length(name) <= 80),
  document text,
  kept_by uuid not null references people (id),
  kept_at timestamptz not null,
  removed_at timestamptz,
  unique (shop_id, id),
  foreign key (shop_id, job_id) references jobs (shop_id, id),
  check ((removed_at is null) = (document is not null))
);
create unique index named_drafts_once on named_drafts (job_id, lower(name)) where removed_at is null;
create index named_drafts_of_job on named_drafts (shop_id, job_id, kept_at desc, id desc) where removed_at is null;
`),
  down: (sql) => sql("drop table named_drafts"),
};
