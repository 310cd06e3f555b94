import type { Migration } from "../migration.ts";

/**
 * What was issued, decided or logged stays as it was, whoever asks: the database refuses on its own.
 * Revision states move only along the arrows of shared/lifecycle/revision-states.ts (a test compares the two).
 */
export const guards: Migration = {
  name: "2026-12-01-03-guards",
  up: (sql) =>
    sql(`
create function refuse_change() returns trigger language plpgsql as $$
begin
  raise exception '% rows are kept as they were written', tg_table_name using errcode = 'restrict_violation';
end $$;

create trigger events_kept before update or delete on events for each row execute function refuse_change();
create trigger events_not_emptied before truncate on events for each statement execute function refuse_change();
create trigger decisions_kept before update or delete on decisions for each row execute function refuse_change();
create trigger decisions_not_emptied before truncate on decisions for each statement execute function refuse_change();
create trigger certificates_kept before update or delete on certificates for each row execute function refuse_change();
create trigger certificates_not_emptied before truncate on certificates for each statement execute function refuse_change();
create trigger stored_files_kept before update on stored_files for each row execute function refuse_change();
create trigger stored_files_not_emptied before truncate on stored_files for each statement execute function refuse_change();
create trigger revisions_not_emptied before truncate on revisions for each statement execute function refuse_change();

create function guard_revision() returns trigger language plpgsql as $$
begin
  if tg_op = 'INSERT' then
    if new.state not in ('draft', 'preparing') then
      raise exception 'a revision begins as a draft' using errcode = 'restrict_violation';
    end if;
    return new;
  end if;
  if tg_op = 'DELETE' then
    raise exception 'revisions are never deleted' using errcode = 'restrict_violation';
  end if;
  if old.state <> new.state and (old.state, new.state) not in (
    ('draft', 'preparing'), ('preparing', 'issued'), ('preparing', 'draft'),
    ('issued', 'approved'), ('issued', 'revision asked'), ('issued', 'superseded'), ('issued', 'withdrawn'),
    ('revision asked', 'superseded'), ('approved', 'superseded')
  ) then
    raise exception 'a revision does not go from % to %', old.state, new.state using errcode = 'restrict_violation';
  end if;
  if (old.id, old.shop_id, old.job_id, old.letter, old.sequence) is distinct from (new.id, new.shop_id, new.job_id, new.letter, new.sequence) then
    raise exception 'a revision keeps its letter and its job' using errcode = 'restrict_violation';
  end if;
  if old.state <> 'draft' and (old.snapshot, old.snapshot_sha256, old.issued_by, old.message, old.requested_at)
      is distinct from (new.snapshot, new.snapshot_sha256, new.issued_by, new.message, new.requested_at) then
    raise exception 'what a revision froze stays as it was' using errcode = 'restrict_violation';
  end if;
  if old.state not in ('draft', 'preparing') and (old.pdf_file_id, old.issued_at) is distinct from (new.pdf_file_id, new.issued_at) then
    raise exception 'an issued revision keeps its PDF' using errcode = 'restrict_violation';
  end if;
  return new;
end $$;
create trigger revisions_guarded before insert or update or delete on revisions for each row execute function guard_revision();
`),
  down: (sql) =>
    sql(`
drop trigger revisions_guarded on revisions;
drop function guard_revision();
drop trigger revisions_not_emptied on revisions;
drop trigger stored_files_kept on stored_files;
drop trigger stored_files_not_emptied on stored_files;
drop trigger certificates_kept on certificates;
drop trigger certificates_not_emptied on certificates;
drop trigger decisions_kept on decisions;
drop trigger decisions_not_emptied on decisions;
drop trigger events_kept on events;
drop trigger events_not_emptied on events;
drop function refuse_change();
`),
};
