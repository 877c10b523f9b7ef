import { z } from 'zod';

import { paging, sortBy, yearQuery, type Page } from '@/lib/api/schemas';
import { type WorkListItem } from '@/lib/api/types';
import { workTypes } from '@/lib/bibliography/record';
import { asItStands } from '@/lib/catalogue/reading/as-it-stands';
import { searchCondition } from '@/lib/catalogue/reading/search-words';
import { presentWorks, standingMember } from '@/lib/catalogue/reading/work-items';
import { select } from '@/lib/db/bulk';

export const worksQuery = z.object({
  ...paging,
  sort: sortBy(['year', 'title', 'citationsHere', 'references'], '-year'),
  type: z.enum(workTypes).optional(),
  yearFrom: yearQuery,
  yearTo: yearQuery,
  /** true: members of the portfolio; false: works known only because members cite them; all: members and everything they cite. */
  catalogued: z.enum(['true', 'false', 'all']).default('true'),
  retracted: z.enum(['true', 'false']).optional(),
});
export type WorksQuery = z.output<typeof worksQuery>;

const citing = `portfolio_works membership JOIN citations citation ON citation.citingWorkId = membership.workId WHERE ${standingMember}`;

/** The works that a list draws from, before its filters, and how many members cite each. */
const scopes = {
  true: {
    from: 'portfolio_works membership JOIN works work ON work.id = membership.workId AND work.catalogued = 1',
    where: standingMember,
    // Counted work by work: members are cited far less often than they cite.
    citationsHere: `(SELECT COUNT(*) FROM citations citation JOIN portfolio_works membership ON membership.workId = citation.citingWorkId AND ${standingMember} WHERE citation.citedWorkId = work.id)`,
  },
  false: {
    from: `(SELECT citation.citedWorkId AS workId, COUNT(*) AS here FROM ${citing} GROUP BY citation.citedWorkId) linked JOIN works work ON work.id = linked.workId AND work.catalogued = 0`,
    where: '1 = 1',
    citationsHere: 'linked.here',
  },
  all: {
    from: `(SELECT workId, SUM(here) AS here FROM (
        SELECT membership.workId, 0 AS here FROM portfolio_works membership JOIN works own ON own.id = membership.workId AND own.catalogued = 1 WHERE ${standingMember}
        UNION ALL SELECT citation.citedWorkId, COUNT(*) FROM ${citing} GROUP BY citation.citedWorkId) listed GROUP BY workId) linked JOIN works work ON work.id = linked.workId`,
    where: '1 = 1',
    citationsHere: 'linked.here',
  },
} as const;

const searchScopes = { true: 'catalogued', false: 'cited-only', all: 'all' } as const;

const columns: Record<Exclude<WorksQuery['sort']['field'], 'citationsHere'>, string> = { year: 'work.year', title: 'work.titleSort', references: 'work.referenceCount' };

/** Works of a portfolio, filtered, sorted and paged in SQL. Works without the value sorted by stand last both ways; ties go by id. */
export async function listWorks(portfolioId: number, query: WorksQuery): Promise<Page<WorkListItem>> {
  const scope = scopes[query.catalogued];
  const where: string[] = [scope.where];
  const replacements: Record<string, unknown> = { portfolioId, limit: query.pageSize, offset: (query.page - 1) * query.pageSize };
  const filter = (sql: string, name: string, value: unknown) => {
    if (value === undefined) return;
    where.push(sql);
    replacements[name] = value;
  };
  filter('work.type = :type', 'type', query.type);
  filter('work.year >= :yearFrom', 'yearFrom', query.yearFrom);
  filter('work.year <= :yearTo', 'yearTo', query.yearTo);
  filter('work.retracted = :retracted', 'retracted', query.retracted === undefined ? undefined : query.retracted === 'true' ? 1 : 0);
  const searched = searchCondition(query.q, searchScopes[query.catalogued]);
  if (searched) {
    where.push(searched.sql);
    Object.assign(replacements, searched.replacements);
  }
  const source = `FROM ${scope.from} WHERE ${where.join(' AND ')}`;
  const key = query.sort.field === 'citationsHere' ? scope.citationsHere : columns[query.sort.field];
  const { limit: _limit, offset: _offset, ...filters } = replacements;
  const [total, rows] = await Promise.all([
    // The same for every page and order of a list.
    asItStands(portfolioId, `works ${source} ${JSON.stringify(filters)}`, async () => Number((await select<{ total: number }>(null, `SELECT COUNT(*) AS total ${source}`, filters))[0].total)),
    // Only ids are sorted: titles and authors are fetched for the page alone.
    select<{ id: number }>(
      null,
      `SELECT work.id, ${key} AS sortKey ${source} ORDER BY sortKey IS NULL, sortKey ${query.sort.descending ? 'DESC' : 'ASC'}, work.id LIMIT :limit OFFSET :offset`,
      replacements,
    ),
  ]);
  return { items: await presentWorks(rows.map((row) => row.id), portfolioId), total, page: query.page, pageSize: query.pageSize };
}
