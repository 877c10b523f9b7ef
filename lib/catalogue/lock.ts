import { type Transaction } from 'sequelize';

import { run, select } from '@/lib/db/bulk';

/**
 * Changes of the catalogue run one after another: each derives works from all records that share a key, so two at once could each miss the
 * other's records. The lock is a row, held by the transaction, so a killed process lets go of it.
 */
export async function lockCatalogue(transaction: Transaction): Promise<void> {
  const [held] = await select(transaction, "SELECT name FROM locks WHERE name = 'catalogue' FOR UPDATE");
  if (held) return;
  await run(transaction, "INSERT IGNORE INTO locks (name) VALUES ('catalogue')");
  await select(transaction, "SELECT name FROM locks WHERE name = 'catalogue' FOR UPDATE");
}
