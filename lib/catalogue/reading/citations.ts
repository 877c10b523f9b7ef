import { type Actor } from '@/lib/access/permissions';
import { type Page } from '@/lib/api/schemas';
import { type WorkListItem, type WorkReferenceView } from '@/lib/api/types';
import { visiblePortfolios, visibleWork } from '@/lib/catalogue/reading/visibility';
import { presentWorks } from '@/lib/catalogue/reading/work-items';
import { select } from '@/lib/db/bulk';

interface Paging {
  page: number;
  pageSize: number;
}

interface ReferenceRow {
  recordId: number;
  position: number;
  line: number;
  fileName: string;
  raw: string;
  how: string | null;
  workId: number | null;
  title: string | null;
  authorsLabel: string | null;
  year: number | null;
  catalogued: number | null;
}

/**
 * References of the work as they were read, in the order of its records and of their lists, each with the work that it was linked to.
 * References in files of portfolios that the person was not given are left out; the work's page counts such records.
 */
export async function listReferences(actor: Actor, workId: number, { page, pageSize }: Paging): Promise<Page<WorkReferenceView>> {
  const portfolios = visiblePortfolios(actor);
  const records = `import_records record JOIN imports import ON import.id = record.importId`;
  const where = `record.workId = :workId AND record.catalogued = 1 AND import.portfolioId IN (${portfolios.sql})`;
  const replacements = { workId, ...portfolios.replacements, limit: pageSize, offset: (page - 1) * pageSize };
  const [{ total }] = await select<{ total: number }>(null, `SELECT COALESCE(SUM(record.referenceCount), 0) AS total FROM ${records} WHERE ${where}`, replacements);
  const rows = await select<ReferenceRow>(
    null,
    `SELECT reference.recordId, reference.position, reference.line, import.fileName, reference.raw, variant.how, work.id AS workId, work.title, work.authorsLabel, work.year, work.catalogued
     FROM ${records} JOIN cited_references reference ON reference.recordId = record.id
     LEFT JOIN reference_variants variant ON variant.hash = reference.variantHash LEFT JOIN works work ON work.id = variant.workId
     WHERE ${where} ORDER BY reference.recordId, reference.position LIMIT :limit OFFSET :offset`,
    replacements,
  );
  const items = rows.map((row) => ({
    recordId: String(row.recordId),
    position: row.position,
    line: row.line,
    fileName: row.fileName,
    raw: row.raw,
    work: row.workId === null ? null : { id: String(row.workId), title: row.title, authors: row.authorsLabel, year: row.year, catalogued: Boolean(row.catalogued) },
    how: row.how,
  }));
  return { items, total: Number(total), page, pageSize };
}

/** Works that cite this one, newest first, as far as the person may see them. */
export async function listCiting(actor: Actor, workId: number, { page, pageSize }: Paging): Promise<Page<WorkListItem>> {
  const visible = visibleWork(actor);
  const source = `FROM citations citation JOIN works work ON work.id = citation.citingWorkId WHERE citation.citedWorkId = :workId AND ${visible.sql}`;
  const replacements = { workId, ...visible.replacements, limit: pageSize, offset: (page - 1) * pageSize };
  const [{ total }] = await select<{ total: number }>(null, `SELECT COUNT(*) AS total ${source}`, replacements);
  const rows = await select<{ id: number }>(null, `SELECT work.id ${source} ORDER BY work.year IS NULL, work.year DESC, work.id LIMIT :limit OFFSET :offset`, replacements);
  return { items: await presentWorks(rows.map((row) => row.id), null), total: Number(total), page, pageSize };
}
