import type { Migration } from "../migration.ts";

/**
 * Findings of the dry fit that somebody set aside, each with the finding as it was and the hash of what it is bound to
 * (shared/dry-fit/set-aside.ts). A row is never changed but once: when it is taken back. The database knows the safety
 * rules too, so that only an owner's hand can have set their stops aside.
 */
export const setAsides: Migration = {
  name: "2026-12-01-05-set-asides",
  up: (sql) =>
    sql(`
create table set_asides (
  id uuid primary key,
  shop_id uuid not null,
  job_id uuid not null,
  rule integer not null check (rule > 0),
  severity text not null check (severity in ('stop', 'caution', 'remark')),
  binding_sha256 text not null check (binding_sha256 ~ '^[0-9a-f]{64}$'),
  finding jsonb not null,
  reason text not null check (length(reason) <= 500 and length(btrim(reason, E' \\t\\n')) >= 3),
  set_aside_by uuid not null references people (id),
  set_aside_name text not null,
  set_aside_role text not null check (set_aside_role in ('owner', 'maker')),
  set_aside_at timestamptz not null,
  taken_back_by uuid references people (id),
  taken_back_name text,
  taken_back_at timestamptz,
  unique (shop_id, id),
  foreign key (shop_id, job_id) references jobs (shop_id, id),
  check (set_aside_role = 'owner' or severity <> 'stop' or rule not in (10, 12, 36, 38)),
  check ((taken_back_by is null) = (taken_back_at is null) and (taken_back_name is null) = (taken_back_at is null))
);
create unique index set_asides_once on set_asides (job_id, binding_sha256) where taken_back_at is null;
create index set_asides_of_job on set_asides (shop_id, job_id, set_aside_at desc, id desc) where taken_back_at is null;

create function guard_set_aside() returns trigger language plpgsql as $$
begin
  if tg_op = 'INSERT' then
    if new.taken_back_at is not null then
      raise exception 'a set-aside begins in force' using errcode = 'restrict_violation';
    end if;
    return new;
  end if;
  if tg_op = 'DELETE' then
    raise exception 'set-asides are never deleted' using errcode = 'restrict_violation';
  end if;
  if old.taken_back_at is not null then
    raise exception 'what was taken back stays taken back' using errcode = 'restrict_violation';
  end if;
  if (old.id, old.shop_id, old.job_id, old.rule, old.severity, old.binding_sha256, old.finding, old.reason, old.set_aside_by,
      old.set_aside_name, old.set_aside_role, old.set_aside_at)
      is distinct from (new.id, new.shop_id, new.job_id, new.rule, new.severity, new.binding_sha256, new.finding, new.reason,
      new.set_aside_by, new.set_aside_name, new.set_aside_role, new.set_aside_at) then
    raise exception 'a set-aside keeps its finding and its reason' using errcode = 'restrict_violation';
  end if;
  return new;
end $$;
create trigger set_asides_guarded before insert or update or delete on set_asides for each row execute function guard_set_aside();
create trigger set_asides_not_emptied before truncate on set_asides for each statement execute function refuse_change();
`),
  down: (sql) => sql("drop table set_asides; drop function guard_set_aside()"),
};
