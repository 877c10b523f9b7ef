import { Op } from 'sequelize';

import { recordAudit } from '@/lib/access/audit';
import { normaliseEmail } from '@/lib/access/email';
import { assertPassword, hashPassword, verifyPassword } from '@/lib/access/passwords';
import { type Actor } from '@/lib/access/permissions';
import { limitTries } from '@/lib/access/rate-limits';
import { hashSecret, makeSecret } from '@/lib/access/secrets';
import { type SessionClaims } from '@/lib/access/session';
import { accountBucket, limitTriesOfAddress } from '@/lib/access/sign-in';
import { database } from '@/lib/db/connection';
import { environment } from '@/lib/environment';
import { ExpectedError, invalid, notFound } from '@/lib/errors';
import { sendMail } from '@/lib/services/mail';
import { PasswordReset } from '@/models/password-reset';
import { User } from '@/models/user';

const resetHours = 2;
const resetsPerHour = 3;

export async function changeName(actor: Actor, name: string, headers: Headers): Promise<void> {
  await User.update({ name }, { where: { id: actor.userId } });
  await recordAudit(actor, { headers }, { action: 'user.renamed', subjectType: 'user', subjectId: String(actor.userId) });
}

/** Changes the person's own password and ends all their sessions; gives the claims of a new one for the browser that asked. */
export async function changePassword(actor: Actor, { current, password }: { current: string; password: string }, headers: Headers): Promise<SessionClaims> {
  await limitTries(accountBucket('password', actor.email), 10, 15 * 60);
  const user = await User.findByPk(actor.userId);
  if (!user) throw notFound();
  if (!(await verifyPassword(user.passwordHash, current))) {
    await recordAudit(actor, { headers }, { action: 'password.refused', subjectType: 'user', subjectId: String(user.id) });
    throw invalid('This is not your present password. Nothing was changed.', { current: 'This is not your present password.' });
  }
  assertPassword(password, user.email);
  await setPassword(user, password);
  await recordAudit(actor, { headers }, { action: 'password.changed', subjectType: 'user', subjectId: String(user.id) });
  return { userId: user.id, sessionVersion: user.sessionVersion };
}

async function setPassword(user: User, password: string): Promise<void> {
  await user.update({ passwordHash: await hashPassword(password) });
  // Counted in the database: two changes at once must both end the sessions made before.
  await user.increment('sessionVersion');
  await user.reload();
}

/** Mails a link for a new password when there is such an account. Says nothing either way, and looks the same from outside. */
export async function requestPasswordReset(email: string, headers: Headers): Promise<void> {
  await limitTriesOfAddress('reset', headers);
  const user = await User.findOne({ where: { email: normaliseEmail(email), disabledAt: null } });
  await recordAudit(null, { headers }, { action: 'password.reset-asked', ...(user ? { subjectType: 'user', subjectId: String(user.id) } : {}) });
  if (!user) return;
  try {
    await limitTries(accountBucket('reset', user.email), resetsPerHour, 3600);
  } catch (error) {
    // A full mailbox helps nobody; and an answer that differs would tell that the account exists.
    if (error instanceof ExpectedError) return;
    throw error;
  }
  const secret = makeSecret();
  await PasswordReset.create({ userId: user.id, tokenHash: hashSecret(secret), expiresAt: new Date(Date.now() + resetHours * 3_600_000) });
  await sendMail({
    to: user.email,
    subject: 'A new password for Heddle',
    text: `Dear ${user.name},\n\nsomebody, probably you, asked for a new password. Set one here within ${resetHours} hours:\n\n${environment().HEDDLE_URL}/reset-password/${secret}\n\nIf it was not you, there is nothing to do: the old password stays as it is.\n`,
  });
}

/** The row of a reset that can still be used. */
function openReset(secret: string) {
  return { tokenHash: hashSecret(secret), usedAt: null, expiresAt: { [Op.gt]: new Date() } };
}

/** Whose password a reset link changes, or null when it is unknown, used or too old. */
export async function findPasswordReset(secret: string): Promise<{ email: string } | null> {
  const reset = await PasswordReset.findOne({ where: openReset(secret) });
  const user = reset && (await User.findOne({ where: { id: reset.userId, disabledAt: null }, attributes: ['email'] }));
  return user && { email: user.email };
}

/** Sets the password through a reset link, once. Ends all sessions, and the person's other reset links. */
export async function resetPassword(secret: string, password: string, headers: Headers): Promise<SessionClaims> {
  await limitTriesOfAddress('reset', headers);
  const claims = await database().transaction(async (transaction) => {
    const reset = await PasswordReset.findOne({ where: openReset(secret), lock: true, transaction });
    const user = reset && (await User.findOne({ where: { id: reset.userId, disabledAt: null }, lock: true, transaction }));
    if (!user) throw new ExpectedError(410, 'gone', 'No longer valid', 'This link was used already or is too old. Ask for a new one.');
    assertPassword(password, user.email);
    await PasswordReset.update({ usedAt: new Date() }, { where: { userId: user.id, usedAt: null }, transaction });
    await user.update({ passwordHash: await hashPassword(password), sessionVersion: user.sessionVersion + 1 }, { transaction });
    return { userId: user.id, sessionVersion: user.sessionVersion };
  });
  await recordAudit({ userId: claims.userId }, { headers }, { action: 'password.reset', subjectType: 'user', subjectId: String(claims.userId) });
  return claims;
}
