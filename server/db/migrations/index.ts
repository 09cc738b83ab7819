/** All migrations in order. A new one is added at the end; one that was released is never changed. */
import type { Migration } from '../migrate.ts';
import { migration as firstTables } from './0001-first-tables.ts';
import { migration as accountTokens } from './0002-account-tokens.ts';
import { migration as calendarTokens } from './0003-calendar-tokens.ts';

export const migrations: Migration[] = [firstTables, accountTokens, calendarTokens];
