import type { Migration } from "../migration.ts";

/** What a shop pays and asks, as shared/cost/price-book.ts has it; no row until it saved one. */
export const priceBooks: Migration = {
  name: "2026-12-01-09-price-books",
  up: (sql) =>
    sql(`
create table price_books (
  shop_id uuid primary key references shops (id),
  version integer not null check (version > 0),
  book jsonb not null check (jsonb_typeof(book) = 'object'),
  saved_by uuid not null references people (id),
  saved_at timestamptz not null
);
`),
  down: (sql) => sql("drop table price_books"),
};
