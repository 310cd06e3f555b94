import type { Migration } from "../migration.ts";

/**
 * What whoever looks at a job is told while it changes: numbered without gaps in the order of the changes, which the lock on the job's
 * row makes one. What clients may hear is counted apart, so that they can't tell how much there is that they may not.
 * The database itself tells every process of a new row, and of every change of what a person may do.
 */
export const jobSignals: Migration = {
  name: "2026-12-01-15-job-signals",
  up: (sql) =>
    sql(`
alter table jobs add column last_signal bigint not null default 0, add column last_open_signal bigint not null default 0;

create table job_signals (
  shop_id uuid not null,
  job_id uuid not null,
  number bigint not null check (number > 0),
  open_number bigint check (open_number > 0),
  kind text not null check (kind in ('note', 'revision', 'mockup', 'job')),
  subject_id uuid not null,
  at timestamptz not null,
  primary key (job_id, number),
  unique (job_id, open_number),
  foreign key (shop_id, job_id) references jobs (shop_id, id)
);

create function tell_signal() returns trigger language plpgsql as $$
begin
  perform pg_notify('job_signals', new.job_id::text);
  return null;
end $$;
create trigger job_signals_told after insert on job_signals for each row execute function tell_signal();

create function tell_standing() returns trigger language plpgsql as $$
begin
  perform pg_notify('standings', old.person_id::text);
  return null;
end $$;
create trigger sessions_told after update on sessions for each row
  when (old.ended_at is distinct from new.ended_at) execute function tell_standing();
create trigger memberships_told after update on memberships for each row
  when ((old.ended_at, old.role) is distinct from (new.ended_at, new.role)) execute function tell_standing();
create trigger contacts_told after update on contacts for each row
  when ((old.ended_at, old.person_id) is distinct from (new.ended_at, new.person_id)) execute function tell_standing();
`),
  down: (sql) =>
    sql(`
drop trigger sessions_told on sessions;
drop trigger memberships_told on memberships;
drop trigger contacts_told on contacts;
drop table job_signals;
drop function tell_signal;
drop function tell_standing;
alter table jobs drop column last_signal, drop column last_open_signal;
`),
};
