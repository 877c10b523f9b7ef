import { escapeLike } from '@/lib/access/escape-like';
import { type Actor } from '@/lib/access/permissions';
import { type WorkListItem } from '@/lib/api/types';
import { searchCondition } from '@/lib/catalogue/reading/search-words';
import { visiblePortfolios, visibleWork } from '@/lib/catalogue/reading/visibility';
import { presentWorks } from '@/lib/catalogue/reading/work-items';
import { select } from '@/lib/db/bulk';

const most = 8;

export interface SearchResult {
  portfolios: { id: string; name: string }[];
  /** Most cited first; a DOI is matched exactly, among cited-only works too. */
  works: WorkListItem[];
}

async function findPortfolios(actor: Actor, q: string): Promise<SearchResult['portfolios']> {
  const portfolios = visiblePortfolios(actor);
  const rows = await select<{ id: number; name: string }>(
    null,
    `SELECT found.id, found.name FROM portfolios found WHERE found.id IN (${portfolios.sql}) AND found.name LIKE :name ORDER BY found.name, found.id LIMIT ${most}`,
    { name: `%${escapeLike(q)}%`, ...portfolios.replacements },
  );
  return rows.map((row) => ({ id: String(row.id), name: row.name }));
}

async function findWorks(actor: Actor, q: string): Promise<WorkListItem[]> {
  const searched = searchCondition(q, 'catalogued');
  if (!searched) return [];
  const visible = visibleWork(actor);
  const rows = await select<{ id: number }>(
    null,
    `SELECT work.id FROM works work WHERE ${searched.sql} AND ${visible.sql} ORDER BY work.citedCount DESC, work.id LIMIT ${most}`,
    { ...searched.replacements, ...visible.replacements },
  );
  return presentWorks(rows.map((row) => row.id), null);
}

/** What the header's search offers: portfolios by name, works by their words or by DOI; only what the person may see. */
export async function search(actor: Actor, q: string): Promise<SearchResult> {
  if (q === '') return { portfolios: [], works: [] };
  const [portfolios, works] = await Promise.all([findPortfolios(actor, q), findWorks(actor, q)]);
  return { portfolios, works };
}
