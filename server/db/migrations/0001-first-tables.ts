import type { Migration } from '../migrate.ts';

/**
 * The first tables. Rows of households carry `household_id`, so that every query can be confined to one.
 * `events` only ever grows: a trigger refuses changes, also from a database console.
 */
export const migration: Migration = {
  name: '0001-first-tables',
  async up({ sequelize, transaction }) {
    await sequelize.query(
      `
create extension if not exists pgcrypto;

create table practices (
  id uuid primary key default gen_random_uuid(),
  name text not null,
  country text not null,
  created_at timestamptz not null default now()
);

create table users (
  id uuid primary key default gen_random_uuid(),
  email text not null,
  name text not null,
  password_hash text,
  created_at timestamptz not null default now()
);
create unique index users_email on users (lower(email));

create table households (
  id uuid primary key default gen_random_uuid(),
  practice_id uuid not null references practices,
  name text not null,
  country text not null,
  region text,
  time_zone text not null,
  circumstances jsonb not null default '{}',
  people jsonb not null default '[]',
  business_names jsonb not null default '[]',
  hopes text not null default '',
  lead_days jsonb not null default '{}',
  calendar_token_hash text,
  next_box_number int not null default 1,
  next_paper_number int not null default 1,
  next_list_number int not null default 1,
  version int not null default 1,
  created_at timestamptz not null default now()
);
create index households_practice on households (practice_id);

create table memberships (
  id uuid primary key default gen_random_uuid(),
  user_id uuid not null references users,
  practice_id uuid not null references practices,
  household_id uuid references households,
  role text not null check (role in ('owner', 'assistant', 'client', 'adviser')),
  standing text,
  rights jsonb,
  shared_groups jsonb,
  evidence jsonb,
  starts_on date not null,
  ends_on date,
  created_at timestamptz not null default now(),
  check ((role = 'owner') = (household_id is null))
);
create index memberships_user on memberships (user_id);
create index memberships_household on memberships (household_id);

create table areas (
  id uuid primary key default gen_random_uuid(),
  household_id uuid not null references households,
  name text not null,
  created_at timestamptz not null default now()
);
create unique index areas_name on areas (household_id, lower(name));

create table boxes (
  id uuid primary key default gen_random_uuid(),
  household_id uuid not null references households,
  area_id uuid references areas,
  code text not null,
  label text not null default '',
  version int not null default 1,
  created_at timestamptz not null default now(),
  unique (household_id, code)
);

create table scans (
  id uuid primary key default gen_random_uuid(),
  household_id uuid not null references households,
  box_id uuid not null references boxes,
  name text not null,
  media_type text not null,
  bytes bigint not null,
  sha256 text not null,
  status text not null default 'waiting' check (status in ('waiting', 'reading', 'read', 'failed')),
  reason text,
  page_count int,
  attempts int not null default 0,
  created_by uuid references users,
  created_at timestamptz not null default now(),
  read_at timestamptz,
  unique (household_id, sha256)
);
create index scans_box on scans (box_id);

create table subjects (
  id uuid primary key default gen_random_uuid(),
  household_id uuid not null references households,
  kind text not null,
  name text not null,
  reference text,
  started_on date,
  ended_on date,
  end_known boolean not null default false,
  version int not null default 1,
  created_at timestamptz not null default now()
);
create index subjects_household on subjects (household_id);

create table filings (
  id uuid primary key default gen_random_uuid(),
  household_id uuid not null references households,
  person text,
  country text not null,
  tax_year text not null,
  answer text not null check (answer in ('on-time', 'on-day', 'never', 'unknown')),
  filed_on date,
  answered_by uuid references users,
  answered_at timestamptz not null default now()
);
create unique index filings_one on filings (household_id, country, tax_year, coalesce(person, ''));

create table papers (
  id uuid primary key default gen_random_uuid(),
  household_id uuid not null references households,
  box_id uuid references boxes,
  scan_id uuid references scans,
  subject_id uuid references subjects,
  number int not null,
  status text not null default 'to-review' check (status in ('to-review', 'undecided', 'kept', 'leaving', 'left')),
  class text not null,
  class_group text not null,
  confidence real,
  country text not null,
  title text,
  facts jsonb not null,
  read jsonb,
  candidates jsonb not null default '[]',
  answers jsonb not null default '{}',
  text text not null default '',
  pile text,
  kept_because text,
  place text,
  note text,
  practice_note text,
  sheets int not null default 1,
  bundle boolean not null default false,
  bundle_from date,
  bundle_to date,
  issuer text,
  addressee text,
  reference text,
  paper_on date,
  key_date date,
  expires_on date,
  tax_year text,
  assessment jsonb not null,
  keep_until date,
  shred_from date,
  advised_until date,
  permanent boolean not null default false,
  open boolean not null default true,
  held boolean not null default false,
  rule text,
  security_level text,
  rule_set_version text not null,
  assessed_on date not null,
  stepped_down jsonb,
  likely_copy_of uuid references papers,
  eyes_only_user_id uuid references users,
  reviewed_at timestamptz,
  reviewed_by uuid references users,
  left_on date,
  version int not null default 1,
  created_at timestamptz not null default now(),
  search tsvector generated always as (
    setweight(to_tsvector('simple', coalesce(title, '') || ' ' || coalesce(issuer, '') || ' ' || coalesce(reference, '') || ' ' || coalesce(addressee, '')), 'A') ||
    setweight(to_tsvector('simple', coalesce(note, '') || ' ' || coalesce(place, '')), 'B') ||
    setweight(to_tsvector('simple', text), 'C')
  ) stored,
  unique (household_id, number)
);
create index papers_status on papers (household_id, status, number);
create index papers_scan on papers (scan_id);
create index papers_shred_from on papers (household_id, shred_from);
create index papers_search on papers using gin (search);

create table pages (
  id uuid primary key default gen_random_uuid(),
  household_id uuid not null references households,
  scan_id uuid not null references scans,
  paper_id uuid references papers,
  number int not null,
  position int,
  blank boolean not null default false,
  code text,
  turned int not null default 0,
  width int not null,
  height int not null,
  source text not null,
  confidence real not null default 0,
  lines jsonb not null default '[]',
  text text not null default '',
  read_at timestamptz not null default now(),
  unique (scan_id, number)
);
create index pages_paper on pages (paper_id, position);

create table paper_changes (
  id bigint generated always as identity primary key,
  household_id uuid not null references households,
  paper_id uuid not null references papers,
  version int not null,
  before jsonb not null,
  sentence text not null,
  user_id uuid references users,
  at timestamptz not null default now(),
  undone boolean not null default false
);
create index paper_changes_paper on paper_changes (paper_id, id);

create table holds (
  id uuid primary key default gen_random_uuid(),
  household_id uuid not null references households,
  paper_id uuid references papers,
  kind text not null,
  reason text not null,
  placed_on date not null,
  placed_by uuid not null references users,
  placed_by_role text not null,
  review_on date,
  lifted_on date,
  lifted_by uuid references users,
  lift_reason text,
  created_at timestamptz not null default now()
);
create index holds_household on holds (household_id);
create index holds_paper on holds (paper_id);

create table shred_lists (
  id uuid primary key default gen_random_uuid(),
  household_id uuid not null references households,
  number int not null,
  status text not null default 'draft' check (status in ('draft', 'sent', 'approved', 'done', 'void')),
  "on" date not null,
  left_out jsonb not null default '[]',
  version int not null default 1,
  created_by uuid references users,
  created_at timestamptz not null default now(),
  sent_at timestamptz,
  approval jsonb,
  approved_by uuid references users,
  approved_at timestamptz,
  destruction jsonb,
  done_at timestamptz,
  void_reason text,
  unique (household_id, number)
);

create table shred_rows (
  shred_list_id uuid not null references shred_lists,
  paper_id uuid not null references papers,
  household_id uuid not null references households,
  position int not null,
  kept_back boolean not null default false,
  kept_back_reason text,
  outcome text check (outcome in ('destroyed', 'kept-back', 'not-found')),
  -- What the row said when it was decided; the record stays as it was printed.
  snapshot jsonb,
  primary key (shred_list_id, paper_id)
);

create table departures (
  id uuid primary key default gen_random_uuid(),
  household_id uuid not null references households,
  paper_id uuid not null references papers unique,
  how text not null check (how in ('shred', 'recycle', 'give-back', 'pass-on')),
  "on" date not null,
  recipient text,
  shred_list_id uuid references shred_lists,
  recorded_by uuid not null references users,
  recorded_at timestamptz not null default now(),
  assessment jsonb not null
);

-- One row for each reminder and person: the unique key makes a second run of the daily job harmless.
create table reminders (
  id uuid primary key default gen_random_uuid(),
  household_id uuid not null references households,
  user_id uuid not null references users,
  paper_id uuid references papers,
  key text not null,
  kind text not null,
  "on" date not null,
  about date not null,
  mail_id uuid,
  created_at timestamptz not null default now(),
  unique (user_id, key)
);

create table mails (
  id uuid primary key default gen_random_uuid(),
  practice_id uuid not null references practices,
  user_id uuid references users,
  address text not null,
  subject text not null,
  text text not null,
  html text not null,
  state text not null default 'queued' check (state in ('queued', 'sent', 'failing')),
  attempts int not null default 0,
  created_at timestamptz not null default now(),
  sent_at timestamptz,
  next_attempt_at timestamptz,
  last_error text
);
alter table reminders add foreign key (mail_id) references mails;

create table events (
  id bigint generated always as identity primary key,
  practice_id uuid references practices,
  household_id uuid references households,
  user_id uuid references users,
  at timestamptz not null default now(),
  action text not null,
  sentence text not null,
  paper_id uuid,
  shred_list_id uuid,
  detail jsonb not null default '{}'
);
create index events_household on events (household_id, id desc);

create function refuse_event_change() returns trigger language plpgsql as $$
begin
  raise exception 'The activity record is append-only.';
end $$;
create trigger events_append_only before update or delete or truncate on events
  for each statement execute function refuse_event_change();

-- The table that connect-pg-simple expects.
create table sessions (
  sid varchar primary key,
  sess json not null,
  expire timestamp(6) not null
);
create index sessions_expire on sessions (expire);
`,
      { transaction },
    );
  },
};
