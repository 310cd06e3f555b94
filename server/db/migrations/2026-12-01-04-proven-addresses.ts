import type { Migration } from "../migration.ts";

/**
 * When the holder of a person's password showed that they read the person's address. Whoever opens a shop types an
 * address that nobody has checked, and must not become a client's contact of that address by it.
 * The index finds when a contact was last seen in a shop.
 */
export const provenAddresses: Migration = {
  name: "2026-12-01-04-proven-addresses",
  up: (sql) =>
    sql(`
alter table people add column address_proven_at timestamptz;
create index events_of_person on events (shop_id, person_id, at desc) where person_id is not null;
`),
  down: (sql) => sql("drop index events_of_person; alter table people drop column address_proven_at"),
};
