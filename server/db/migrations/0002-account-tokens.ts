import type { Migration } from '../migrate.ts';

/** Single-use links: password resets, changes of address, invitations. Only hashes of tokens are kept. */
export const migration: Migration = {
  name: '0002-account-tokens',
  async up({ sequelize, transaction }) {
    await sequelize.query(
      `
create table account_tokens (
  id uuid primary key default gen_random_uuid(),
  kind text not null check (kind in ('password-reset', 'email-change', 'invitation')),
  token_hash text not null unique,
  user_id uuid references users,
  household_id uuid references households,
  email text not null,
  payload jsonb not null default '{}',
  created_at timestamptz not null default now(),
  expires_at timestamptz not null,
  used_at timestamptz
);
create index account_tokens_user on account_tokens (user_id, kind);
create index account_tokens_household on account_tokens (household_id, kind);
`,
      { transaction },
    );
  },
};
