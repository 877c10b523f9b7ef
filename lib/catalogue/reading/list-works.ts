import { z } from 'zod';

import { paging, sortBy, yearQuery, type Page } from '@/lib/api/schemas';
import { type WorkListItem } from '@/lib/api/types';
import { workTypes } from '@/lib/bibliography/record';
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

const cited = `SELECT citation.citedWorkId FROM portfolio_works membership JOIN citations citation ON citation.citingWorkId = membership.workId WHERE ${standingMember}`;

/** The works that a list draws from, before its filters. */
const scopes = {
  true: { from: 'portfolio_works membership JOIN works work ON work.id = membership.workId AND work.catalogued = 1', where: standingMember },
  false: { from: `(SELECT DISTINCT ${cited.slice('SELECT '.length)}) linked JOIN works work ON work.id = linked.citedWorkId AND work.catalogued = 0`, where: '1 = 1' },
  all: {
    from: `(SELECT membership.workId FROM portfolio_works membership JOIN works own ON own.id = membership.workId AND own.catalogued = 1 WHERE ${standingMember} UNION ${cited}) linked JOIN works work ON work.id = linked.workId`,
    where: '1 = 1',
  },
} as const;

const searchScopes = { true: 'catalogued', false: 'cited-only', all: 'all' } as const;

const sorts: Record<WorksQuery['sort']['field'], string> = {
  year: 'work.year',
  title: 'work.titleSort',
  references: 'work.referenceCount',
  citationsHere: `(SELECT COUNT(*) FROM citations citation JOIN portfolio_works membership ON membership.workId = citation.citingWorkId AND ${standingMember} WHERE citation.citedWorkId = work.id)`,
};

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
  const key = sorts[query.sort.field];
  const [[{ total }], rows] = await Promise.all([
    select<{ total: number }>(null, `SELECT COUNT(*) AS total ${source}`, replacements),
    // Only ids are sorted: titles and authors are fetched for the page alone.
    select<{ id: number }>(
      null,
      `SELECT work.id, ${key} AS sortKey ${source} ORDER BY sortKey IS NULL, sortKey ${query.sort.descending ? 'DESC' : 'ASC'}, work.id LIMIT :limit OFFSET :offset`,
      replacements,
    ),
  ]);
  return { items: await presentWorks(rows.map((row) => row.id), portfolioId), total: Number(total), page: query.page, pageSize: query.pageSize };
}
