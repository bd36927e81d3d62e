import { randomBytes } from 'node:crypto';
import type { Knex } from 'knex';
import pg from 'pg';
import { afterAll, beforeAll, inject } from 'vitest';
import { openDatabase } from '../../server/db/connection.ts';
import { TEMPLATE } from './global-setup.ts';

export interface TestDatabase {
  db: Knex;
  url: string;
}

/** A database of this test file's own, copied from the template and dropped afterwards; filled in before the first test. */
export function useDatabase(): TestDatabase {
  const database = {} as TestDatabase;
  let drop = async (): Promise<void> => undefined;
  beforeAll(async () => {
    const made = await makeDatabase();
    Object.assign(database, made);
    drop = made.drop;
  });
  afterAll(() => drop());
  return database;
}

/** Makes a database from the template; `drop` closes its pool and takes it away. */
export async function makeDatabase(): Promise<TestDatabase & { drop: () => Promise<void> }> {
  const maintenanceUrl = inject('maintenanceUrl');
  const name = `test_${randomBytes(6).toString('hex')}`;
  await maintain(maintenanceUrl, `create database ${name} template ${TEMPLATE}`);
  const url = Object.assign(new URL(maintenanceUrl), { pathname: `/${name}` }).href;
  const db = openDatabase(url);
  return {
    db,
    url,
    drop: async () => {
      await db.destroy();
      await maintain(maintenanceUrl, `drop database ${name} with (force)`);
    },
  };
}

/** Copies of one template are made one after the other: PostgreSQL refuses a template somebody is connected to. */
async function maintain(url: string, statement: string): Promise<void> {
  const client = new pg.Client({ connectionString: url });
  await client.connect();
  try {
    await client.query('select pg_advisory_lock(4711)');
    await client.query(statement);
  } finally {
    await client.end();
  }
}
