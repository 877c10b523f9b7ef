import { Sequelize, Transaction } from 'sequelize';
import mariadb from 'mariadb';

import { environment } from '@/lib/environment';

/**
 * One connection pool per process. Kept on globalThis because the development server loads modules anew on each change
 * and would otherwise leave a pool behind each time.
 */
const holder = globalThis as unknown as { heddleSequelize?: Sequelize };

export function database(): Sequelize {
  holder.heddleSequelize ??= new Sequelize(environment().DATABASE_URL.replace(/^mysql:/, 'mariadb:'), {
    dialect: 'mariadb',
    dialectModule: mariadb,
    logging: false,
    timezone: '+00:00',
    pool: { max: environment().DATABASE_POOL, min: 0, idle: 10_000, acquire: 60_000 },
    isolationLevel: Transaction.ISOLATION_LEVELS.READ_COMMITTED,
    dialectOptions: {
      // Counters and ids fit a double's 53 bits here; sums come back as numbers instead of strings.
      bigIntAsNumber: true,
      decimalAsNumber: true,
      insertIdAsNumber: true,
      connectTimeout: 10_000,
    },
    define: { underscored: false, freezeTableName: true, charset: 'utf8mb4', collate: 'utf8mb4_unicode_520_ci' },
  });
  return holder.heddleSequelize;
}

/** Closes the pool; for scripts and tests, which would not end otherwise. */
export async function closeDatabase(): Promise<void> {
  const open = holder.heddleSequelize;
  holder.heddleSequelize = undefined;
  await open?.close();
}
