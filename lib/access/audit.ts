import { Op, type WhereOptions } from 'sequelize';

import { clientAddress } from '@/lib/access/client-address';
import { escapeLike } from '@/lib/access/escape-like';
import { type Actor } from '@/lib/access/permissions';
import { AuditEvent } from '@/models/audit-event';
import { User } from '@/models/user';

export interface AuditEntry {
  /** Subject and past deed, e.g. 'portfolio.created'. */
  action: string;
  subjectType?: string;
  subjectId?: string;
  portfolioId?: number;
  /** Plain values; never a secret. */
  details?: Record<string, unknown>;
}

export interface AuditView {
  id: string;
  at: string;
  action: string;
  person: { id: string; name: string } | null;
  subjectType: string | null;
  subjectId: string | null;
  portfolioId: string | null;
  address: string | null;
  details: Record<string, unknown> | null;
}

/** Writes down who did what. `actor` null: nobody was signed in. `request` null: the service did it by itself. */
export async function recordAudit(actor: Pick<Actor, 'userId'> | null, request: { headers: Headers } | null, entry: AuditEntry): Promise<void> {
  await AuditEvent.create({
    userId: actor?.userId ?? null,
    action: entry.action,
    subjectType: entry.subjectType ?? null,
    subjectId: entry.subjectId ?? null,
    portfolioId: entry.portfolioId ?? null,
    address: request ? clientAddress(request.headers) : null,
    details: entry.details ?? null,
  });
}

/** The log, newest first; `q` is matched with the beginning of the action. */
export async function listAudit({ page, pageSize, q, userId }: { page: number; pageSize: number; q?: string; userId?: number }) {
  const where: WhereOptions = {
    ...(q ? { action: { [Op.like]: `${escapeLike(q.toLowerCase())}%` } } : {}),
    ...(userId ? { userId } : {}),
  };
  const { rows, count } = await AuditEvent.findAndCountAll({ where, order: [['createdAt', 'DESC'], ['id', 'DESC']], limit: pageSize, offset: (page - 1) * pageSize });
  const users = await User.findAll({ where: { id: [...new Set(rows.flatMap((row) => row.userId ?? []))] }, attributes: ['id', 'name'] });
  const names = new Map(users.map((user) => [user.id, user.name]));
  const items: AuditView[] = rows.map((row) => ({
    id: String(row.id),
    at: row.createdAt.toISOString(),
    action: row.action,
    person: row.userId === null ? null : { id: String(row.userId), name: names.get(row.userId) ?? 'Removed person' },
    subjectType: row.subjectType,
    subjectId: row.subjectId,
    portfolioId: row.portfolioId === null ? null : String(row.portfolioId),
    address: row.address,
    details: row.details,
  }));
  return { items, total: count, page, pageSize };
}
