import type { Migration } from "../migration.ts";

/**
 * Mail that gathers what happened on a job: one that still gathers for each job and reader. Reminders: once each a revision and reader,
 * whatever the clock does. A mail sent again follows the one that was refused. What a shop needs after the yes, and the zone its day
 * begins in; how long an issued sign dries.
 */
export const gatheredMail: Migration = {
  name: "2026-12-01-17-gathered-mail",
  up: (sql) =>
    sql(`
alter table outgoing_mails
  add column due_at timestamptz,
  add column closed_at timestamptz,
  add column follows uuid unique references outgoing_mails (id);

update outgoing_mails set state = 'dropped', last_error = 'It stands on the sheet.'
  where state = 'queued' and kind in ('note added', 'note answered');

create unique index outgoing_mails_gathering
  on outgoing_mails (job_id, recipient_id, (coalesce(data->>'contactId', '')))
  where kind = 'notes gathered' and state = 'queued' and closed_at is null;
create unique index outgoing_mails_reminding
  on outgoing_mails ((data->>'revisionId'), kind, recipient_id)
  where kind in ('yes needed soon', 'yes was needed') and follows is null;

alter table shops
  add column time_zone text not null default 'UTC',
  add column build_days integer not null default 5 check (build_days between 0 and 60),
  add column freight_days integer not null default 2 check (freight_days between 0 and 60);
alter table revisions add column drying_hours integer not null default 0 check (drying_hours >= 0);
`),
  down: (sql) =>
    sql(`
alter table revisions drop column drying_hours;
alter table shops drop column time_zone, drop column build_days, drop column freight_days;
drop index outgoing_mails_gathering, outgoing_mails_reminding;
alter table outgoing_mails drop column due_at, drop column closed_at, drop column follows;
`),
};
