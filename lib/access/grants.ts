import { type Actor, type GrantLevel, type Role } from '@/lib/access/permissions';
import { invalid, notFound } from '@/lib/errors';
import { Portfolio } from '@/models/portfolio';
import { PortfolioGrant } from '@/models/portfolio-grant';
import { User } from '@/models/user';

export interface GrantView {
  userId: string;
  name: string;
  email: string;
  role: Role;
  level: GrantLevel;
}

/** What the person may do in the portfolio: administrators manage every portfolio that exists, others hold what they were given. Null: for them it does not exist. */
export async function grantLevelOf(actor: Pick<Actor, 'userId' | 'role'>, portfolioId: number): Promise<GrantLevel | null> {
  const portfolio = await Portfolio.findOne({ where: { id: portfolioId, deletedAt: null }, attributes: ['id'] });
  if (!portfolio) return null;
  if (actor.role === 'administrator') return 'manage';
  const grant = await PortfolioGrant.findOne({ where: { portfolioId, userId: actor.userId }, attributes: ['level'] });
  return grant?.level ?? null;
}

/** Who was given the portfolio, by name; administrators hold every portfolio and are listed only where they were given it. */
export async function listGrants(portfolioId: number): Promise<GrantView[]> {
  const grants = await PortfolioGrant.findAll({ where: { portfolioId } });
  const users = await User.findAll({ where: { id: grants.map((grant) => grant.userId) }, attributes: ['id', 'name', 'email', 'role'], order: [['name', 'ASC'], ['id', 'ASC']] });
  const levels = new Map(grants.map((grant) => [grant.userId, grant.level]));
  return users.flatMap((user) => {
    const level = levels.get(user.id);
    return level ? [{ userId: String(user.id), name: user.name, email: user.email, role: user.role, level }] : [];
  });
}

/** Gives a portfolio to a person, or changes the level that they hold. */
export async function setGrant(actor: Pick<Actor, 'userId'>, portfolioId: number, userId: number, level: GrantLevel): Promise<void> {
  const user = await User.findOne({ where: { id: userId, disabledAt: null }, attributes: ['id'] });
  if (!user) throw invalid('There is no such person.', { userId: 'There is no such person.' });
  await PortfolioGrant.upsert({ portfolioId, userId, level, grantedById: actor.userId });
}

/** Takes a portfolio back from a person; 404 when they did not hold it. */
export async function removeGrant(portfolioId: number, userId: number): Promise<void> {
  if ((await PortfolioGrant.destroy({ where: { portfolioId, userId } })) === 0) throw notFound();
}
