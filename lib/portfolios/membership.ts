import { type Transaction } from 'sequelize';

import { type Actor } from '@/lib/access/permissions';
import { visibleAmong } from '@/lib/catalogue/reading/visibility';
import { run, select } from '@/lib/db/bulk';
import { database } from '@/lib/db/connection';
import { invalid } from '@/lib/errors';
import { Portfolio } from '@/models/portfolio';

/** How many rows were changed; the works that stood so already are not among them. */
interface Changed {
  changed: number;
}

/** Ids among the given works on which a catalogued record of one of the portfolio's own imports stands. */
async function importedHere(transaction: Transaction, portfolioId: number, workIds: number[]): Promise<Set<number>> {
  const rows = await select<{ workId: number }>(
    transaction,
    `SELECT DISTINCT record.workId FROM import_records record JOIN imports import ON import.id = record.importId
     WHERE record.workId IN (:workIds) AND record.catalogued = 1 AND import.portfolioId = :portfolioId`,
    { workIds, portfolioId },
  );
  return new Set(rows.map((row) => row.workId));
}

async function membershipsOf(transaction: Transaction, portfolioId: number, workIds: number[]): Promise<Map<number, string>> {
  const rows = await select<{ workId: number; membership: string }>(transaction, 'SELECT workId, membership FROM portfolio_works WHERE portfolioId = :portfolioId AND workId IN (:workIds) FOR UPDATE', { portfolioId, workIds });
  return new Map(rows.map((row) => [row.workId, row.membership]));
}

/** The portfolio changed: its own row says when. */
async function touch(transaction: Transaction, portfolioId: number): Promise<void> {
  await Portfolio.update({ updatedAt: new Date() }, { where: { id: portfolioId }, transaction });
}

/**
 * Adds works by hand, or brings back those that were taken out. Only catalogued works that the person may see, or that stood here before;
 * otherwise nothing is changed and the error names the works.
 */
export async function addWorks(actor: Actor, portfolioId: number, workIds: readonly number[]): Promise<Changed> {
  const ids = [...new Set(workIds)];
  const visible = await visibleAmong(actor, ids);
  return database().transaction(async (transaction) => {
    const memberships = await membershipsOf(transaction, portfolioId, ids);
    const catalogued = new Set((await select<{ id: number }>(transaction, 'SELECT id FROM works WHERE id IN (?) AND catalogued = 1', [ids])).map((row) => row.id));
    const missing = ids.filter((id) => !visible.has(id) && !memberships.has(id));
    if (missing.length > 0) throw invalid(`Nothing was changed. There are no such works: ${missing.slice(0, 10).join(', ')}.`, { workIds: 'Some of these works do not exist.' });
    const bare = ids.filter((id) => !catalogued.has(id));
    if (bare.length > 0) throw invalid(`Nothing was changed. Only catalogued works can be members; these are known from references alone: ${bare.slice(0, 10).join(', ')}.`, { workIds: 'Some of these works are only cited.' });
    const imported = await importedHere(transaction, portfolioId, ids);
    const added = ids.filter((id) => (memberships.get(id) ?? 'removed') === 'removed');
    for (const [membership, works] of [['import', added.filter((id) => imported.has(id))], ['hand', added.filter((id) => !imported.has(id))]] as const) {
      if (works.length === 0) continue;
      await run(
        transaction,
        `INSERT INTO portfolio_works (portfolioId, workId, membership, addedById) VALUES ${works.map(() => '(?, ?, ?, ?)').join(', ')} ON DUPLICATE KEY UPDATE membership = VALUES(membership), addedById = VALUES(addedById)`,
        works.flatMap((id) => [portfolioId, id, membership, actor.userId]),
      );
    }
    if (added.length > 0) await touch(transaction, portfolioId);
    return { changed: added.length };
  });
}

/**
 * Takes works out. What came by an import is marked as removed, so that the next import does not bring it back unasked;
 * what was added by hand only is forgotten.
 */
export async function removeWorks(actor: Actor, portfolioId: number, workIds: readonly number[]): Promise<Changed> {
  const ids = [...new Set(workIds)];
  return database().transaction(async (transaction) => {
    const memberships = await membershipsOf(transaction, portfolioId, ids);
    const standing = ids.filter((id) => memberships.has(id) && memberships.get(id) !== 'removed');
    if (standing.length === 0) return { changed: 0 };
    const imported = await importedHere(transaction, portfolioId, standing);
    const marked = standing.filter((id) => imported.has(id) || memberships.get(id) === 'import');
    const dropped = standing.filter((id) => !marked.includes(id));
    if (marked.length > 0) await run(transaction, "UPDATE portfolio_works SET membership = 'removed', addedById = ? WHERE portfolioId = ? AND workId IN (?)", [actor.userId, portfolioId, marked]);
    if (dropped.length > 0) await run(transaction, 'DELETE FROM portfolio_works WHERE portfolioId = ? AND workId IN (?)', [portfolioId, dropped]);
    await touch(transaction, portfolioId);
    return { changed: standing.length };
  });
}
