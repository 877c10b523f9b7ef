import { hashPassword } from '@/lib/access/passwords';
import { type Role } from '@/lib/access/permissions';
import { demonstrationPeople } from '@/lib/demonstration/accounts';
import { environment } from '@/lib/environment';
import { User } from '@/models/user';

/** Printed at the start and shown on the sign-in page of a demonstration; of no use elsewhere. */
export const demonstrationPassword = 'linen-and-indigo';

export const demonstrationAccounts: readonly { email: string; name: string; role: Role }[] = demonstrationPeople;

/**
 * Makes the demonstration's accounts where they are missing and gives the ids by role. Null where the demonstration does not belong:
 * it is switched off, or the service has people of its own, among whom a known password must not go.
 */
export async function createDemonstrationAccounts(): Promise<Record<Role, number> | null> {
  if (environment().HEDDLE_DEMO !== 'on') return null;
  const ids: Partial<Record<Role, number>> = {};
  const known = await User.findAll({ where: { email: demonstrationAccounts.map((account) => account.email), demonstration: true }, attributes: ['id', 'email'] });
  const missing = demonstrationAccounts.filter((account) => !known.some((user) => user.email === account.email));
  if (missing.length > 0 && (await User.findOne({ where: { demonstration: false }, attributes: ['id'] }))) return null;
  for (const account of demonstrationAccounts) {
    const user = known.find((candidate) => candidate.email === account.email) ?? (await User.create({ ...account, passwordHash: await hashPassword(demonstrationPassword), demonstration: true }));
    ids[account.role] = user.id;
  }
  return ids as Record<Role, number>;
}

/** What the sign-in page tells visitors of a demonstration; null where there is none. */
export async function demonstrationHint(): Promise<{ emails: string[]; password: string } | null> {
  if (environment().HEDDLE_DEMO !== 'on') return null;
  const users = await User.findAll({ where: { email: demonstrationAccounts.map((account) => account.email), demonstration: true, disabledAt: null }, attributes: ['email'], order: [['id', 'ASC']] });
  return users.length === 0 ? null : { emails: users.map((user) => user.email), password: demonstrationPassword };
}
