import type { Migration } from "../migration.ts";

/** Shops, the people in them, their sessions and the links mailed to them. */
export const people: Migration = {
  name: "2026-12-01-01-people",
  up: (sql) =>
    sql(`
create table shops (
  id uuid primary key,
  slug text not null unique check (slug ~ '^[a-z0-9]([a-z0-9-]{0,58}[a-z0-9])?$'),
  name text not null check (length(name) between 1 and 120),
  unit text not null default 'mm' check (unit in ('mm', 'in')),
  job_prefix text not null check (job_prefix ~ '^[A-Z]{1,4}$'),
  next_job_number integer not null default 1 check (next_job_number > 0),
  paper text not null default 'A4' check (paper in ('A4', 'A3', 'Letter', 'Tabloid')),
  demo boolean not null default false,
  created_at timestamptz not null
);

create table people (
  id uuid primary key,
  email text not null unique check (email = lower(email)),
  name text not null,
  password_hash text,
  created_at timestamptz not null
);

create table memberships (
  id uuid primary key,
  shop_id uuid not null references shops (id),
  person_id uuid not null references people (id),
  role text not null check (role in ('owner', 'maker', 'rep')),
  created_at timestamptz not null,
  ended_at timestamptz,
  unique (shop_id, id)
);
create unique index memberships_one_each on memberships (shop_id, person_id) where ended_at is null;
create index memberships_of_person on memberships (person_id) where ended_at is null;
create index memberships_list on memberships (shop_id, created_at, id) where ended_at is null;

create table invitations (
  id uuid primary key,
  shop_id uuid not null references shops (id),
  email text not null check (email = lower(email)),
  role text not null check (role in ('owner', 'maker', 'rep')),
  invited_by uuid not null references people (id),
  created_at timestamptz not null,
  accepted_at timestamptz,
  revoked_at timestamptz,
  unique (shop_id, id)
);
create unique index invitations_one_open on invitations (shop_id, email) where accepted_at is null and revoked_at is null;
create index invitations_list on invitations (shop_id, created_at, id);

create table clients (
  id uuid primary key,
  shop_id uuid not null references shops (id),
  name text not null,
  remarks text not null default '',
  created_at timestamptz not null,
  unique (shop_id, id)
);
create index clients_list on clients (shop_id, lower(name), id);

create table contacts (
  id uuid primary key,
  shop_id uuid not null references shops (id),
  client_id uuid not null,
  person_id uuid not null references people (id),
  name text not null,
  created_at timestamptz not null,
  ended_at timestamptz,
  unique (shop_id, id),
  foreign key (shop_id, client_id) references clients (shop_id, id)
);
create unique index contacts_one_each on contacts (client_id, person_id) where ended_at is null;
create index contacts_of_person on contacts (person_id) where ended_at is null;
create index contacts_of_client on contacts (shop_id, client_id);

create table sessions (
  id uuid primary key,
  person_id uuid not null references people (id),
  began text not null check (began in ('password', 'link')),
  agent text not null default '',
  created_at timestamptz not null,
  last_seen_at timestamptz not null,
  expires_at timestamptz not null,
  ended_at timestamptz
);
create index sessions_of_person on sessions (person_id, created_at) where ended_at is null;

create table outgoing_mails (
  id uuid primary key,
  shop_id uuid references shops (id),
  job_id uuid,
  kind text not null,
  recipient_id uuid references people (id),
  address text not null,
  data jsonb not null default '{}',
  state text not null default 'queued' check (state in ('queued', 'sent', 'refused', 'dropped')),
  attempts integer not null default 0,
  last_error text,
  created_at timestamptz not null,
  sent_at timestamptz
);
create index outgoing_mails_of_job on outgoing_mails (shop_id, job_id, created_at);

create table one_time_links (
  id uuid primary key,
  token_hash text not null unique check (token_hash ~ '^[0-9a-f]{64}$'),
  purpose text not null check (purpose in ('sign in', 'join shop', 'new password')),
  mail_id uuid not null references outgoing_mails (id),
  address text not null,
  shop_id uuid references shops (id),
  person_id uuid references people (id),
  contact_id uuid,
  invitation_id uuid,
  go_to text,
  created_at timestamptz not null,
  expires_at timestamptz not null,
  spent_at timestamptz,
  killed_at timestamptz,
  foreign key (shop_id, contact_id) references contacts (shop_id, id),
  foreign key (shop_id, invitation_id) references invitations (shop_id, id),
  check ((purpose = 'join shop') = (invitation_id is not null)),
  check ((purpose = 'sign in') = (contact_id is not null)),
  check (go_to is null or go_to like '/%')
);
create index one_time_links_of_person on one_time_links (person_id) where spent_at is null and killed_at is null;
create index one_time_links_of_contact on one_time_links (contact_id) where spent_at is null and killed_at is null;
create index one_time_links_of_invitation on one_time_links (invitation_id) where spent_at is null and killed_at is null;
`),
  down: (sql) =>
    sql(
      "drop table one_time_links, outgoing_mails, sessions, contacts, clients, invitations, memberships, people, shops",
    ),
};
