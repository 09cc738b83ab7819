import type { Migration } from '../migrate.ts';

/**
 * A calendar address belongs to one person in one household, and shows what that person may see. The
 * household-wide addresses of before end: what their readers may see is not known.
 */
export const migration: Migration = {
  name: '0003-calendar-tokens',
  async up({ sequelize, transaction }) {
    await sequelize.query(
      `
create table calendar_tokens (
  household_id uuid not null references households,
  user_id uuid not null references users,
  token_hash text not null unique,
  created_at timestamptz not null default now(),
  primary key (household_id, user_id)
);
alter table households drop column calendar_token_hash;
`,
      { transaction },
    );
  },
};
