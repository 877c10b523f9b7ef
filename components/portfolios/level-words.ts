import { type GrantLevel, type Role } from '@/lib/access/permissions';

export const levelWords: Record<GrantLevel, string> = { view: 'may look', contribute: 'may contribute', manage: 'manages' };

export const roleWords: Record<Role, string> = { administrator: 'administrator', librarian: 'librarian', evaluator: 'evaluator', author: 'author', reader: 'reader' };

/** "2016–2025", "from 2016", "to 2025", or null. */
export function periodWords(from: number | null, to: number | null): string | null {
  if (from !== null && to !== null) return from === to ? String(from) : `${from}–${to}`;
  if (from !== null) return `from ${from}`;
  return to === null ? null : `to ${to}`;
}
