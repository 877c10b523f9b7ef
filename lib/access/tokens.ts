import { Op } from 'sequelize';

import { recordAudit } from '@/lib/access/audit';
import { type Actor } from '@/lib/access/permissions';
import { hashSecret, makeSecret } from '@/lib/access/secrets';
import { conflict, forbidden, notFound } from '@/lib/errors';
import { ApiToken } from '@/models/api-token';
import { User } from '@/models/user';

export interface TokenView {
  id: string;
  name: string;
  /** The secret's last four characters. */
  hint: string;
  createdAt: string;
  lastUsedAt: string | null;
  expiresAt: string | null;
}

const prefix = 'hdl_';
const mostTokens = 50;

function presentToken(token: ApiToken): TokenView {
  return {
    id: String(token.id),
    name: token.name,
    hint: token.hint,
    createdAt: token.createdAt.toISOString(),
    lastUsedAt: token.lastUsedAt?.toISOString() ?? null,
    expiresAt: token.expiresAt?.toISOString() ?? null,
  };
}

/** The owner of a token. Null when it is unknown, revoked or expired, or when its owner is disabled. Notes the use, at most once a minute. */
export async function actorOfToken(secret: string): Promise<Actor | null> {
  if (!secret.startsWith(prefix) || secret.length > 100) return null;
  const token = await ApiToken.findOne({ where: { tokenHash: hashSecret(secret), revokedAt: null } });
  const now = new Date();
  if (!token || (token.expiresAt && token.expiresAt <= now)) return null;
  const user = await User.findByPk(token.userId, { attributes: ['id', 'name', 'email', 'role', 'disabledAt'] });
  if (!user || user.disabledAt) return null;
  const minuteAgo = new Date(now.getTime() - 60_000);
  if (!token.lastUsedAt || token.lastUsedAt < minuteAgo) {
    await ApiToken.update({ lastUsedAt: now }, { where: { id: token.id, [Op.or]: [{ lastUsedAt: null }, { lastUsedAt: { [Op.lt]: minuteAgo } }] } });
  }
  return { userId: user.id, name: user.name, email: user.email, role: user.role, via: 'token' };
}

/** The person's own tokens that are not revoked, newest first. */
export async function listTokens(actor: Actor, { page, pageSize }: { page: number; pageSize: number }) {
  const { rows, count } = await ApiToken.findAndCountAll({ where: { userId: actor.userId, revokedAt: null }, order: [['id', 'DESC']], limit: pageSize, offset: (page - 1) * pageSize });
  return { items: rows.map(presentToken), total: count, page, pageSize };
}

/** Makes a token; the only time that its secret is given out. `expiresInDays` null: until revoked. */
export async function createToken(actor: Actor, { name, expiresInDays }: { name: string; expiresInDays: number | null }, headers: Headers): Promise<TokenView & { secret: string }> {
  // A token that could make others would outlive its own end.
  if (actor.via === 'token') throw forbidden('A token cannot make tokens. Sign in to make one.');
  if ((await ApiToken.count({ where: { userId: actor.userId, revokedAt: null } })) >= mostTokens) throw conflict(`You hold ${mostTokens} tokens. Revoke one that you no longer need first.`);
  const secret = prefix + makeSecret();
  const token = await ApiToken.create({
    userId: actor.userId,
    name,
    tokenHash: hashSecret(secret),
    hint: secret.slice(-4),
    expiresAt: expiresInDays === null ? null : new Date(Date.now() + expiresInDays * 86_400_000),
  });
  await recordAudit(actor, { headers }, { action: 'token.created', subjectType: 'token', subjectId: String(token.id), details: { name } });
  return { ...presentToken(token), secret };
}

/** Revokes one of the person's own tokens; 404 for anybody else's. */
export async function revokeToken(actor: Actor, tokenId: number, headers: Headers): Promise<void> {
  const [changed] = await ApiToken.update({ revokedAt: new Date() }, { where: { id: tokenId, userId: actor.userId, revokedAt: null } });
  if (changed === 0) throw notFound();
  await recordAudit(actor, { headers }, { action: 'token.revoked', subjectType: 'token', subjectId: String(tokenId) });
}
