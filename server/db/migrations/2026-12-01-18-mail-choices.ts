import type { Migration } from "../migration.ts";

/** Which mails a person wants of a shop, and the tokens by which they stop them without signing in (of these the hash only). */
export const mailChoices: Migration = {
  name: "2026-12-01-18-mail-choices",
  up: (sql) =>
    sql(`
create table mail_choices (
  person_id uuid not null references people (id),
  shop_id uuid not null references shops (id),
  notes boolean not null,
  reminders boolean not null,
  changed_at timestamptz not null,
  primary key (person_id, shop_id)
);

create table unsubscribe_tokens (
  token_hash text primary key check (token_hash ~ '^[0-9a-f]{64}$'),
  person_id uuid not null references people (id),
  shop_id uuid not null references shops (id),
  created_at timestamptz not null
);
`),
  down: (sql) => sql("drop table unsubscribe_tokens, mail_choices"),
};
