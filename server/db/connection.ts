/** The connection to PostgreSQL; the only place that makes one. */
import { Sequelize } from 'sequelize';
import { initModels } from './models/index.ts';

export type Database = Sequelize;

/** Opens a pool and binds the models to it. Close it with `database.close()`. */
export function connectDatabase(databaseUrl: string, poolSize = 10): Database {
  const sequelize = new Sequelize(databaseUrl, {
    logging: false,
    pool: { max: poolSize, idle: 10_000 },
    define: { underscored: true, timestamps: false },
    // A connection that the server dropped must end in a failed query, not in a dead process.
    dialectOptions: { keepAlive: true },
  });
  initModels(sequelize);
  return sequelize;
}
