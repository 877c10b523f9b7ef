import { afterAll, describe, expect, it } from 'vitest';

import { changePassword, findPasswordReset, requestPasswordReset, resetPassword } from '@/lib/access/accounts';
import { acceptInvitation, createInvitation, findInvitation, revokeInvitation } from '@/lib/access/invitations';
import { type Actor } from '@/lib/access/permissions';
import { hashSecret } from '@/lib/access/secrets';
import { actorOfClaims } from '@/lib/access/session';
import { authenticate } from '@/lib/access/sign-in';
import { closeDatabase } from '@/lib/db/connection';
import { environment } from '@/lib/environment';
import { Invitation } from '@/models/invitation';
import { OutgoingMail } from '@/models/outgoing-mail';
import { PasswordReset } from '@/models/password-reset';
import { User } from '@/models/user';
import { createUser, testPassword, unique } from '../factories';

afterAll(closeDatabase);

const nowhere = new Headers();
const newPassword = 'eight blue kettles';

function actorOf(user: User): Actor {
  return { userId: user.id, name: user.name, email: user.email, role: user.role, via: 'session' };
}

/** The secret in the link of the newest mail to this address. */
async function mailedSecret(email: string): Promise<string> {
  const mail = await OutgoingMail.findOne({ where: { recipient: email }, order: [['id', 'DESC']] });
  const link = new RegExp(`${environment().HEDDLE_URL}/(?:reset-password|invitation)/([\\w-]+)`).exec(mail?.body ?? '');
  if (!link) throw new Error(`no link was mailed to ${email}`);
  return link[1];
}

describe('changing the password', () => {
  it('needs the present one, and twelve characters that are neither the address nor among the commonest', async () => {
    const user = await createUser('reader');
    await expect(changePassword(actorOf(user), { current: 'not it', password: newPassword }, nowhere)).rejects.toMatchObject({ status: 422, extra: { errors: { current: expect.any(String) } } });
    for (const password of ['short words', user.email, 'passwordpassword', 'aaaaaaaaaaaaaaaa']) {
      await expect(changePassword(actorOf(user), { current: testPassword, password }, nowhere)).rejects.toMatchObject({ status: 422, extra: { errors: { password: expect.any(String) } } });
    }
    expect(await authenticate(user.email, testPassword, nowhere)).not.toBeNull();
  });

  it('keeps an argon2id hash', async () => {
    const user = await createUser('reader');
    await changePassword(actorOf(user), { current: testPassword, password: newPassword }, nowhere);
    await user.reload();
    expect(user.passwordHash).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/);
    expect(await authenticate(user.email, newPassword, nowhere)).toMatchObject({ userId: user.id });
  });
});

