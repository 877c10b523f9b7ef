import { UniqueConstraintError, type Transaction } from 'sequelize';

import { type Actor } from '@/lib/access/permissions';
import { type ColumnKind } from '@/lib/bibliography/readers/delimited-columns';
import { type Format } from '@/lib/bibliography/record';
import { database } from '@/lib/db/connection';
import { run } from '@/lib/db/bulk';
import { conflict } from '@/lib/errors';
import { moveImportOrRefuse } from '@/lib/imports/states';
import { rememberColumns } from '@/lib/imports/table-columns';
import { enqueue, requestCancel } from '@/lib/jobs/queue';
import { type Import } from '@/models/import';

async function claiming<Result>(row: Import, work: (transaction: Transaction) => Promise<Result>): Promise<Result> {
  try {
    return await database().transaction(work);
  } catch (error) {
    if (error instanceof UniqueConstraintError) throw conflict(`The same file stands in this portfolio already, in a later import. Undo or set that one aside first.`, { sha256: row.sha256 });
    throw error;
  }
}

/** Accepts an import: also one that was set aside or undone before. */
export async function acceptImport(actor: Actor, row: Import): Promise<void> {
  await claiming(row, async (transaction) => {
    await moveImportOrRefuse(row, ['review', 'set-aside', 'undone'], 'accepting', { error: null, standing: row.sha256 }, transaction);
    await enqueue('import.accept', { importId: row.id, userId: actor.userId }, { portfolioId: row.portfolioId, createdById: actor.userId, transaction });
  });
}

/** Sets an import aside: it stays readable and can still be accepted. An import that is still being read stops. */
export async function setImportAside(row: Import): Promise<void> {
  await database().transaction(async (transaction) => {
    await moveImportOrRefuse(row, ['review', 'uploaded', 'failed'], 'set-aside', { standing: null }, transaction);
  });
}

export async function undoImport(actor: Actor, row: Import): Promise<void> {
  await database().transaction(async (transaction) => {
    await moveImportOrRefuse(row, ['accepted'], 'undoing', { error: null }, transaction);
    await enqueue('import.undo', { importId: row.id, userId: actor.userId }, { portfolioId: row.portfolioId, createdById: actor.userId, transaction });
  });
}

/** Reads the stored file again, in another format or encoding, or with columns told by a person. What was read before is dropped; nothing of it was catalogued. */
export async function readImportAgain(actor: Actor, row: Import, choice: { format?: Format | null; encoding?: string | null; columns?: (ColumnKind | null)[] | null }): Promise<void> {
  if (choice.columns) await rememberColumns(actor.userId, row, choice.columns);
  await claiming(row, async (transaction) => {
    await moveImportOrRefuse(row, ['review', 'set-aside', 'undone', 'failed'], 'uploaded', { error: null, counts: null, standing: row.sha256, chosenFormat: choice.format ?? null, encoding: choice.encoding ?? null, columns: choice.columns ?? null }, transaction);
    await run(transaction, 'DELETE FROM import_records WHERE importId = ?', [row.id]);
    await run(transaction, 'DELETE FROM import_problems WHERE importId = ?', [row.id]);
    await enqueue('import.read', { importId: row.id }, { portfolioId: row.portfolioId, createdById: actor.userId, transaction });
  });
}

/** Asks a reading that runs to stop. */
export async function cancelImport(row: Import): Promise<void> {
  await requestCancel('import.read', 'importId', row.id);
}
