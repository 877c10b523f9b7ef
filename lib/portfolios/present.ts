import { type Actor, type GrantLevel } from '@/lib/access/permissions';
import { type PortfolioView } from '@/lib/api/types';
import { select } from '@/lib/db/bulk';
import { type Portfolio } from '@/models/portfolio';
import { PortfolioGrant } from '@/models/portfolio-grant';
import { Unit } from '@/models/unit';

/** Catalogued works of each portfolio. A member by import always has a record; one added by hand may have lost its last. */
async function countWorks(portfolioIds: number[]): Promise<Map<number, number>> {
  if (portfolioIds.length === 0) return new Map();
  const rows = await select<{ portfolioId: number; works: number }>(
    null,
    `SELECT membership.portfolioId, COUNT(*) AS works FROM portfolio_works membership
     LEFT JOIN works work ON membership.membership = 'hand' AND work.id = membership.workId
     WHERE membership.portfolioId IN (:portfolioIds) AND (membership.membership = 'import' OR work.catalogued = 1) GROUP BY membership.portfolioId`,
    { portfolioIds },
  );
  return new Map(rows.map((row) => [row.portfolioId, Number(row.works)]));
}

async function levelsOf(actor: Actor, portfolioIds: number[]): Promise<Map<number, GrantLevel>> {
  if (actor.role === 'administrator') return new Map(portfolioIds.map((id) => [id, 'manage']));
  const held = await PortfolioGrant.findAll({ where: { userId: actor.userId, portfolioId: portfolioIds } });
  return new Map(held.map((row) => [row.portfolioId, row.level]));
}

/** Portfolios as this person sees them; those that they were not given are left out. */
export async function presentPortfolios(actor: Actor, rows: Portfolio[]): Promise<PortfolioView[]> {
  const ids = rows.map((row) => row.id);
  const [works, levels, units] = await Promise.all([countWorks(ids), levelsOf(actor, ids), Unit.findAll({ where: { id: rows.flatMap((row) => row.unitId ?? []) }, attributes: ['id', 'name'] })]);
  const unitNames = new Map(units.map((unit) => [unit.id, unit.name]));
  return rows.flatMap((row) => {
    const level = levels.get(row.id);
    if (!level) return [];
    const unitName = row.unitId === null ? undefined : unitNames.get(row.unitId);
    return [{
      id: String(row.id),
      name: row.name,
      description: row.description,
      unit: unitName === undefined ? null : { id: String(row.unitId), name: unitName },
      periodFrom: row.periodFrom,
      periodTo: row.periodTo,
      demonstration: Boolean(row.demonstration),
      level,
      works: works.get(row.id) ?? 0,
      updatedAt: row.updatedAt.toISOString(),
    }];
  });
}
