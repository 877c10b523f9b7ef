import { readdir } from 'node:fs/promises';
import path from 'node:path';
import { pathToFileURL } from 'node:url';

import { type Sequelize } from 'sequelize';
import { SequelizeStorage, Umzug, type MigrationFn } from 'umzug';

import { database } from '@/lib/db/connection';

/** One schema step. MariaDB commits each statement that changes the schema by itself, so a migration holds exactly one and may be run again. */
export type Migration = MigrationFn<Sequelize>;

/** All migrations in order of their names, ready to be run forward (`up`) or back (`down`). */
export async function migrations(folder = path.resolve('migrations')): Promise<Umzug<Sequelize>> {
  const names = (await readdir(folder)).filter((name) => /^\d{4}-.*\.ts$/.test(name)).sort();
  const loaded = await Promise.all(
    names.map(async (name) => {
      const steps = (await import(pathToFileURL(path.join(folder, name)).href)) as { up: Migration; down: Migration };
      return { name: name.replace(/\.ts$/, ''), up: steps.up, down: steps.down };
    }),
  );
  return new Umzug({
    migrations: loaded,
    context: database(),
    storage: new SequelizeStorage({ sequelize: database(), tableName: 'migrations' }),
    logger: undefined,
  });
}
