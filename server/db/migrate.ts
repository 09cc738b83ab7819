/** Brings a database up to date. Migrations only go forward, each in one transaction. */
import { Sequelize, type Transaction } from 'sequelize';
import { SequelizeStorage, Umzug } from 'umzug';
import { migrations } from './migrations/index.ts';

export interface MigrationContext {
  sequelize: Sequelize;
  transaction: Transaction;
}

export interface Migration {
  name: string;
  up(context: MigrationContext): Promise<void>;
}

/** Names of migrations that a database has not seen; all of them when it is empty. */
export async function listPendingMigrations(sequelize: Sequelize): Promise<string[]> {
  const [[found]] = (await sequelize.query(`select to_regclass('migrations') as "table"`)) as [
    { table: string | null }[],
    unknown,
  ];
  const rows = found?.table ? (await sequelize.query('select name from migrations'))[0] : [];
  const applied = new Set((rows as { name: string }[]).map(({ name }) => name));
  return migrations.map(({ name }) => name).filter((name) => !applied.has(name));
}

/** One process migrates at a time; any number fixed for this application. */
const lockKey = 727_104;

/**
 * Applies all pending migrations and returns their names.
 * Safe to call from several processes at once: the others wait for the first.
 */
export async function migrate(databaseUrl: string): Promise<string[]> {
  const sequelize = new Sequelize(databaseUrl, { logging: false, pool: { max: 2 } });
  try {
    return await sequelize.transaction(async (lock) => {
      await sequelize.query('select pg_advisory_xact_lock($key)', {
        bind: { key: lockKey },
        transaction: lock,
      });
      const umzug = new Umzug({
        migrations: migrations.map((migration) => ({
          name: migration.name,
          up: () =>
            sequelize.transaction((transaction) => migration.up({ sequelize, transaction })),
        })),
        context: sequelize,
        storage: new SequelizeStorage({ sequelize, tableName: 'migrations' }),
        logger: undefined,
      });
      const applied = await umzug.up();
      return applied.map((m) => m.name);
    });
  } finally {
    await sequelize.close();
  }
}
