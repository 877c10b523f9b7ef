import { type Actor } from '@/lib/access/permissions';
import { type ImportProblemView, type ImportRecordView, type ImportView } from '@/lib/api/types';
import { type Page } from '@/lib/api/schemas';
import { formatNames } from '@/lib/bibliography/names';
import { parseFields } from '@/lib/catalogue/plan';
import { select } from '@/lib/db/bulk';
import { type Loaded } from '@/lib/api/route';
import { Import } from '@/models/import';
import { User } from '@/models/user';

export async function loadImport({ params }: { actor: Actor; params: { importId: number } }): Promise<Loaded<Import>> {
  const row = await Import.findByPk(params.importId);
  return row && { row, portfolioId: row.portfolioId };
}

export function presentImport(row: Import, uploadedBy: string | null, alreadyThere?: boolean): ImportView {
  return {
    id: String(row.id),
    portfolioId: String(row.portfolioId),
    fileName: row.fileName,
    format: row.format ?? row.chosenFormat,
    encoding: row.encoding,
    bytes: row.bytes,
    sha256: row.sha256,
    // "Undoing" is a stage of an accepted import, not a state that people have to learn.
    state: row.state === 'undoing' ? 'accepted' : row.state,
    progress: { stage: row.state === 'undoing' ? `undoing${row.progressStage ? `: ${row.progressStage}` : ''}` : row.progressStage, done: Number(row.progressDone), total: Number(row.progressTotal) },
    counts: row.counts,
    error: row.error,
    uploadedBy,
    createdAt: row.createdAt.toISOString(),
    startedAt: row.startedAt?.toISOString() ?? null,
    acceptedAt: row.acceptedAt?.toISOString() ?? null,
    undoneAt: row.undoneAt?.toISOString() ?? null,
    ...(alreadyThere === undefined ? {} : { alreadyThere }),
  };
}

/** Names of the people who uploaded the given imports. */
async function uploaders(rows: Import[]): Promise<Map<number, string>> {
  const ids = [...new Set(rows.map((row) => row.uploadedById).filter((id) => id !== null))];
  const users = await User.findAll({ where: { id: ids }, attributes: ['id', 'name'] });
  return new Map(users.map((user) => [user.id, user.name]));
}

export async function presentImports(rows: Import[], alreadyThere?: boolean[]): Promise<ImportView[]> {
  const names = await uploaders(rows);
  return rows.map((row, index) => presentImport(row, row.uploadedById === null ? null : (names.get(row.uploadedById) ?? null), alreadyThere?.[index]));
}

export async function listImports(portfolioId: number, query: { page: number; pageSize: number }): Promise<Page<ImportView>> {
  const { rows, count } = await Import.findAndCountAll({ where: { portfolioId }, order: [['id', 'DESC']], limit: query.pageSize, offset: (query.page - 1) * query.pageSize });
  return { items: await presentImports(rows), total: count, page: query.page, pageSize: query.pageSize };
}

export async function listImportRecords(importId: number, query: { page: number; pageSize: number; outcome?: string; q?: string }): Promise<Page<ImportRecordView>> {
  const where = ['importId = :importId'];
  if (query.outcome) where.push('outcome = :outcome');
  if (query.q) where.push('title LIKE :q');
  const replacements = { importId, outcome: query.outcome, q: `%${(query.q ?? '').replace(/[\\%_]/g, '\\$&')}%`, limit: query.pageSize, offset: (query.page - 1) * query.pageSize };
  const condition = where.join(' AND ');
  const [{ total }] = await select<{ total: number }>(null, `SELECT COUNT(*) AS total FROM import_records WHERE ${condition}`, replacements);
  const rows = await select<{ id: number; position: number; line: number; entryKey: string | null; title: string | null; raw: string; fields: string | null; outcome: ImportRecordView['outcome']; referenceCount: number; workId: number | null }>(
    null,
    `SELECT id, position, line, entryKey, title, LEFT(raw, 20000) AS raw, fields, outcome, referenceCount, workId FROM import_records WHERE ${condition} ORDER BY position LIMIT :limit OFFSET :offset`,
    replacements,
  );
  const items = rows.map((row) => {
    const fields = row.fields ? parseFields(row.fields) : null;
    return {
      id: String(row.id),
      position: row.position,
      line: row.line,
      key: row.entryKey,
      title: row.title,
      authors: fields && fields.authors.length > 0 ? formatNames(fields.authors, 3) : null,
      year: fields?.year ?? null,
      outcome: row.outcome,
      references: row.referenceCount,
      raw: row.raw,
      workId: row.workId === null ? null : String(row.workId),
    };
  });
  return { items, total, page: query.page, pageSize: query.pageSize };
}

export async function listImportProblems(importId: number, query: { page: number; pageSize: number; severity?: string }): Promise<Page<ImportProblemView>> {
  const condition = `importId = :importId${query.severity ? ' AND severity = :severity' : ''}`;
  const replacements = { importId, severity: query.severity, limit: query.pageSize, offset: (query.page - 1) * query.pageSize };
  const [{ total }] = await select<{ total: number }>(null, `SELECT COUNT(*) AS total FROM import_problems WHERE ${condition}`, replacements);
  const rows = await select<{ id: number; line: number; severity: 'error' | 'warning'; code: string; message: string; entryKey: string | null }>(
    null,
    `SELECT id, line, severity, code, message, entryKey FROM import_problems WHERE ${condition} ORDER BY line, id LIMIT :limit OFFSET :offset`,
    replacements,
  );
  return { items: rows.map((row) => ({ id: String(row.id), line: row.line, severity: row.severity, code: row.code, message: row.message, key: row.entryKey })), total, page: query.page, pageSize: query.pageSize };
}
