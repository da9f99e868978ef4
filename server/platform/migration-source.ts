import { readdir } from 'node:fs/promises';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import type { Knex } from 'knex';

const folder = path.resolve(import.meta.dirname, '../../migrations');

/**
 * Loads migrations by this project's own import, so that they run under any loader; names leave out the ending,
 * so that the history is the same however the code is run.
 */
export const migrationSource: Knex.MigrationSource<string> = {
  async getMigrations() {
    const files = await readdir(folder);
    return files.filter((file) => file.endsWith('.ts')).sort();
  },
  getMigrationName: (file) => file.replace(/\.ts$/, ''),
  async getMigration(file) {
    const migration = (await import(/* @vite-ignore */ pathToFileURL(path.join(folder, file)).href)) as {
      up: Knex.Migration['up'];
    };
    return { up: migration.up, down: async () => undefined };
  },
};
