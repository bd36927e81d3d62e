import { runMigrations } from 'graphile-worker';
import { pino } from 'pino';
import { openDatabase } from '../db/connection.ts';
import { loadReferenceData } from '../../seeds/reference.ts';

/**
 * Brings the database to the present shape: tables, the queue's own tables, reference data. With `--demo` an empty
 * database is also given the demonstration's house.
 */
async function main(): Promise<void> {
  const url = process.env.DATABASE_URL;
  if (!url) throw new Error('DATABASE_URL says which database to bring up to date.');
  const db = openDatabase(url);
  try {
    await db.migrate.latest();
    await runMigrations({ connectionString: url });
    await loadReferenceData(db);
    if (process.argv.includes('--demo')) {
      const { seedDemo } = await import('../../seeds/demo.ts');
      await seedDemo(db, { dataDir: process.env.DATA_DIR ?? '.data', log: pino(pino.destination(2)) });
    }
  } finally {
    await db.destroy();
  }
}

main().catch((error: unknown) => {
  process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
  process.exit(1);
});
