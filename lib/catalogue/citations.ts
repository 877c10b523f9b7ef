import { type Transaction } from 'sequelize';

import { run } from '@/lib/db/bulk';

async function gather(transaction: Transaction): Promise<void> {
  await run(transaction, 'INSERT IGNORE INTO counted_works SELECT DISTINCT citation.citedWorkId FROM touched_works touched JOIN citations citation ON citation.citingWorkId = touched.id');
  await run(transaction, 'INSERT IGNORE INTO counted_works SELECT DISTINCT citation.citingWorkId FROM moved_targets moved JOIN citations citation ON citation.citedWorkId = moved.id');
}

/** Remembers, in the temporary table counted_works, whose numbers of citations may change. */
export async function gatherCounted(transaction: Transaction): Promise<void> {
  await run(transaction, 'DROP TEMPORARY TABLE IF EXISTS counted_works');
  await run(transaction, `CREATE TEMPORARY TABLE counted_works (id BIGINT UNSIGNED NOT NULL PRIMARY KEY) ENGINE = InnoDB`);
  await gather(transaction);
}

/**
 * Derives the citation rows again: all of the touched works' own, and all that lead to a work that gained or lost a variant.
 * A work that cites itself is a fault of linking and gives no citation.
 */
export async function rebuildCitations(transaction: Transaction): Promise<void> {
  await run(transaction, 'DELETE citation FROM citations citation JOIN touched_works touched ON touched.id = citation.citingWorkId');
  await run(transaction, 'DELETE citation FROM citations citation JOIN moved_targets moved ON moved.id = citation.citedWorkId');
  await run(
    transaction,
    // Work by work in the order of the table's own key, which is why no grouping is left to the server.
    `INSERT INTO citations (citingWorkId, citedWorkId, referenceCount)
     SELECT record.workId, variant.workId, 1
     FROM touched_works touched
     STRAIGHT_JOIN import_records record ON record.workId = touched.id AND record.citing = 1
     STRAIGHT_JOIN cited_references reference ON reference.recordId = record.id
     STRAIGHT_JOIN reference_variants variant ON variant.hash = reference.variantHash
     WHERE variant.workId IS NOT NULL AND variant.workId <> record.workId
     ON DUPLICATE KEY UPDATE referenceCount = citations.referenceCount + 1`,
  );
  await run(
    transaction,
    `INSERT IGNORE INTO citations (citingWorkId, citedWorkId, referenceCount)
     SELECT record.workId, variant.workId, COUNT(*)
     FROM moved_targets moved JOIN reference_variants variant ON variant.workId = moved.id
     JOIN cited_references reference ON reference.variantHash = variant.hash
     JOIN import_records record ON record.id = reference.recordId AND record.citing = 1
     WHERE variant.workId <> record.workId GROUP BY record.workId, variant.workId`,
  );
  await gather(transaction);
  await run(transaction, 'INSERT IGNORE INTO counted_works SELECT id FROM touched_works');
  await run(transaction, 'INSERT IGNORE INTO counted_works SELECT id FROM moved_targets');
  await run(
    transaction,
    `UPDATE works work JOIN counted_works counted ON counted.id = work.id
     SET work.citedCount = (SELECT COUNT(*) FROM citations citation WHERE citation.citedWorkId = work.id),
         work.citingCount = IF(work.catalogued = 1, (SELECT COUNT(*) FROM citations citation WHERE citation.citingWorkId = work.id), 0)`,
  );
  await run(transaction, 'DROP TEMPORARY TABLE counted_works');
}