describe('resetting the password', () => {
  it('mails a link that sets it once, ends all sessions and keeps only a hash of the secret', async () => {
    const user = await createUser('reader');
    await requestPasswordReset(` ${user.email.toUpperCase()} `, nowhere);
    const secret = await mailedSecret(user.email);
    expect(await findPasswordReset(secret)).toEqual({ email: user.email });
    expect(await PasswordReset.count({ where: { userId: user.id, tokenHash: hashSecret(secret) } })).toBe(1);
    await expect(resetPassword(secret, 'too short', nowhere)).rejects.toMatchObject({ status: 422 });
    const claims = await resetPassword(secret, newPassword, nowhere);
    expect(await actorOfClaims(claims)).toMatchObject({ userId: user.id });
    expect(await actorOfClaims({ userId: user.id, sessionVersion: 0 })).toBeNull();
    await expect(resetPassword(secret, 'nine green lanterns', nowhere)).rejects.toMatchObject({ status: 410 });
    expect(await findPasswordReset(secret)).toBeNull();
    expect(await authenticate(user.email, newPassword, nowhere)).toMatchObject({ userId: user.id });
  });

  it('lets only one of two uses at the same moment through', async () => {
    const user = await createUser('reader');
    await requestPasswordReset(user.email, nowhere);
    const secret = await mailedSecret(user.email);
    const outcomes = await Promise.allSettled([resetPassword(secret, newPassword, nowhere), resetPassword(secret, 'nine green lanterns', nowhere)]);
    expect(outcomes.map((outcome) => outcome.status).sort()).toEqual(['fulfilled', 'rejected']);
  });

  it('refuses links that are too old or made up', async () => {
    const user = await createUser('reader');
    await PasswordReset.create({ userId: user.id, tokenHash: hashSecret('an-old-secret' + user.id), expiresAt: new Date(Date.now() - 1000) });
    for (const secret of ['an-old-secret' + user.id, unique('made-up')]) await expect(resetPassword(secret, newPassword, nowhere)).rejects.toMatchObject({ status: 410 });
  });

  it('answers alike for unknown and disabled accounts, and mails them nothing', async () => {
    const disabled = await createUser('reader', { disabledAt: new Date() });
    for (const email of [disabled.email, `${unique()}@test.example`]) {
      await expect(requestPasswordReset(email, nowhere)).resolves.toBeUndefined();
      expect(await OutgoingMail.count({ where: { recipient: email } })).toBe(0);
    }
  });

  it('mails at most three links an hour, and goes on answering alike', async () => {
    const user = await createUser('reader');
    for (let index = 0; index < 5; index += 1) await requestPasswordReset(user.email, nowhere);
    expect(await OutgoingMail.count({ where: { recipient: user.email } })).toBe(3);
  });
});

describe('an invitation', () => {
  const invite = async (email = `${unique()}@test.example`) => {
    const administrator = actorOf(await createUser('administrator'));
    const invitation = await createInvitation(administrator, { email, name: 'Nela Sorn', role: 'evaluator' }, nowhere);
    return { administrator, invitation, email, secret: await mailedSecret(email) };
  };

  it('makes the account with its role, once, and signs in', async () => {
    const { email, secret } = await invite();
    expect(await findInvitation(secret)).toEqual({ email, name: 'Nela Sorn', role: 'evaluator' });
    await expect(acceptInvitation(secret, { name: 'Nela', password: 'short' }, nowhere)).rejects.toMatchObject({ status: 422 });
    const outcomes = await Promise.allSettled([1, 2].map(() => acceptInvitation(secret, { name: 'Nela', password: newPassword }, nowhere)));
    expect(outcomes.filter((outcome) => outcome.status === 'fulfilled')).toHaveLength(1);
    const user = await User.findOne({ where: { email } });
    expect(user).toMatchObject({ role: 'evaluator', name: 'Nela' });
    expect(await actorOfClaims({ userId: user!.id, sessionVersion: 0 })).toMatchObject({ email });
    expect(await findInvitation(secret)).toBeNull();
  });

  it('is of no use once taken back, expired or replaced by a newer one', async () => {
    const revoked = await invite();
    await revokeInvitation(revoked.administrator, Number(revoked.invitation.id), nowhere);
    const expired = await invite();
    await Invitation.update({ expiresAt: new Date(Date.now() - 1000) }, { where: { id: Number(expired.invitation.id) } });
    const replaced = await invite();
    await invite(replaced.email);
    for (const { secret, email } of [revoked, expired, replaced]) {
      expect(await findInvitation(secret)).toBeNull();
      await expect(acceptInvitation(secret, { name: 'Nela', password: newPassword }, nowhere)).rejects.toMatchObject({ status: 410 });
      expect(await User.count({ where: { email } })).toBe(0);
    }
    await expect(revokeInvitation(revoked.administrator, Number(revoked.invitation.id), nowhere)).rejects.toMatchObject({ status: 404 });
  });

  it('is not made for somebody who has an account', async () => {
    const user = await createUser('reader');
    await expect(invite(user.email)).rejects.toMatchObject({ status: 409 });
  });
});
