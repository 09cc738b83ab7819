/** `npm run migrate`: brings the database's structure up to date. */
import { loadDatabaseUrlOrExit } from '../config.ts';
import { migrate } from '../db/migrate.ts';

const databaseUrl = loadDatabaseUrlOrExit();
try {
  const done = await migrate(databaseUrl);
  console.log(
    done.length === 0
      ? 'The database is up to date.'
      : `Applied ${done.length} migration(s): ${done.join(', ')}`,
  );
} catch (error) {
  console.error(`The database could not be migrated: ${describeFailure(error)}`);
  process.exit(1);
}
process.exit(0);

function describeFailure(error: unknown): string {
  const reason = error instanceof Error ? error.message : String(error);
  return /ECONNREFUSED/.test(reason)
    ? 'it does not answer. Start Slackwater with "npm start" first, or set DATABASE_URL.'
    : reason;
}
