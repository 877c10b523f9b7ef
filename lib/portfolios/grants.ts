import { type Transaction } from 'sequelize';

import { may, type Actor, type GrantLevel } from '@/lib/access/permissions';
import { database } from '@/lib/db/connection';
import { invalid } from '@/lib/errors';
import { type GrantFields } from '@/lib/portfolios/fields';
import { PortfolioGrant } from '@/models/portfolio-grant';
import { User } from '@/models/user';

/** The people named, each with the level; a name that nobody has is an error that says which. */
export async function resolveGrants(grants: GrantFields[], transaction: Transaction): Promise<Map<User, GrantLevel>> {
  const levels = new Map<User, GrantLevel>();
  const errors: Record<string, string> = {};
  const byId = await User.findAll({ where: { id: grants.flatMap((grant) => grant.userId ?? []), disabledAt: null }, transaction });
  const byEmail = await User.findAll({ where: { email: grants.flatMap((grant) => grant.email?.toLowerCase() ?? []), disabledAt: null }, transaction });
  const people = new Map([...byId, ...byEmail].map((user) => [user.id, user]));
  grants.forEach((grant, index) => {
    const wanted = grant.email?.toLowerCase();
    const user = [...people.values()].find((one) => one.id === grant.userId || (wanted !== undefined && one.email.toLowerCase() === wanted));
    if (!user) errors[`grants.${index}`] = `There is no account of ${grant.email ?? 'this person'}; invite them first.`;
    else if (levels.has(user)) errors[`grants.${index}`] = `${user.name} is named twice.`;
    else levels.set(user, grant.level);
  });
  if (Object.keys(errors).length > 0) throw invalid(`Nothing was changed. ${Object.values(errors).join(' ')}`, errors);
  return levels;
}

/**
 * Gives the portfolio to exactly the people named. Somebody named must still be able to manage it, unless an administrator says otherwise:
 * librarians would otherwise shut themselves out by accident.
 */
export async function replaceGrants(actor: Actor, portfolioId: number, grants: GrantFields[]): Promise<void> {
  await database().transaction(async (transaction) => {
    const held = await PortfolioGrant.findAll({ where: { portfolioId }, lock: true, transaction });
    const levels = await resolveGrants(grants, transaction);
    const managed = [...levels].some(([user, level]) => may({ role: user.role }, 'portfolio.edit', level));
    if (!managed && actor.role !== 'administrator') throw invalid('Nothing was changed. At least one librarian must keep the level "manage".', { grants: 'At least one librarian must keep the level "manage".' });
    const kept = new Set([...levels.keys()].map((user) => user.id));
    await PortfolioGrant.destroy({ where: { portfolioId, userId: held.map((row) => row.userId).filter((id) => !kept.has(id)) }, transaction });
    for (const [user, level] of levels) {
      const before = held.find((row) => row.userId === user.id);
      if (before?.level === level) continue;
      await PortfolioGrant.upsert({ portfolioId, userId: user.id, level, grantedById: actor.userId }, { transaction });
    }
  });
}
