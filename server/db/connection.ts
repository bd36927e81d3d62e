import knex, { type Knex } from 'knex';
import { migrationSource } from './migration-source.ts';

/** Opens a pool on PostgreSQL; statements that wait longer than a request may are given up. */
export function openDatabase(url: string, pool = { min: 0, max: 10 }): Knex {
  return knex({
    client: 'pg',
    connection: { connectionString: url, application_name: 'steep-and-bind' },
    pool,
    acquireConnectionTimeout: 5000,
    migrations: { migrationSource, tableName: 'migrations' },
  });
}
