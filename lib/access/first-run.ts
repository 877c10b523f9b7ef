import { QueryTypes } from 'sequelize';

import { recordAudit } from '@/lib/access/audit';
import { assertPassword, hashPassword } from '@/lib/access/passwords';
import { type SessionClaims } from '@/lib/access/session';
import { limitTriesOfAddress } from '@/lib/access/sign-in';
import { database } from '@/lib/db/connection';
import { ExpectedError } from '@/lib/errors';
import { User } from '@/models/user';

/** Whether the service has nobody yet, so that the first person to come becomes its administrator. */
export async function needsFirstRun(): Promise<boolean> {
  return (await User.findOne({ attributes: ['id'] })) === null;
}

/**
 * Makes the administrator of a service without any user, and nothing ever after. Two requests at the same moment would both count
 * no users; they queue up at one row of `locks` instead.
 */
export async function createFirstAdministrator(person: { email: string; name: string; password: string }, headers: Headers): Promise<SessionClaims> {
  await limitTriesOfAddress('first-run', headers);
  assertPassword(person.password, person.email);
  const passwordHash = await hashPassword(person.password);
  const claims = await database().transaction(async (transaction) => {
    await database().query("INSERT IGNORE INTO locks (name) VALUES ('first-run')", { transaction });
    await database().query("SELECT name FROM locks WHERE name = 'first-run' FOR UPDATE", { type: QueryTypes.SELECT, transaction });
    if (await User.findOne({ attributes: ['id'], transaction })) throw new ExpectedError(410, 'gone', 'No longer valid', 'This service has its administrator already. Sign in, or ask for an invitation.');
    const user = await User.create({ email: person.email, name: person.name, role: 'administrator', passwordHash, lastSignInAt: new Date() }, { transaction });
    return { userId: user.id, sessionVersion: user.sessionVersion };
  });
  await recordAudit({ userId: claims.userId }, { headers }, { action: 'service.first-run', subjectType: 'user', subjectId: String(claims.userId) });
  return claims;
}
