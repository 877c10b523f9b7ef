import { type Transaction } from 'sequelize';

import { run, select } from '@/lib/db/bulk';

/**
 * Changes of the catalogue run one after another: each derives works from all records that share a key, so two at once could each miss the
 * other's records. The lock is a row, held by the transaction, so a killed process lets go of it.
 *
 * @returns the version of the catalogue, which every change raises
 */
export async function lockCatalogue(transaction: Transaction): Promise<number> {
  const ask = () => select<{ version: number }>(transaction, "SELECT version FROM locks WHERE name = 'catalogue' FOR UPDATE");
  let [held] = await ask();
  if (!held) {
    await run(transaction, "INSERT IGNORE INTO locks (name) VALUES ('catalogue')");
    [held] = await ask();
  }
  return held.version;
}

/** Says that the catalogue has changed: what was checked against an earlier version must be checked again. */
export async function raiseCatalogueVersion(transaction: Transaction): Promise<void> {
  await run(transaction, "UPDATE locks SET version = version + 1 WHERE name = 'catalogue'");
}

/** The version that a check is made against; 0 before the first change. */
export async function catalogueVersion(transaction: Transaction): Promise<number> {
  const [row] = await select<{ version: number }>(transaction, "SELECT version FROM locks WHERE name = 'catalogue'");
  return row?.version ?? 0;
}
