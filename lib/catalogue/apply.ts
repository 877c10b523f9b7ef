import { type Transaction } from 'sequelize';

import { gatherCounted, rebuildCitations } from '@/lib/catalogue/citations';
import { keyHash } from '@/lib/catalogue/key-hash';
import { lockCatalogue, raiseCatalogueVersion } from '@/lib/catalogue/lock';
import { planGroups, type Plan } from '@/lib/catalogue/plan';
import { resolveTouchedVariants } from '@/lib/catalogue/variants';
import { settleCitedOnly, writeWorks } from '@/lib/catalogue/works';
import { insertRows, run, select, selectIn, type Cell } from '@/lib/db/bulk';

export type CatalogueProgress = (stage: string, done: number, total: number) => Promise<void>;

/** What a change of the catalogue sets out from. */
export type CatalogueChange = { kind: 'accept' | 'withdraw'; importId: number } | { kind: 'regroup'; recordIds: number[] };

const noProgress: CatalogueProgress = async () => undefined;

/** Gives each group the id of its work: the row of its key, else the row that its records stood on, else a new one. */
async function placeGroups(transaction: Transaction, plan: Plan): Promise<Map<string, number>> {
  const keys = plan.groups.map((group) => keyHash(group.key));
  const existing = await selectIn<{ id: number; workKey: Buffer }, Buffer>(transaction, 'SELECT id, workKey FROM works WHERE workKey IN (?)', keys);
  const idByKey = new Map(existing.map((row) => [row.workKey.toString('hex'), row.id]));
  const claimed = new Set(idByKey.values());
  const renames: Cell[][] = [];
  const created: Cell[][] = [];
  plan.groups.forEach((group, index) => {
    const hash = keys[index].toString('hex');
    if (idByKey.has(hash)) return;
    const former = group.recordIds
      .map((id) => plan.records.get(id)?.workId ?? null)
      .filter((id): id is number => id !== null && !claimed.has(id))
      .sort((a, b) => a - b)[0];
    if (former === undefined) created.push([keys[index], 1]);
    else {
      claimed.add(former);
      idByKey.set(hash, former);
      renames.push([keys[index], former]);
    }
  });
  for (const [key, id] of renames) await run(transaction, 'UPDATE works SET workKey = ? WHERE id = ?', [key, id]);
  await insertRows(transaction, 'INSERT INTO works (workKey, catalogued)', created);
  // Ids are asked for by natural key: those that a bulk insert reports cannot be trusted.
  const fresh = await selectIn<{ id: number; workKey: Buffer }, Cell>(transaction, 'SELECT id, workKey FROM works WHERE workKey IN (?)', created.map(([key]) => key));
  for (const row of fresh) idByKey.set(row.workKey.toString('hex'), row.id);
  return new Map(plan.groups.map((group, index) => [group.key, idByKey.get(keys[index].toString('hex')) as number]));
}

async function placeRecords(transaction: Transaction, plan: Plan, ids: Map<string, number>, citing: Set<number>): Promise<void> {
  await run(transaction, 'DROP TEMPORARY TABLE IF EXISTS placed_records');
  await run(transaction, 'CREATE TEMPORARY TABLE placed_records (id BIGINT UNSIGNED NOT NULL PRIMARY KEY, workId BIGINT UNSIGNED NULL, citing TINYINT(1) NOT NULL) ENGINE = InnoDB');
  const rows: Cell[][] = [];
  for (const group of plan.groups) for (const id of group.recordIds) rows.push([id, ids.get(group.key) as number, citing.has(id) ? 1 : 0]);
  await insertRows(transaction, 'INSERT INTO placed_records (id, workId, citing)', rows);
  // Touched records without a place are those withdrawn.
  await run(transaction, 'INSERT IGNORE INTO placed_records (id, workId, citing) SELECT id, NULL, 0 FROM touched_records');
  await run(transaction, 'DROP TEMPORARY TABLE IF EXISTS turned_records');
  await run(
    transaction,
    `CREATE TEMPORARY TABLE turned_records (id BIGINT UNSIGNED NOT NULL PRIMARY KEY, step INT NOT NULL) ENGINE = InnoDB
     SELECT placed.id, CAST(placed.citing AS SIGNED) - CAST(record.citing AS SIGNED) AS step
     FROM placed_records placed JOIN import_records record ON record.id = placed.id WHERE placed.citing <> record.citing`,
  );
  // Works to look at again: where the records stood and where they stand now.
  await run(transaction, 'DROP TEMPORARY TABLE IF EXISTS touched_works');
  await run(transaction, 'CREATE TEMPORARY TABLE touched_works (id BIGINT UNSIGNED NOT NULL PRIMARY KEY) ENGINE = InnoDB');
  await run(transaction, 'INSERT IGNORE INTO touched_works SELECT DISTINCT record.workId FROM placed_records placed JOIN import_records record ON record.id = placed.id WHERE record.workId IS NOT NULL');
  await run(transaction, 'INSERT IGNORE INTO touched_works SELECT DISTINCT workId FROM placed_records WHERE workId IS NOT NULL');
  await run(
    transaction,
    `UPDATE import_records record JOIN placed_records placed ON placed.id = record.id
     SET record.workId = placed.workId, record.citing = placed.citing`,
  );
}

