import { type Actor } from '@/lib/access/permissions';
import { select } from '@/lib/db/bulk';
import { type Loaded } from '@/lib/api/route';
import { Work } from '@/models/work';

interface Condition {
  sql: string;
  replacements: Record<string, number>;
}

/** Portfolios that the person may see, as a subquery: administrators see all that are not deleted. */
export function visiblePortfolios(actor: Pick<Actor, 'userId' | 'role'>): Condition {
  if (actor.role === 'administrator') return { sql: 'SELECT portfolio.id FROM portfolios portfolio WHERE portfolio.deletedAt IS NULL', replacements: {} };
  return {
    sql: 'SELECT held.portfolioId FROM portfolio_grants held JOIN portfolios portfolio ON portfolio.id = held.portfolioId AND portfolio.deletedAt IS NULL WHERE held.userId = :visibleTo',
    replacements: { visibleTo: actor.userId },
  };
}

/** Condition on `work`: administrators see every work, others the members of their portfolios and what those cite. */
export function visibleWork(actor: Pick<Actor, 'userId' | 'role'>): Condition {
  if (actor.role === 'administrator') return { sql: '1 = 1', replacements: {} };
  const portfolios = visiblePortfolios(actor);
  const member = `membership.membership <> 'removed' AND membership.portfolioId IN (${portfolios.sql})`;
  return {
    sql: `(EXISTS (SELECT 1 FROM portfolio_works membership WHERE membership.workId = work.id AND ${member})
      OR EXISTS (SELECT 1 FROM citations seen JOIN portfolio_works membership ON membership.workId = seen.citingWorkId WHERE seen.citedWorkId = work.id AND ${member}))`,
    replacements: portfolios.replacements,
  };
}

/** The ids among the given ones whose works the person may see. */
export async function visibleAmong(actor: Pick<Actor, 'userId' | 'role'>, workIds: readonly number[]): Promise<Set<number>> {
  if (workIds.length === 0) return new Set();
  const visible = visibleWork(actor);
  const rows = await select<{ id: number }>(null, `SELECT work.id FROM works work WHERE work.id IN (:workIds) AND ${visible.sql}`, { workIds: [...workIds], ...visible.replacements });
  return new Set(rows.map((row) => row.id));
}

/** The work of an address, if this person may see it; no portfolio decides, because the catalogue is shared. */
export async function loadWork({ actor, params }: { actor: Actor; params: { workId: number } }): Promise<Loaded<Work>> {
  if (!(await visibleAmong(actor, [params.workId])).has(params.workId)) return null;
  const row = await Work.findByPk(params.workId);
  return row && { row, portfolioId: null };
}
