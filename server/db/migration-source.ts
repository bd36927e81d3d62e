import { readdir } from 'node:fs/promises';
import { fileURLToPath, pathToFileURL } from 'node:url';
import { extname, join } from 'node:path';
import type { Knex } from 'knex';

const folder = fileURLToPath(new URL('../../migrations', import.meta.url));

interface MigrationFile {
  name: string;
  path: string;
}

/** Migrations by name without extension, so that `.ts` in development and `.js` in production are the same one. */
export const migrationSource: Knex.MigrationSource<MigrationFile> = {
  async getMigrations() {
    const names = await readdir(folder);
    return names
      .filter((name) => /^\d{14}_[a-z_]+\.(ts|js)$/.test(name))
      .sort()
      .map((name) => ({ name: name.slice(0, -extname(name).length), path: join(folder, name) }));
  },
  getMigrationName: (migration) => migration.name,
  getMigration: (migration) => import(pathToFileURL(migration.path).href) as Promise<Knex.Migration>,
};
