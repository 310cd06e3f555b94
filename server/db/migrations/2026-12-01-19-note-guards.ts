import type { Migration } from "../migration.ts";

/**
 * What a note or a reply says stays as it was written, whoever asks, once the minutes are over in which its author may put it right
 * (shared/lifecycle/note-edits.ts: five; here ten, by the database's own clock, so that two clocks that differ a little refuse nobody).
 */
export const noteGuards: Migration = {
  name: "2026-12-01-19-note-guards",
  up: (sql) =>
    sql(`
create function keep_words() returns trigger language plpgsql as $$
begin
  if old.created_at < now() - interval '10 minutes' then
    raise exception 'what was written in % stays as it was', tg_table_name using errcode = 'restrict_violation';
  end if;
  return new;
end $$;
create trigger notes_words_kept before update on notes for each row
  when ((old.text, old.kind) is distinct from (new.text, new.kind)) execute function keep_words();
create trigger replies_words_kept before update on replies for each row
  when (old.text is distinct from new.text) execute function keep_words();
`),
  down: (sql) =>
    sql("drop trigger notes_words_kept on notes; drop trigger replies_words_kept on replies; drop function keep_words"),
};
