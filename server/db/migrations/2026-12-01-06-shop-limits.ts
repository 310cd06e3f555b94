import type { Migration } from "../migration.ts";

/** The limits of the dry fit that a shop set apart from the defaults; no row while it keeps to all of them. */
export const shopLimits: Migration = {
  name: "2026-12-01-06-shop-limits",
  up: (sql) =>
    sql(`
create table shop_limits (
  shop_id uuid primary key references shops (id),
  version integer not null check (version > 0),
  own jsonb not null check (jsonb_typeof(own) = 'object'),
  saved_by uuid not null references people (id),
  saved_at timestamptz not null
);
`),
  down: (sql) => sql("drop table shop_limits"),
};
