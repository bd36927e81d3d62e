import type { Knex } from 'knex';
import { LARDER } from '../shared/larder/index.ts';

/** What every house starts with: the imprint's row and the larder. Entries that are there already stay as they are. */
export async function loadReferenceData(db: Knex): Promise<void> {
  await db('imprint')
    .insert({
      name: 'A new imprint',
      currency: 'GBP',
      zone: 'Europe/London',
      age_limit: 18,
      grace_days: 7,
      terms: '',
      privacy: '',
    })
    .onConflict('id')
    .ignore();
  await db('larder_items')
    .insert(LARDER.map((item) => ({ id: item.id, name: item.name, item: JSON.stringify(item) as never })))
    .onConflict('id')
    .ignore();
}
