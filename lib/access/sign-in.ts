import { createHash } from 'node:crypto';

import { recordAudit } from '@/lib/access/audit';
import { clientAddress } from '@/lib/access/client-address';
import { normaliseEmail } from '@/lib/access/email';
import { verifyPassword } from '@/lib/access/passwords';
import { forgetTries, limitTries } from '@/lib/access/rate-limits';
import { type SessionClaims } from '@/lib/access/session';
import { environment } from '@/lib/environment';
import { User } from '@/models/user';

export const triesWindowSeconds = 15 * 60;
export const triesPerAccount = 10;

/** One answer for an unknown account, a wrong password and a disabled account: it tells nobody which accounts exist. */
export const signInRefusal = 'E-mail or password is not right.';

function triesPerAddress(): number {
  const { HEDDLE_TEST, HEDDLE_TEST_TRIES_PER_ADDRESS } = environment();
  return HEDDLE_TEST === '1' ? HEDDLE_TEST_TRIES_PER_ADDRESS : 50;
}

/** Bucket of a person's tries: a hash, since buckets are short ASCII and e-mail addresses are neither. */
export function accountBucket(kind: string, email: string): string {
  return `${kind}:account:${createHash('sha256').update(normaliseEmail(email)).digest('hex')}`;
}

/** Counts a try from the client's address; 429 beyond the limit, which all kinds of tries without a session share per kind. */
export async function limitTriesOfAddress(kind: string, headers: Headers): Promise<void> {
  await limitTries(`${kind}:address:${clientAddress(headers) ?? 'unknown'}`, triesPerAddress(), triesWindowSeconds);
}

/**
 * Checks e-mail and password. Null when they do not open an account; 429 (ExpectedError) after too many tries, before the
 * password is looked at, so that a right guess beyond the limit is not told from a wrong one.
 */
export async function authenticate(email: string, password: string, headers: Headers): Promise<SessionClaims | null> {
  const bucket = accountBucket('sign-in', email);
  await limitTriesOfAddress('sign-in', headers);
  await limitTries(bucket, triesPerAccount, triesWindowSeconds);
  const user = email.length > 254 ? null : await User.findOne({ where: { email: normaliseEmail(email) } });
  const fits = await verifyPassword(user?.passwordHash ?? null, password);
  if (!user || !fits || user.disabledAt) {
    const reason = !user ? 'unknown account' : fits ? 'disabled account' : 'wrong password';
    // The typed address stays out of the log: people type passwords into the wrong field.
    await recordAudit(null, { headers }, { action: 'session.refused', ...(user ? { subjectType: 'user', subjectId: String(user.id) } : {}), details: { reason } });
    return null;
  }
  await forgetTries(bucket);
  await User.update({ lastSignInAt: new Date() }, { where: { id: user.id }, silent: true });
  await recordAudit({ userId: user.id }, { headers }, { action: 'session.started' });
  return { userId: user.id, sessionVersion: user.sessionVersion };
}
