import { type Transaction } from 'sequelize';

import { type CatalogueProgress } from '@/lib/catalogue/apply';
import { createCitedOnly, temporaryIds, type VariantText } from '@/lib/catalogue/works';
import { insertRows, run, select, selectIn, type Cell } from '@/lib/db/bulk';
import { resolveVariants, type CataloguedTarget, type VariantInput } from '@/lib/linking/resolve';

const hex = (buffer: Buffer | null): string | null => (buffer ? buffer.toString('hex') : null);

interface VariantRow extends VariantText {
  hash: Buffer;
  identifierKey: Buffer | null;
  fieldKey: Buffer | null;
  titleKey: Buffer | null;
  ownKey: Buffer;
  workId: number | null;
  how: string | null;
}

/** Counts how many references come into use or go out of it, by variant, and gathers every variant whose target may change. */
async function touchVariants(transaction: Transaction): Promise<void> {
  await run(transaction, 'DROP TEMPORARY TABLE IF EXISTS touched_variants');
  await run(transaction, `CREATE TEMPORARY TABLE touched_variants (hash BINARY(16) NOT NULL PRIMARY KEY, step INT NOT NULL DEFAULT 0) ENGINE = InnoDB`);
  await run(
    transaction,
    `INSERT INTO touched_variants (hash, step)
     SELECT reference.variantHash, SUM(turned.step) FROM turned_records turned JOIN cited_references reference ON reference.recordId = turned.id GROUP BY reference.variantHash`,
  );
  for (const column of ['identifierKey', 'fieldKey', 'titleKey']) {
    await run(
      transaction,
      `INSERT IGNORE INTO touched_variants (hash)
       SELECT variant.hash FROM (SELECT DISTINCT own.keyHash FROM touched_records touched JOIN record_keys own ON own.recordId = touched.id AND own.kind IN (1, 3)) met
       JOIN reference_variants variant ON variant.${column} = met.keyHash`,
    );
  }
  // All variants of one identifier are resolved together; one without an identifier looks at those that share its key. See resolveVariants.
  for (const column of ['identifierKey', 'fieldKey', 'titleKey', 'identifierKey']) {
    const extra = column === 'titleKey' ? 'WHERE other.fieldKey IS NULL OR other.identifierKey IS NOT NULL' : '';
    await run(
      transaction,
      `INSERT IGNORE INTO touched_variants (hash)
       SELECT other.hash FROM (SELECT DISTINCT own.${column} AS sharedKey FROM touched_variants touched JOIN reference_variants own ON own.hash = touched.hash AND own.${column} IS NOT NULL) met
       JOIN reference_variants other ON other.${column} = met.sharedKey ${extra}`,
    );
  }
}

async function cataloguedTargets(transaction: Transaction): Promise<Map<string, CataloguedTarget[]>> {
  const targets = new Map<string, Map<number, CataloguedTarget>>();
  for (const column of ['identifierKey', 'fieldKey', 'titleKey']) {
    const rows = await select<{ keyHash: Buffer; workId: number; workKey: Buffer; doi: string | null }>(
      transaction,
      `SELECT DISTINCT own.keyHash, work.id AS workId, work.workKey, work.doi
       FROM (SELECT DISTINCT variant.${column} AS keyHash FROM touched_variants touched JOIN reference_variants variant ON variant.hash = touched.hash WHERE variant.${column} IS NOT NULL AND variant.standing + touched.step > 0) wanted
       JOIN record_keys own ON own.keyHash = wanted.keyHash AND own.kind IN (1, 3)
       JOIN import_records record ON record.id = own.recordId AND record.catalogued = 1
       JOIN works work ON work.id = record.workId`,
    );
    for (const row of rows) {
      const key = row.keyHash.toString('hex');
      const works = targets.get(key) ?? new Map<number, CataloguedTarget>();
      works.set(row.workId, { workId: row.workId, key: row.workKey.toString('hex'), doi: row.doi });
      targets.set(key, works);
    }
  }
  return new Map([...targets].map(([key, works]) => [key, [...works.values()]]));
}

/**
 * Rows of cited-only works by key. Missing ones are made, whole: a work that was not there has no other variants than these.
 * Existing ones are for the caller to settle.
 */
async function citedOnlyWorks(transaction: Transaction, drawn: Map<string, VariantText[]>): Promise<{ ids: Map<string, number>; existing: number[] }> {
  const find = async (keys: string[]) => {
    const rows = await selectIn<{ id: number; workKey: Buffer }, Buffer>(transaction, 'SELECT id, workKey FROM works WHERE workKey IN (?)', keys.map((key) => Buffer.from(key, 'hex')));
    return rows.map((row) => [row.workKey.toString('hex'), row.id] as const);
  };
  const keys = [...drawn.keys()].sort();
  const ids = new Map(await find(keys));
  const existing = [...ids.values()];
  const missing = keys.filter((key) => !ids.has(key));
  await createCitedOnly(transaction, missing.map((key) => ({ workKey: Buffer.from(key, 'hex'), variants: drawn.get(key) as VariantText[] })));
  for (const [key, id] of await find(missing)) ids.set(key, id);
  return { ids, existing };
}

