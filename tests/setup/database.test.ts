import { Client } from 'pg';
import { afterEach, describe, expect, test } from 'vitest';
import { createBareDatabase, createTestDatabase } from '../support/database.ts';
import type { TestDatabase } from '../support/database.ts';

let databases: TestDatabase[] = [];

afterEach(async () => {
  await Promise.all(databases.map((database) => database.drop()));
  databases = [];
});

async function ask(url: string, sql: string): Promise<Record<string, unknown>[]> {
  const client = new Client({ connectionString: url });
  await client.connect();
  try {
    return (await client.query<Record<string, unknown>>(sql)).rows;
  } finally {
    await client.end();
  }
}

describe('a test database', () => {
  test('is each test’s own: what one writes the other does not see', async () => {
    databases = await Promise.all([createTestDatabase(), createTestDatabase()]);
    const [first, second] = databases;
    await ask(first!.url, 'create table mark (id int)');
    const rows = await ask(second!.url, "select to_regclass('mark') as found");
    expect(rows).toEqual([{ found: null }]);
  });

  test('keeps letters of every alphabet and sorts in a UTF-8 locale', async () => {
    const database = await createBareDatabase();
    databases = [database];
    const rows = await ask(database.url, "select upper('ł é ü') as loud, version() as version");
    expect(rows[0]?.loud).toBe('Ł É Ü');
    expect(Number(/PostgreSQL (\d+)/.exec(String(rows[0]?.version))?.[1])).toBeGreaterThanOrEqual(
      15,
    );
  });

  test('is gone after drop, with connections still open', async () => {
    const database = await createBareDatabase();
    const client = new Client({ connectionString: database.url });
    client.on('error', () => undefined);
    await client.connect();
    await database.drop();
    await expect(ask(database.url, 'select 1')).rejects.toThrow(/does not exist/);
  });
});
