import type { Migration } from "../migration.ts";

/** How a shop cuts, where it differs from the defaults; no row while it keeps to all of them. */
export const shopSaws: Migration = {
  name: "2026-12-01-10-shop-saws",
  up: (sql) =>
    sql(`
create table shop_saws (
  shop_id uuid primary key references shops (id),
  version integer not null check (version > 0),
  own jsonb not null check (jsonb_typeof(own) = 'object'),
  saved_by uuid not null references people (id),
  saved_at timestamptz not null
);
`),
  down: (sql) => sql("drop table shop_saws"),
};
