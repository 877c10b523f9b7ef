import { type WorkListItem } from '@/lib/api/types';
import { select } from '@/lib/db/bulk';

interface Row {
  id: number;
  title: string | null;
  authorsLabel: string | null;
  year: number | null;
  venue: string | null;
  type: WorkListItem['type'];
  doi: string | null;
  catalogued: number;
  retracted: number;
  referenceCount: number;
  recordCount: number;
  citedCount: number;
}

/** Condition on `membership`: a member of the portfolio that was not taken out. */
export const standingMember = "membership.portfolioId = :portfolioId AND membership.membership <> 'removed'";

/** How many distinct members of the portfolio cite each of the given works; works that none cites are left out. */
export async function countCitationsHere(portfolioId: number, workIds: readonly number[]): Promise<Map<number, number>> {
  if (workIds.length === 0) return new Map();
  const rows = await select<{ id: number; citing: number }>(
    null,
    `SELECT citation.citedWorkId AS id, COUNT(*) AS citing FROM citations citation JOIN portfolio_works membership ON membership.workId = citation.citingWorkId
     WHERE citation.citedWorkId IN (:workIds) AND ${standingMember} GROUP BY citation.citedWorkId`,
    { workIds: [...workIds], portfolioId },
  );
  return new Map(rows.map((row) => [row.id, Number(row.citing)]));
}

/**
 * The works of the given ids as lists show them, in that order.
 *
 * @param portfolioId whose members are counted as citing; null counts every catalogued work
 */
export async function presentWorks(workIds: readonly number[], portfolioId: number | null): Promise<WorkListItem[]> {
  if (workIds.length === 0) return [];
  const rows = await select<Row>(
    null,
    'SELECT id, title, authorsLabel, year, venue, type, doi, catalogued, retracted, referenceCount, recordCount, citedCount FROM works WHERE id IN (:workIds)',
    { workIds: [...workIds] },
  );
  const here = portfolioId === null ? null : await countCitationsHere(portfolioId, workIds);
  const byId = new Map(rows.map((row) => [row.id, row]));
  return workIds.flatMap((id) => {
    const row = byId.get(id);
    if (!row) return [];
    return [{
      id: String(row.id),
      title: row.title,
      authors: row.authorsLabel,
      year: row.year,
      venue: row.venue,
      type: row.type,
      doi: row.doi,
      catalogued: Boolean(row.catalogued),
      retracted: Boolean(row.retracted),
      references: row.referenceCount,
      citationsHere: here ? (here.get(id) ?? 0) : row.citedCount,
      records: row.recordCount,
    }];
  });
}
