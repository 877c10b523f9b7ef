import { QueryTypes, type Transaction } from 'sequelize';
import { type Connection } from 'mariadb';

import { database } from '@/lib/db/connection';

/** A value that a column takes. */
export type Cell = string | number | boolean | Buffer | Date | null;

/** The driver's own connection behind a transaction. Sequelize does not type it, and offers no bulk protocol of its own. */
function driverConnection(transaction: Transaction): Connection {
  return (transaction as unknown as { connection: Connection }).connection;
}

/**
 * Writes many rows with MariaDB's bulk protocol (one prepared statement, thousands of rows a packet).
 *
 * @param statement up to and without VALUES, e.g. "INSERT IGNORE INTO citations (citingWorkId, citedWorkId)"
 * @param suffix after the values, e.g. "ON DUPLICATE KEY UPDATE …"
 */
export async function insertRows(transaction: Transaction, statement: string, rows: readonly (readonly Cell[])[], suffix = ''): Promise<void> {
  if (rows.length === 0) return;
  const width = rows[0].length;
  const sql = `${statement} VALUES (${Array(width).fill('?').join(', ')}) ${suffix}`;
  const connection = driverConnection(transaction);
  for (let from = 0; from < rows.length; from += 5_000) {
    await connection.batch(sql, rows.slice(from, from + 5_000) as Cell[][]);
  }
}

/** Rows of a SELECT within a transaction. */
export async function select<Row extends object>(transaction: Transaction | null, sql: string, replacements: unknown[] | Record<string, unknown> = []): Promise<Row[]> {
  return database().query<Row>(sql, { type: QueryTypes.SELECT, replacements: replacements as string[], transaction: transaction ?? undefined });
}

/** Any other statement within a transaction. */
export async function run(transaction: Transaction | null, sql: string, replacements: unknown[] | Record<string, unknown> = []): Promise<void> {
  await database().query(sql, { replacements: replacements as string[], transaction: transaction ?? undefined, raw: true });
}

/** Rows for a long list of keys, asked for in slices so that no statement grows without bound. `sql` holds `IN (?)` once. */
export async function selectIn<Row extends object, Key>(transaction: Transaction | null, sql: string, keys: readonly Key[], more: unknown[] = []): Promise<Row[]> {
  const rows: Row[] = [];
  for (let from = 0; from < keys.length; from += 2_000) rows.push(...(await select<Row>(transaction, sql, [keys.slice(from, from + 2_000), ...more])));
  return rows;
}
