import { changeCatalogue } from '@/lib/catalogue/apply';
import { catalogueVersion, lockCatalogue } from '@/lib/catalogue/lock';
import { database } from '@/lib/db/connection';
import { run } from '@/lib/db/bulk';
import { checkImport, countImport } from '@/lib/imports/check';
import { readImport } from '@/lib/imports/read';
import { moveImport } from '@/lib/imports/states';
import { type JobHandler } from '@/lib/jobs/handlers';
import { enqueue, type ClaimedJob, type JobPayloads } from '@/lib/jobs/queue';
import { Import } from '@/models/import';

type ImportJob = 'import.read' | 'import.accept' | 'import.undo';

const idOf = (job: ClaimedJob) => (job.payload as JobPayloads[ImportJob]).importId;

async function copyProgress(job: ClaimedJob, stage: string, done: number, total: number): Promise<void> {
  await run(null, 'UPDATE imports SET progressStage = ?, progressDone = ?, progressTotal = ? WHERE id = ?', [stage, Math.round(done), Math.round(total), idOf(job)]);
}

/** Reads the file and settles what each of its records would do. */
export const importReadJob: JobHandler = {
  progress: copyProgress,
  async run(context) {
    const row = await Import.findByPk(idOf(context.job));
    if (!row || !['uploaded', 'reading', 'checking'].includes(row.state)) return;
    if (row.state === 'uploaded') await moveImport(row.id, ['uploaded'], 'reading', { startedAt: new Date() });
    await context.progress('reading', 0, row.bytes);
    if (row.state !== 'checking') await readImport(row, context);
    await moveImport(row.id, ['reading', 'checking'], 'checking');
    await context.progress('checking', 0, 1);
    await database().transaction(async (transaction) => {
      const checkedVersion = await catalogueVersion(transaction);
      await checkImport(transaction, row.id);
      const counts = await countImport(transaction, row.id);
      await moveImport(row.id, ['checking'], row.autoAccept ? 'accepting' : 'review', { counts, checkedVersion }, transaction);
      if (row.autoAccept) await enqueue('import.accept', { importId: row.id, userId: row.uploadedById }, { portfolioId: row.portfolioId, createdById: row.uploadedById, transaction });
    });
  },
  async ended(job, how, message) {
    await moveImport(idOf(job), ['uploaded', 'reading', 'checking'], 'failed', { error: how === 'cancelled' ? 'Reading was cancelled.' : message, standing: null });
  },
};

/** Catalogues the records. Checked again first, under the catalogue's lock, when another change has come between. */
export const importAcceptJob: JobHandler = {
  progress: copyProgress,
  async run(context) {
    const importId = idOf(context.job);
    const row = await Import.findByPk(importId);
    if (!row || row.state !== 'accepting') return;
    await database().transaction(async (transaction) => {
      if ((await lockCatalogue(transaction)) !== row.checkedVersion) await checkImport(transaction, importId);
      await changeCatalogue(transaction, { kind: 'accept', importId }, context.progress);
      const counts = await countImport(transaction, importId);
      await moveImport(importId, ['accepting'], 'accepted', { counts, acceptedAt: new Date(), acceptedById: (context.job.payload as JobPayloads['import.accept']).userId, undoneAt: null }, transaction);
    });
  },
  async ended(job, how, message) {
    await moveImport(idOf(job), ['accepting'], 'review', { error: how === 'cancelled' ? null : `Accepting did not succeed, and nothing was catalogued. ${message ?? ''}` });
  },
};

/** Takes an accepted import out of the catalogue again; its records are kept and can be accepted once more. */
export const importUndoJob: JobHandler = {
  progress: copyProgress,
  async run(context) {
    const importId = idOf(context.job);
    const row = await Import.findByPk(importId);
    if (!row || row.state !== 'undoing') return;
    await database().transaction(async (transaction) => {
      await changeCatalogue(transaction, { kind: 'withdraw', importId }, context.progress);
      await moveImport(importId, ['undoing'], 'undone', { undoneAt: new Date(), standing: null }, transaction);
    });
  },
  async ended(job, how, message) {
    await moveImport(idOf(job), ['undoing'], 'accepted', { error: how === 'cancelled' ? null : `Undoing did not succeed, and nothing was changed. ${message ?? ''}` });
  },
};
