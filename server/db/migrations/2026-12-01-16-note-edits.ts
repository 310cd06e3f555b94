import type { Migration } from "../migration.ts";

/** A note or a reply can be put right by its author for a few minutes, and says so. */
export const noteEdits: Migration = {
  name: "2026-12-01-16-note-edits",
  up: (sql) =>
    sql("alter table notes add column edited_at timestamptz; alter table replies add column edited_at timestamptz"),
  down: (sql) => sql("alter table notes drop column edited_at; alter table replies drop column edited_at"),
};
