import type { Knex } from 'knex';

/** A query that every request asks: its text never changes, so that PostgreSQL plans it once a connection. */
export interface Prepared {
  name: string;
  /** With `$1`, `$2` … for its values. */
  text: string;
}

/** The part of a pg connection that is needed here. */
interface Connection {
  query: (query: Prepared & { values: readonly unknown[] }) => Promise<{ rows: unknown[] }>;
}

/** Asks it on a connection of the pool, without what building a query costs. Not for use within a transaction. */
export async function askPrepared<Row>(db: Knex, query: Prepared, values: readonly unknown[]): Promise<Row[]> {
  const connection = (await db.client.acquireConnection()) as Connection;
  try {
    const { rows } = await connection.query({ ...query, values });
    return rows as Row[];
  } finally {
    await db.client.releaseConnection(connection);
  }
}
