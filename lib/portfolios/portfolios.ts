import { Op, literal, type WhereOptions } from 'sequelize';
import { z } from 'zod';

import { escapeLike } from '@/lib/access/escape-like';
import { grantLevelOf } from '@/lib/access/grants';
import { may, type Actor, type GrantLevel } from '@/lib/access/permissions';
import { paging, sortBy, type Page } from '@/lib/api/schemas';
import { type PortfolioView } from '@/lib/api/types';
import { database } from '@/lib/db/connection';
import { conflict, forbidden, invalid, notFound } from '@/lib/errors';
import { type NewPortfolio, type PortfolioChanges } from '@/lib/portfolios/fields';
import { resolveGrants } from '@/lib/portfolios/grants';
import { presentPortfolios } from '@/lib/portfolios/present';
import { Portfolio } from '@/models/portfolio';
import { PortfolioGrant } from '@/models/portfolio-grant';
import { Unit } from '@/models/unit';

export const portfoliosQuery = z.object({ ...paging, sort: sortBy(['name', 'updatedAt'], 'name') });

/** The portfolios that this person was given (administrators: all), a page at a time. `q` looks into names and descriptions. */
export async function listPortfolios(actor: Actor, { page, pageSize, q, sort }: z.output<typeof portfoliosQuery>): Promise<Page<PortfolioView>> {
  const where: WhereOptions<Portfolio> = {
    deletedAt: null,
    ...(actor.role === 'administrator' ? {} : { id: { [Op.in]: literal(`(SELECT held.portfolioId FROM portfolio_grants held WHERE held.userId = ${Number(actor.userId)})`) } }),
    ...(q ? { [Op.or]: [{ name: { [Op.like]: `%${escapeLike(q)}%` } }, { description: { [Op.like]: `%${escapeLike(q)}%` } }] } : {}),
  };
  const { rows, count } = await Portfolio.findAndCountAll({ where, order: [[sort.field, sort.descending ? 'DESC' : 'ASC'], ['id', 'ASC']], limit: pageSize, offset: (page - 1) * pageSize });
  return { items: await presentPortfolios(actor, rows), total: count, page, pageSize };
}

async function presentOne(actor: Actor, row: Portfolio): Promise<PortfolioView> {
  const [view] = await presentPortfolios(actor, [row]);
  if (!view) throw notFound();
  return view;
}

async function assertUnit(unitId: number | null | undefined): Promise<void> {
  if (typeof unitId === 'number' && (await Unit.count({ where: { id: unitId } })) === 0) throw invalid('There is no such unit.', { unitId: 'There is no such unit.' });
}

/** Makes a portfolio; whoever makes it manages it. */
export async function createPortfolio(actor: Actor, { grants, unitId, ...fields }: NewPortfolio): Promise<PortfolioView> {
  await assertUnit(unitId);
  const row = await database().transaction(async (transaction) => {
    const created = await Portfolio.create({ ...fields, unitId: unitId ?? null, createdById: actor.userId }, { transaction });
    const levels = await resolveGrants(grants, transaction);
    for (const [user, level] of levels) await PortfolioGrant.create({ portfolioId: created.id, userId: user.id, level, grantedById: actor.userId }, { transaction });
    await PortfolioGrant.upsert({ portfolioId: created.id, userId: actor.userId, level: 'manage', grantedById: actor.userId }, { transaction });
    return created;
  });
  // Times and defaults as the database keeps them.
  return presentOne(actor, await row.reload());
}

export async function changePortfolio(actor: Actor, row: Portfolio, changes: PortfolioChanges): Promise<PortfolioView> {
  await assertUnit(changes.unitId);
  const from = changes.periodFrom === undefined ? row.periodFrom : changes.periodFrom;
  const to = changes.periodTo === undefined ? row.periodTo : changes.periodTo;
  if (from !== null && to !== null && from > to) throw invalid('The period ends before it begins.', { periodTo: 'The period ends before it begins.' });
  await row.update(changes);
  return presentOne(actor, row);
}

/** A deleted portfolio is gone for everybody; whoever managed it can bring it back with all that was in it. */
export async function deletePortfolio(row: Portfolio): Promise<void> {
  await row.update({ deletedAt: new Date() });
}

/** What the person holds in a portfolio, deleted or not. */
async function heldLevel(actor: Actor, portfolioId: number): Promise<GrantLevel | null> {
  if (actor.role === 'administrator') return 'manage';
  return (await PortfolioGrant.findOne({ where: { portfolioId, userId: actor.userId } }))?.level ?? null;
}

export async function restorePortfolio(actor: Actor, portfolioId: number): Promise<PortfolioView> {
  const row = await Portfolio.findByPk(portfolioId);
  if (!row) throw notFound();
  if (row.deletedAt === null) {
    const level = await grantLevelOf(actor, portfolioId);
    if (level === null) throw notFound();
    if (!may(actor, 'portfolio.edit', level)) throw forbidden('Your role or your grant does not allow this.');
    throw conflict('The portfolio was not deleted, or somebody brought it back already.');
  }
  // Deleted, it exists only for those who could have deleted it.
  if (!may(actor, 'portfolio.edit', await heldLevel(actor, portfolioId))) throw notFound();
  await row.update({ deletedAt: null });
  return presentOne(actor, row);
}

/** Name of a deleted portfolio that this person could bring back, or null. */
export async function deletedPortfolio(actor: Actor, portfolioId: unknown): Promise<{ id: string; name: string } | null> {
  if (typeof portfolioId !== 'string' || !/^[1-9]\d{0,15}$/.test(portfolioId)) return null;
  const row = await Portfolio.findOne({ where: { id: Number(portfolioId), deletedAt: { [Op.ne]: null } } });
  if (!row || !may(actor, 'portfolio.edit', await heldLevel(actor, row.id))) return null;
  return { id: String(row.id), name: row.name };
}
