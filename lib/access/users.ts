import { Op, type WhereOptions } from 'sequelize';

import { recordAudit } from '@/lib/access/audit';
import { escapeLike } from '@/lib/access/escape-like';
import { type Actor, type Role } from '@/lib/access/permissions';
import { database } from '@/lib/db/connection';
import { conflict, notFound } from '@/lib/errors';
import { User } from '@/models/user';

export interface UserView {
  id: string;
  name: string;
  email: string;
  role: Role;
  disabled: boolean;
  demonstration: boolean;
  lastSignInAt: string | null;
  createdAt: string;
}

export interface PersonView {
  id: string;
  name: string;
  email: string;
  role: Role;
}

export const userSorts = ['name', 'email', 'role', 'lastSignInAt', 'createdAt'] as const;

export interface UserChanges {
  name?: string;
  role?: Role;
  disabled?: boolean;
}

function presentUser(user: User): UserView {
  return {
    id: String(user.id),
    name: user.name,
    email: user.email,
    role: user.role,
    disabled: user.disabledAt !== null,
    demonstration: user.demonstration,
    lastSignInAt: user.lastSignInAt?.toISOString() ?? null,
    createdAt: user.createdAt.toISOString(),
  };
}

function matching(q: string | undefined): WhereOptions {
  if (!q) return {};
  const pattern = { [Op.like]: `%${escapeLike(q)}%` };
  return { [Op.or]: [{ name: pattern }, { email: { [Op.like]: `%${escapeLike(q.toLowerCase())}%` } }] };
}

interface UserQuery {
  page: number;
  pageSize: number;
  q?: string;
  role?: Role;
  sort: { field: (typeof userSorts)[number]; descending: boolean };
}

/** All accounts, disabled ones too. */
export async function listUsers({ page, pageSize, q, role, sort }: UserQuery) {
  const { rows, count } = await User.findAndCountAll({
    where: { ...matching(q), ...(role ? { role } : {}) },
    order: [[sort.field, sort.descending ? 'DESC' : 'ASC'], ['id', 'ASC']],
    limit: pageSize,
    offset: (page - 1) * pageSize,
  });
  return { items: rows.map(presentUser), total: count, page, pageSize };
}

/** People who can be given a portfolio, by name. */
export async function findPeople({ page, pageSize, q }: { page: number; pageSize: number; q?: string }) {
  const { rows, count } = await User.findAndCountAll({
    where: { disabledAt: null, ...matching(q) },
    attributes: ['id', 'name', 'email', 'role'],
    order: [['name', 'ASC'], ['id', 'ASC']],
    limit: pageSize,
    offset: (page - 1) * pageSize,
  });
  const items: PersonView[] = rows.map((user) => ({ id: String(user.id), name: user.name, email: user.email, role: user.role }));
  return { items, total: count, page, pageSize };
}

export async function getUser(userId: number): Promise<UserView | null> {
  const user = await User.findByPk(userId);
  return user && presentUser(user);
}

/**
 * Changes name, role or access of an account. Disabling ends its sessions and its tokens at once. The service always keeps
 * an administrator, and nobody shuts themselves out: 409.
 */
export async function changeUser(actor: Actor, userId: number, changes: UserChanges, headers: Headers): Promise<UserView> {
  const { user, before } = await database().transaction(async (transaction) => {
    // All administrators are locked, in order: two of them who demote each other at once must not both succeed.
    const administrators = await User.findAll({ where: { role: 'administrator', disabledAt: null }, attributes: ['id'], order: [['id', 'ASC']], lock: true, transaction });
    const user = await User.findByPk(userId, { lock: true, transaction });
    if (!user) throw notFound();
    const before = presentUser(user);
    const leaves = (changes.role !== undefined && changes.role !== 'administrator') || changes.disabled === true;
    const isAdministrator = user.role === 'administrator' && user.disabledAt === null;
    if (isAdministrator && leaves && administrators.length === 1) throw conflict('This is the last administrator. Make somebody else administrator first.');
    if (user.id === actor.userId && changes.disabled) throw conflict('You cannot disable your own account. Ask another administrator.');
    const disabling = changes.disabled === true && user.disabledAt === null;
    await user.update(
      {
        ...(changes.name === undefined ? {} : { name: changes.name }),
        ...(changes.role === undefined ? {} : { role: changes.role }),
        ...(changes.disabled === undefined ? {} : { disabledAt: changes.disabled ? (user.disabledAt ?? new Date()) : null }),
        // So that sessions from before stay ended when the account is enabled again.
        ...(disabling ? { sessionVersion: user.sessionVersion + 1 } : {}),
      },
      { transaction },
    );
    return { user, before };
  });
  const subject = { subjectType: 'user', subjectId: String(user.id) };
  const after = presentUser(user);
  if (before.role !== after.role) await recordAudit(actor, { headers }, { action: 'user.role-changed', ...subject, details: { from: before.role, to: after.role } });
  if (before.disabled !== after.disabled) await recordAudit(actor, { headers }, { action: after.disabled ? 'user.disabled' : 'user.enabled', ...subject });
  if (before.name !== after.name) await recordAudit(actor, { headers }, { action: 'user.renamed', ...subject });
  return after;
}
