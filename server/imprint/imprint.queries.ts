import type { Knex } from 'knex';
import type { Currency } from '../../shared/contracts/imprint.ts';

export interface ImprintRow {
  id: true;
  name: string;
  currency: Currency;
  zone: string;
  age_limit: number;
  grace_days: number;
  terms: string;
  privacy: string;
  version: number;
}

declare module 'knex/types/tables.js' {
  interface Tables {
    imprint: ImprintRow;
  }
}

/** The one imprint of this installation; it is there from the first migration run on. */
export async function readImprint(db: Knex): Promise<ImprintRow> {
  const row = await db('imprint').first();
  if (!row) throw new Error('The imprint is missing: run the migrations.');
  return row;
}

export async function updateImprint(
  db: Knex,
  values: Partial<ImprintRow>,
  expected: number,
): Promise<ImprintRow | undefined> {
  const [row] = await db('imprint')
    .where({ version: expected })
    .update({ ...values, version: expected + 1 })
    .returning('*');
  return row;
}