/**
 * Links the references of all touched records, and all others that the change may have led elsewhere.
 * Leaves behind the temporary table moved_targets: works whose citing works may have changed although no record of theirs was touched.
 *
 * @returns ids of the works that may have become cited-only, or may be left with nothing to stand on
 */
export async function resolveTouchedVariants(transaction: Transaction, progress: CatalogueProgress): Promise<number[]> {
  await progress('linking', 0, 3);
  await touchVariants(transaction);
  const rows = await select<VariantRow>(
    transaction,
    `SELECT variant.hash, variant.doi, variant.identifierKey, variant.fieldKey, variant.titleKey, variant.ownKey, variant.workId, variant.how,
       variant.pmid, variant.author, variant.family, variant.year, variant.title, variant.source, variant.volume, variant.issue, variant.page, variant.raw,
       variant.standing + touched.step AS standing
     FROM touched_variants touched JOIN reference_variants variant ON variant.hash = touched.hash WHERE variant.standing + touched.step > 0`,
  );
  const catalogue = await cataloguedTargets(transaction);
  await progress('linking', 1, 3);
  const inputs: VariantInput[] = rows.map((row) => ({
    id: row.hash.toString('hex'),
    doi: row.doi,
    identifierKey: hex(row.identifierKey),
    fieldKey: hex(row.fieldKey),
    titleKey: hex(row.titleKey),
    ownKey: row.ownKey.toString('hex'),
  }));
  const resolutions = resolveVariants(inputs, (key) => catalogue.get(key) ?? []);
  const drawn = new Map<string, VariantText[]>();
  rows.forEach((row, index) => {
    const resolution = resolutions.get(inputs[index].id);
    if (!resolution || !('citedOnlyKey' in resolution)) return;
    const variants = drawn.get(resolution.citedOnlyKey);
    if (variants) variants.push(row);
    else drawn.set(resolution.citedOnlyKey, [row]);
  });
  const { ids: drawnIds, existing } = await citedOnlyWorks(transaction, drawn);

  const moves: Cell[][] = [];
  const moved = new Set<number>();
  const settle = new Set<number>(existing);
  rows.forEach((row, index) => {
    const resolution = resolutions.get(inputs[index].id) as NonNullable<ReturnType<typeof resolutions.get>>;
    const workId = 'workId' in resolution ? resolution.workId : (drawnIds.get(resolution.citedOnlyKey) as number);
    if (row.workId === workId && row.how === resolution.how) return;
    moves.push([row.hash, workId, resolution.how]);
    if (row.workId !== null && row.workId !== workId) {
      moved.add(row.workId).add(workId);
      settle.add(row.workId);
    }
  });
  // Variants that nobody uses any more lead nowhere.
  const idle = await select<{ hash: Buffer; workId: number }>(
    transaction,
    'SELECT variant.hash, variant.workId FROM touched_variants touched JOIN reference_variants variant ON variant.hash = touched.hash WHERE variant.standing + touched.step = 0 AND variant.workId IS NOT NULL',
  );
  for (const { hash, workId } of idle) {
    settle.add(workId);
    moves.push([hash, null, null]);
  }
  await run(transaction, 'DROP TEMPORARY TABLE IF EXISTS moved_variants');
  await run(transaction, `CREATE TEMPORARY TABLE moved_variants (hash BINARY(16) NOT NULL PRIMARY KEY, workId BIGINT UNSIGNED NULL, how VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NULL) ENGINE = InnoDB`);
  await insertRows(transaction, 'INSERT INTO moved_variants (hash, workId, how)', moves);
  await run(
    transaction,
    `UPDATE reference_variants variant JOIN touched_variants touched ON touched.hash = variant.hash LEFT JOIN moved_variants moved ON moved.hash = touched.hash
     SET variant.standing = variant.standing + touched.step,
         variant.workId = IF(moved.hash IS NULL, variant.workId, moved.workId),
         variant.how = IF(moved.hash IS NULL, variant.how, moved.how)
     WHERE touched.step <> 0 OR moved.hash IS NOT NULL`,
  );
  await run(transaction, 'DROP TEMPORARY TABLE moved_variants');
  await progress('linking', 2, 3);

  await run(transaction, 'DROP TEMPORARY TABLE IF EXISTS moved_targets');
  await run(transaction, `CREATE TEMPORARY TABLE moved_targets (id BIGINT UNSIGNED NOT NULL PRIMARY KEY) ENGINE = InnoDB`);
  await insertRows(transaction, 'INSERT IGNORE INTO moved_targets (id)', [...moved].map((id) => [id]));
  for (const id of await temporaryIds(transaction, 'touched_works')) settle.add(id);
  return [...settle].sort((a, b) => a - b);
}
