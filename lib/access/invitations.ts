import { Op, UniqueConstraintError } from 'sequelize';

import { recordAudit } from '@/lib/access/audit';
import { assertPassword, hashPassword } from '@/lib/access/passwords';
import { type Actor, type Role } from '@/lib/access/permissions';
import { hashSecret, makeSecret } from '@/lib/access/secrets';
import { type SessionClaims } from '@/lib/access/session';
import { limitTriesOfAddress } from '@/lib/access/sign-in';
import { database } from '@/lib/db/connection';
import { environment } from '@/lib/environment';
import { conflict, ExpectedError, notFound } from '@/lib/errors';
import { sendMail } from '@/lib/services/mail';
import { Invitation } from '@/models/invitation';
import { User } from '@/models/user';

const invitationDays = 14;

export interface InvitationView {
  id: string;
  email: string;
  name: string;
  role: Role;
  state: 'open' | 'accepted' | 'revoked' | 'expired';
  createdAt: string;
  expiresAt: string;
}

function presentInvitation(invitation: Invitation): InvitationView {
  const state = invitation.acceptedAt ? 'accepted' : invitation.revokedAt ? 'revoked' : invitation.expiresAt <= new Date() ? 'expired' : 'open';
  return {
    id: String(invitation.id),
    email: invitation.email,
    name: invitation.name,
    role: invitation.role,
    state,
    createdAt: invitation.createdAt.toISOString(),
    expiresAt: invitation.expiresAt.toISOString(),
  };
}

const open = () => ({ acceptedAt: null, revokedAt: null, expiresAt: { [Op.gt]: new Date() } });
const gone = () => new ExpectedError(410, 'gone', 'No longer valid', 'This invitation was used, taken back or is too old. Ask whoever invited you for a new one.');

/** Invitations, newest first; those that can still be accepted, or all. */
export async function listInvitations({ page, pageSize, state }: { page: number; pageSize: number; state: 'open' | 'all' }) {
  const { rows, count } = await Invitation.findAndCountAll({ where: state === 'open' ? open() : {}, order: [['id', 'DESC']], limit: pageSize, offset: (page - 1) * pageSize });
  return { items: rows.map(presentInvitation), total: count, page, pageSize };
}

/** Invites somebody by mail. An earlier open invitation to the same address is taken back: the newest names the role. */
export async function createInvitation(actor: Actor, { email, name, role }: { email: string; name: string; role: Role }, headers: Headers): Promise<InvitationView> {
  const secret = makeSecret();
  const invitation = await database().transaction(async (transaction) => {
    if (await User.findOne({ where: { email }, attributes: ['id'], transaction })) throw conflict('Somebody with this e-mail address has an account already.', { errors: { email: 'Has an account already.' } });
    await Invitation.update({ revokedAt: new Date() }, { where: { email, ...open() }, transaction });
    return Invitation.create(
      { email, name, role, tokenHash: hashSecret(secret), invitedById: actor.userId, expiresAt: new Date(Date.now() + invitationDays * 86_400_000) },
      { transaction },
    );
  });
  await sendMail({
    to: email,
    subject: 'Your invitation to Heddle',
    text: `Dear ${name},\n\n${actor.name} invites you to Heddle as ${role}. Choose a password here within ${invitationDays} days:\n\n${environment().HEDDLE_URL}/invitation/${secret}\n`,
  });
  await recordAudit(actor, { headers }, { action: 'invitation.created', subjectType: 'invitation', subjectId: String(invitation.id), details: { email, role } });
  return presentInvitation(invitation);
}

export async function revokeInvitation(actor: Actor, invitationId: number, headers: Headers): Promise<void> {
  const [changed] = await Invitation.update({ revokedAt: new Date() }, { where: { id: invitationId, ...open() } });
  if (changed === 0) throw notFound('There is no open invitation with this id.');
  await recordAudit(actor, { headers }, { action: 'invitation.revoked', subjectType: 'invitation', subjectId: String(invitationId) });
}

/** Whom an invitation's link invites, or null when it can no longer be accepted. */
export async function findInvitation(secret: string): Promise<{ email: string; name: string; role: Role } | null> {
  const invitation = await Invitation.findOne({ where: { tokenHash: hashSecret(secret), ...open() } });
  return invitation && { email: invitation.email, name: invitation.name, role: invitation.role };
}

/** Makes the account, once; the row stays locked meanwhile, so that a link opened twice makes one. */
export async function acceptInvitation(secret: string, { name, password }: { name: string; password: string }, headers: Headers): Promise<SessionClaims> {
  await limitTriesOfAddress('invitation', headers);
  try {
    const claims = await database().transaction(async (transaction) => {
      const invitation = await Invitation.findOne({ where: { tokenHash: hashSecret(secret), ...open() }, lock: true, transaction });
      if (!invitation) throw gone();
      assertPassword(password, invitation.email);
      const user = await User.create({ email: invitation.email, name, role: invitation.role, passwordHash: await hashPassword(password), lastSignInAt: new Date() }, { transaction });
      await invitation.update({ acceptedAt: new Date() }, { transaction });
      return { userId: user.id, sessionVersion: user.sessionVersion };
    });
    await recordAudit({ userId: claims.userId }, { headers }, { action: 'invitation.accepted', subjectType: 'user', subjectId: String(claims.userId) });
    return claims;
  } catch (error) {
    if (error instanceof UniqueConstraintError) throw conflict('You have an account already: sign in with it.');
    throw error;
  }
}
