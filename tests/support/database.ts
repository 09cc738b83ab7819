import { inject } from 'vitest';

export interface TestDatabase {
  /** A connection URL for `createConnection` and the like. */
  url: string;
  /** Removes the database, ending connections that are still open. */
  drop: () => Promise<void>;
}

/** A migrated, empty database of the test's own. */
export function createTestDatabase(): Promise<TestDatabase> {
  return requestDatabase('template');
}

/** A database in which nothing has been made: for tests of the migrations themselves. */
export function createBareDatabase(): Promise<TestDatabase> {
  return requestDatabase('nothing');
}

async function requestDatabase(from: 'template' | 'nothing'): Promise<TestDatabase> {
  const broker = inject('clusterBrokerUrl');
  const response = await fetch(`${broker}/databases?from=${from}`, { method: 'POST' });
  if (!response.ok) throw new Error(`No test database: ${await response.text()}`);
  const { name, url } = (await response.json()) as { name: string; url: string };
  return {
    url,
    drop: async () => {
      await fetch(`${broker}/databases/${name}`, { method: 'DELETE' });
    },
  };
}
