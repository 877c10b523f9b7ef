import { setTimeout as sleep } from 'node:timers/promises';
import { Readable } from 'node:stream';

import { run, select } from '@/lib/db/bulk';
import { receiveUpload } from '@/lib/imports/uploads';
import { acceptImport, undoImport } from '@/lib/imports/decide';
import { claim } from '@/lib/jobs/queue';
import { runJob } from '@/lib/jobs/run-job';
import { type Actor } from '@/lib/access/permissions';
import { type Import } from '@/models/import';
import { Job } from '@/models/job';

/** Does in this process what the worker does, until the queue is empty. */
export async function workOff(): Promise<void> {
  for (;;) {
    const job = await claim();
    if (job) await runJob(job);
    else if ((await Job.count({ where: { state: ['queued', 'running'] } })) === 0) return;
    else await sleep(50);
  }
}

export async function upload(actor: Actor, portfolioId: number, name: string, content: string | Buffer, options: Parameters<typeof receiveUpload>[3] = {}): Promise<Import> {
  const { row } = await receiveUpload(actor, portfolioId, { name, content: Readable.from([Buffer.from(content)]) }, options);
  await workOff();
  return row.reload();
}

export async function accept(actor: Actor, row: Import): Promise<Import> {
  await acceptImport(actor, await row.reload());
  await workOff();
  return row.reload();
}

export async function undo(actor: Actor, row: Import): Promise<Import> {
  await undoImport(actor, await row.reload());
  await workOff();
  return row.reload();
}

/** Everything that derives from accepted records, by natural keys: equal for two databases whose catalogues are equal. */
export async function dumpCatalogue(): Promise<Record<string, unknown[]>> {
  return {
    works: await select(
      null,
      `SELECT HEX(workKey) AS workKey, catalogued, type, title, titleSort, authors, authorsLabel, firstFamily, year, venue, volume, issue, firstPage, lastPage, articleNumber, publisher, doi, identifiers,
       abstract, keywords, language, url, retracted, recordCount, referenceCount, citingCount, citedCount FROM works ORDER BY workKey`,
    ),
    citations: await select(
      null,
      `SELECT HEX(citing.workKey) AS citing, HEX(cited.workKey) AS cited, citation.referenceCount
       FROM citations citation JOIN works citing ON citing.id = citation.citingWorkId JOIN works cited ON cited.id = citation.citedWorkId ORDER BY 1, 2`,
    ),
    members: await select(
      null,
      `SELECT portfolio.name, HEX(work.workKey) AS work, membership.membership FROM portfolio_works membership
       JOIN portfolios portfolio ON portfolio.id = membership.portfolioId JOIN works work ON work.id = membership.workId ORDER BY 1, 2`,
    ),
    variants: await select(
      null,
      `SELECT HEX(variant.hash) AS hash, variant.standing, variant.how, HEX(work.workKey) AS work FROM reference_variants variant LEFT JOIN works work ON work.id = variant.workId WHERE variant.standing <> 0 ORDER BY 1`,
    ),
    astray: await select(
      null,
      `SELECT HEX(variant.hash) AS hash FROM reference_variants variant LEFT JOIN works work ON work.id = variant.workId
       WHERE variant.workId IS NOT NULL AND (work.id IS NULL OR variant.standing = 0) ORDER BY 1`,
    ),
    texts: await select(null, 'SELECT HEX(work.workKey) AS work, text.content FROM work_texts text JOIN works work ON work.id = text.workId ORDER BY 1'),
  };
}

/** Empties everything that imports fill. Only ever called on the test database. */
export async function emptyCatalogue(): Promise<void> {
  for (const table of ['jobs', 'matches', 'citations', 'cited_references', 'record_keys', 'import_problems', 'import_records', 'imports', 'reference_variants', 'portfolio_works', 'work_texts', 'analyses', 'works']) await run(null, `DELETE FROM ${table}`);
}