/** Portfolios hold a work by import as long as a catalogued record of one of their imports stands on it. */
async function placeInPortfolios(transaction: Transaction): Promise<void> {
  await run(
    transaction,
    `DELETE membership FROM portfolio_works membership JOIN touched_works touched ON touched.id = membership.workId
     WHERE membership.membership = 'import' AND NOT EXISTS (
       SELECT 1 FROM import_records record JOIN imports import ON import.id = record.importId
       WHERE record.workId = membership.workId AND record.catalogued = 1 AND import.portfolioId = membership.portfolioId)`,
  );
  await run(
    transaction,
    `INSERT IGNORE INTO portfolio_works (portfolioId, workId, membership)
     SELECT DISTINCT import.portfolioId, record.workId, 'import'
     FROM touched_works touched JOIN import_records record ON record.workId = touched.id AND record.catalogued = 1 JOIN imports import ON import.id = record.importId`,
  );
}

/**
 * Changes which records are catalogued and derives all that follows: works, links of references, citations, portfolios.
 * The result depends on the set of catalogued records and on decisions alone, so withdrawing an import leaves the catalogue as if it had
 * never been there. Runs in the caller's transaction: all of it happens, or none.
 */
export async function changeCatalogue(transaction: Transaction, change: CatalogueChange, progress: CatalogueProgress = noProgress): Promise<{ works: number }> {
  await lockCatalogue(transaction);
  await raiseCatalogueVersion(transaction);
  let seed: { sql: string; values: unknown[] };
  if (change.kind === 'regroup') seed = { sql: 'id IN (?)', values: [change.recordIds] };
  else {
    await run(transaction, "UPDATE import_records SET catalogued = ? WHERE importId = ? AND fields IS NOT NULL", [change.kind === 'accept' ? 1 : 0, change.importId]);
    seed = { sql: 'importId = ? AND fields IS NOT NULL', values: [change.importId] };
  }
  await progress('grouping', 0, 1);
  const plan = await planGroups(transaction, seed.sql, seed.values, 'record.catalogued = 1');
  const ids = await placeGroups(transaction, plan);
  const citing = await writeWorks(transaction, plan, ids, progress);
  await placeRecords(transaction, plan, ids, citing);
  const unsettled = await resolveTouchedVariants(transaction, progress);
  await progress('citations', 0, 1);
  // Before anything goes: a work that goes takes its citations along, and with them the knowledge of whom to count anew.
  await gatherCounted(transaction);
  await settleCitedOnly(transaction, unsettled);
  await rebuildCitations(transaction);
  await placeInPortfolios(transaction);
  const [{ works }] = await select<{ works: number }>(transaction, 'SELECT COUNT(*) AS works FROM touched_works');
  for (const table of ['touched_records', 'placed_records', 'turned_records', 'touched_works', 'touched_variants', 'moved_targets']) await run(transaction, `DROP TEMPORARY TABLE IF EXISTS ${table}`);
  return { works };
}
