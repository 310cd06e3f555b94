import type { Migration } from "../migration.ts";

/** Jobs with their artwork, mockups, revisions, notes, decisions, portfolio links, stock and log. */
export const work: Migration = {
  name: "2026-12-01-02-work",
  up: (sql) =>
    sql(`
create table jobs (
  id uuid primary key,
  shop_id uuid not null references shops (id),
  client_id uuid not null,
  number text not null,
  title text not null,
  due_on date,
  brief jsonb not null,
  state text not null check (state in ('brief', 'mockup', 'out for proof', 'revision asked', 'approved', 'in build', 'handed over', 'closed', 'on hold', 'cancelled')),
  held_from text check (held_from in ('brief', 'mockup', 'out for proof', 'revision asked', 'approved', 'in build', 'handed over')),
  whose_move text not null check (whose_move in ('ours', 'client', 'nobody')),
  next_note_number integer not null default 1,
  consent_at timestamptz,
  consent_by uuid,
  created_by uuid not null references people (id),
  created_at timestamptz not null,
  unique (shop_id, id),
  unique (shop_id, number),
  foreign key (shop_id, client_id) references clients (shop_id, id),
  foreign key (shop_id, consent_by) references contacts (shop_id, id),
  check ((state = 'on hold') = (held_from is not null)),
  check ((consent_at is null) = (consent_by is null))
);
-- As queries/job-order.ts sorts them for staff.
create index jobs_by_due on jobs (shop_id, (case whose_move when 'ours' then 0 when 'client' then 1 when 'nobody' then 2 end), coalesce(due_on, '9999-12-31'), id);
create index jobs_by_newest on jobs (shop_id, created_at, id);
create index jobs_of_client on jobs (shop_id, client_id, created_at, id);

alter table outgoing_mails add foreign key (shop_id, job_id) references jobs (shop_id, id);

create table job_approvers (
  shop_id uuid not null,
  job_id uuid not null,
  contact_id uuid not null,
  primary key (job_id, contact_id),
  foreign key (shop_id, job_id) references jobs (shop_id, id),
  foreign key (shop_id, contact_id) references contacts (shop_id, id)
);

create table stored_files (
  id uuid primary key,
  shop_id uuid not null references shops (id),
  sha256 text not null check (sha256 ~ '^[0-9a-f]{64}$'),
  byte_size integer not null check (byte_size > 0),
  media_type text not null,
  storage_key text not null unique,
  created_at timestamptz not null,
  unique (shop_id, id),
  unique (shop_id, sha256)
);

create table artworks (
  id uuid primary key,
  shop_id uuid not null,
  job_id uuid not null,
  file_id uuid not null,
  name text not null,
  state text not null check (state in ('importing', 'ready', 'refused')),
  scale double precision not null default 1 check (scale > 0),
  summary jsonb,
  pieces text,
  refusal jsonb,
  added_by uuid not null references people (id),
  added_at timestamptz not null,
  removed_at timestamptz,
  unique (shop_id, id),
  foreign key (shop_id, job_id) references jobs (shop_id, id),
  foreign key (shop_id, file_id) references stored_files (shop_id, id),
  check ((state = 'ready') = (pieces is not null)),
  check ((state = 'refused') = (refusal is not null))
);
create index artworks_of_job on artworks (shop_id, job_id, added_at, id) where removed_at is null;

create table mockups (
  id uuid primary key,
  shop_id uuid not null,
  job_id uuid not null unique,
  version integer not null check (version > 0),
  document text not null,
  saved_by uuid not null references people (id),
  saved_at timestamptz not null,
  unique (shop_id, id),
  foreign key (shop_id, job_id) references jobs (shop_id, id)
);

create table revisions (
  id uuid primary key,
  shop_id uuid not null,
  job_id uuid not null,
  letter text not null check (letter ~ '^[A-HJ-NPR-WY]{1,2}$'),
  sequence integer not null check (sequence > 0),
  state text not null check (state in ('draft', 'preparing', 'issued', 'approved', 'revision asked', 'superseded', 'withdrawn')),
  message text not null default '',
  snapshot text,
  snapshot_sha256 text check (snapshot_sha256 ~ '^[0-9a-f]{64}$'),
  pdf_file_id uuid,
  issued_by uuid not null references people (id),
  requested_at timestamptz not null,
  issued_at timestamptz,
  failure text,
  withdrawn_reason text,
  unique (shop_id, id),
  unique (job_id, letter),
  unique (job_id, sequence),
  foreign key (shop_id, job_id) references jobs (shop_id, id),
  foreign key (shop_id, pdf_file_id) references stored_files (shop_id, id),
  check ((snapshot is null) = (snapshot_sha256 is null)),
  check (state = 'draft' or snapshot is not null),
  check ((state in ('draft', 'preparing')) = (pdf_file_id is null)),
  check ((state in ('draft', 'preparing')) = (issued_at is null)),
  check ((state = 'withdrawn') = (withdrawn_reason is not null))
);
create unique index revisions_one_open on revisions (job_id) where state in ('draft', 'preparing');
create unique index revisions_one_out on revisions (job_id) where state in ('issued', 'revision asked');
create unique index revisions_one_approved on revisions (job_id) where state = 'approved';
create index revisions_of_job on revisions (shop_id, job_id, sequence desc);

create table notes (
  id uuid primary key,
  shop_id uuid not null,
  job_id uuid not null,
  revision_id uuid not null,
  number integer not null check (number > 0),
  kind text not null check (kind in ('must change', 'question', 'fine as is')),
  state text not null default 'open' check (state in ('open', 'answered', 'settled')),
  text text not null check (length(text) between 1 and 4000),
  anchor jsonb not null,
  zone text,
  side text not null check (side in ('shop', 'client')),
  shop_only boolean not null default false,
  author_id uuid not null references people (id),
  author_name text not null,
  created_at timestamptz not null,
  unique (shop_id, id),
  unique (job_id, number),
  foreign key (shop_id, job_id) references jobs (shop_id, id),
  foreign key (shop_id, revision_id) references revisions (shop_id, id),
  check (not shop_only or side = 'shop')
);
create index notes_of_job on notes (shop_id, job_id, number);

create table replies (
  id uuid primary key,
  shop_id uuid not null,
  note_id uuid not null,
  text text not null check (length(text) between 1 and 4000),
  side text not null check (side in ('shop', 'client')),
  author_id uuid not null references people (id),
  author_name text not null,
  created_at timestamptz not null,
  foreign key (shop_id, note_id) references notes (shop_id, id)
);
create index replies_of_note on replies (note_id, created_at, id);

create table decisions (
  id uuid primary key,
  shop_id uuid not null,
  job_id uuid not null,
  revision_id uuid not null unique,
  kind text not null check (kind in ('approved', 'revision asked')),
  contact_id uuid not null,
  person_id uuid not null references people (id),
  by_name text not null,
  typed_name text,
  acknowledgements text,
  summary text not null default '',
  pdf_sha256 text not null check (pdf_sha256 ~ '^[0-9a-f]{64}$'),
  snapshot_sha256 text not null check (snapshot_sha256 ~ '^[0-9a-f]{64}$'),
  address text not null,
  agent text not null,
  decided_at timestamptz not null,
  unique (shop_id, id),
  foreign key (shop_id, job_id) references jobs (shop_id, id),
  foreign key (shop_id, revision_id) references revisions (shop_id, id),
  foreign key (shop_id, contact_id) references contacts (shop_id, id),
  check ((kind = 'approved') = (typed_name is not null)),
  check ((kind = 'approved') = (acknowledgements is not null))
);

create table certificates (
  id uuid primary key,
  shop_id uuid not null,
  decision_id uuid not null unique,
  file_id uuid not null,
  created_at timestamptz not null,
  foreign key (shop_id, decision_id) references decisions (shop_id, id),
  foreign key (shop_id, file_id) references stored_files (shop_id, id)
);

create table share_links (
  id uuid primary key,
  shop_id uuid not null references shops (id),
  token_hash text not null unique check (token_hash ~ '^[0-9a-f]{64}$'),
  label text not null,
  created_by uuid not null references people (id),
  created_at timestamptz not null,
  expires_at timestamptz not null,
  revoked_at timestamptz,
  openings integer not null default 0,
  last_opened_at timestamptz,
  unique (shop_id, id)
);
create index share_links_list on share_links (shop_id, created_at, id);

create table share_link_pieces (
  shop_id uuid not null,
  share_link_id uuid not null,
  job_id uuid not null,
  revision_id uuid not null,
  primary key (share_link_id, job_id),
  foreign key (shop_id, share_link_id) references share_links (shop_id, id),
  foreign key (shop_id, job_id) references jobs (shop_id, id),
  foreign key (shop_id, revision_id) references revisions (shop_id, id)
);

create table stock_items (
  id uuid primary key,
  shop_id uuid not null references shops (id),
  kind text not null check (kind in ('acrylic', 'wood', 'hardware', 'adhesive')),
  name text not null,
  properties jsonb not null,
  quantity integer check (quantity >= 0),
  created_at timestamptz not null,
  retired_at timestamptz,
  unique (shop_id, id)
);
create index stock_items_list on stock_items (shop_id, kind, lower(name), id) where retired_at is null;

create table events (
  id bigint generated always as identity primary key,
  shop_id uuid not null references shops (id),
  job_id uuid,
  at timestamptz not null,
  kind text not null,
  side text not null check (side in ('shop', 'client', 'guest', 'system')),
  person_id uuid references people (id),
  who text not null,
  data jsonb not null default '{}',
  foreign key (shop_id, job_id) references jobs (shop_id, id)
);
create index events_of_job on events (shop_id, job_id, id desc);
`),
  down: (sql) =>
    sql(
      "alter table outgoing_mails drop constraint outgoing_mails_shop_id_job_id_fkey; drop table events, stock_items, share_link_pieces, share_links, certificates, decisions, replies, notes, revisions, mockups, artworks, stored_files, job_approvers, jobs",
    ),
};
