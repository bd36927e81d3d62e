import { resolve } from 'node:path';
import type { Knex } from 'knex';
import type { Logger } from 'pino';
import { openFileStore } from '../server/files/file-store.ts';
import { readContent } from './content/read-content.ts';
import { seedBook } from './demo/book.ts';
import { seedHouse, seedPeople } from './demo/house.ts';
import { prepareDemoPlates, seedPlates } from './demo/plates.ts';
import { seedQueries, seedRecipes } from './demo/recipes.ts';
import { seedShoots } from './demo/shoots.ts';

/**
 * Fills an empty database with the demonstration's house: all of it or nothing. A database that holds people already is
 * left as it is.
 */
export async function seedDemo(db: Knex, { dataDir, log }: { dataDir: string; log: Logger }): Promise<void> {
  if (await db('people').first('id')) return;
  process.stderr.write('Filling the empty house with the demonstration (once, about half a minute) …\n');
  const content = await readContent(resolve('content'));
  const files = openFileStore(dataDir);
  const prepared = await prepareDemoPlates(content.plates, files);

  await db.transaction(async (trx) => {
    const people = await seedPeople(trx);
    await seedHouse(trx, content);
    const shoots = await seedShoots(trx, content.shoots, people.creator);
    await seedPlates(trx, prepared, people.creator);
    await seedRecipes(trx, content.recipes, shoots, people.creator);
    await seedQueries(trx, content.recipes, people.editor);
    await seedBook({ db: trx, files, now: () => new Date(), log }, content, people);
  });
}
