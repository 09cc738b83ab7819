/**
 * `npm run migrate`: brings the database's structure up to date. With `--check-settings` all
 * settings are checked first, as the server would.
 */
import { Client } from 'pg';
import { loadConfigOrExit, loadDatabaseUrlOrExit } from '../config.ts';
import { describeDatabaseFailure } from '../db/describe-failure.ts';
import { migrate } from '../db/migrate.ts';

const oldestVersion = 15;

const databaseUrl = process.argv.includes('--check-settings')
  ? loadConfigOrExit().databaseUrl
  : loadDatabaseUrlOrExit();

try {
  await requireVersion(databaseUrl);
  const done = await migrate(databaseUrl);
  if (done.length > 0) console.log(`The database was brought up to date: ${done.join(', ')}.`);
} catch (error) {
  console.error(describeFailure(error));
  process.exit(1);
}
process.exit(0);

async function requireVersion(url: string): Promise<void> {
  const client = new Client({ connectionString: url, connectionTimeoutMillis: 10_000 });
  // A connection that breaks ends in the query's failure, not in a trace.
  client.on('error', () => undefined);
  await client.connect();
  try {
    const { rows } = await client.query<{ server_version_num: string }>('show server_version_num');
    const major = Math.floor(Number(rows[0]?.server_version_num ?? 0) / 10_000);
    if (major < oldestVersion) {
      throw new Error(
        `PostgreSQL ${major} is too old. Set DATABASE_URL to one of version ${oldestVersion} or newer.`,
      );
    }
  } finally {
    await client.end();
  }
}

function describeFailure(error: unknown): string {
  const { message } = error as { message?: string };
  return (
    describeDatabaseFailure(error) ??
    `The database could not be migrated: ${message ?? String(error)}`
  );
}
