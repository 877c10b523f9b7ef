import { type Transaction } from 'sequelize';

import { type CatalogueProgress } from '@/lib/catalogue/apply';
import { parseFields, type Plan } from '@/lib/catalogue/plan';
import { insertRows, select, selectIn, run, type Cell } from '@/lib/db/bulk';
import { deriveWork, type DeriveInput, type DerivedWork } from '@/lib/linking/derive';

const columns = [
  'id', 'workKey', 'catalogued', 'type', 'title', 'titleSort', 'authors', 'authorsLabel', 'firstFamily', 'year', 'venue', 'volume', 'issue', 'firstPage', 'lastPage',
  'articleNumber', 'publisher', 'doi', 'identifiers', 'abstract', 'keywords', 'language', 'url', 'retracted', 'recordCount', 'referenceCount',
] as const;

const cut = (text: string | undefined | null, length: number): string | null => (text ? text.slice(0, length) : null);

/** Updates existing rows through the bulk protocol; `workKey` stands only because an insert needs it, and is left as it is. */
const update = `ON DUPLICATE KEY UPDATE ${columns.filter((name) => name !== 'id' && name !== 'workKey').map((name) => `${name} = VALUES(${name})`).join(', ')}, updatedAt = CURRENT_TIMESTAMP(3)`;

function workRow(id: number, workKey: Buffer, derived: DerivedWork, recordCount: number, referenceCount: number): Cell[] {
  const { fields } = derived;
  return [
    id, workKey, 1, fields.type, fields.title ?? null, derived.titleSort, JSON.stringify(fields.authors), derived.authorsLabel, derived.firstFamily, fields.year ?? null,
    cut(fields.venue ?? fields.venueShort, 600), cut(fields.volume, 60), cut(fields.issue, 60), cut(fields.firstPage, 60), cut(fields.lastPage, 60), cut(fields.articleNumber, 60),
    cut(fields.publisher, 300), cut(fields.identifiers.doi, 300), JSON.stringify(fields.identifiers), fields.abstract ?? null, JSON.stringify(fields.keywords ?? []), cut(fields.language, 40),
    cut(fields.url, 1000), fields.retracted ? 1 : 0, recordCount, referenceCount,
  ];
}

/** What full-text search looks through. */
function searchText(derived: DerivedWork): string {
  const { fields } = derived;
  const names = fields.authors.map((name) => [name.given, name.particle, name.family ?? name.literal].filter(Boolean).join(' ')).join('; ');
  return [fields.title, names, fields.venue, fields.year, (fields.keywords ?? []).join('; '), fields.identifiers.doi].filter(Boolean).join('\n').slice(0, 60_000);
}

/**
 * Derives the works of all groups from their records and writes them.
 *
 * @returns ids of the records whose reference list their work cites by
 */
export async function writeWorks(transaction: Transaction, plan: Plan, ids: Map<string, number>, progress: CatalogueProgress): Promise<Set<number>> {
  const citing = new Set<number>();
  const size = 1_000;
  for (let from = 0; from < plan.groups.length; from += size) {
    const groups = plan.groups.slice(from, from + size);
    const rows = await selectIn<{ id: number; fields: string; referenceCount: number }, number>(
      transaction,
      'SELECT id, fields, referenceCount FROM import_records WHERE id IN (?)',
      groups.flatMap((group) => group.recordIds),
    );
    const inputs = new Map<number, DeriveInput>(rows.map((row) => [row.id, { id: row.id, fields: parseFields(row.fields), referenceCount: row.referenceCount, tieBreak: row.fields }]));
    const workIds = groups.map((group) => ids.get(group.key) as number);
    const keys = new Map((await selectIn<{ id: number; workKey: Buffer }, number>(transaction, 'SELECT id, workKey FROM works WHERE id IN (?)', workIds)).map((row) => [row.id, row.workKey]));
    const works: Cell[][] = [];
    const texts: Cell[][] = [];
    groups.forEach((group, index) => {
      const members = group.recordIds.map((id) => inputs.get(id) as DeriveInput);
      const derived = deriveWork(members);
      if (derived.citingRecordId !== null) citing.add(derived.citingRecordId);
      const references = derived.citingRecordId === null ? 0 : (inputs.get(derived.citingRecordId) as DeriveInput).referenceCount;
      works.push(workRow(workIds[index], keys.get(workIds[index]) as Buffer, derived, members.length, references));
      texts.push([workIds[index], searchText(derived)]);
    });
    await insertRows(transaction, `INSERT INTO works (${columns.join(', ')})`, works, update);
    await insertRows(transaction, 'INSERT INTO work_texts (workId, content)', texts, 'ON DUPLICATE KEY UPDATE content = VALUES(content)');
    await progress('cataloguing', Math.min(from + size, plan.groups.length), plan.groups.length);
  }
  return citing;
}

/** What a variant shows of the work it cites. */
export interface VariantText {
  doi: string | null;
  pmid: string | null;
  author: string | null;
  family: string | null;
  year: number | null;
  title: string | null;
  source: string | null;
  volume: string | null;
  issue: string | null;
  page: string | null;
  raw: string;
  standing: number;
}

function bestVariant(variants: VariantText[]): VariantText {
  const filled = (variant: VariantText) => (['doi', 'author', 'year', 'title', 'source', 'volume', 'page'] as const).reduce((sum, name) => sum + (variant[name] === null ? 0 : 1), 0);
  const text = (variant: VariantText) => JSON.stringify([variant.doi, variant.author, variant.year, variant.title, variant.source, variant.volume, variant.issue, variant.page, variant.raw]);
  return variants.reduce((best, variant) => {
    const difference = filled(variant) - filled(best) || variant.standing - best.standing;
    return difference > 0 || (difference === 0 && text(variant) < text(best)) ? variant : best;
  });
}

/** The row of a cited-only work, from the fullest of its variants in use. */
function citedOnlyRow(id: number | null, workKey: Buffer, variants: VariantText[]): Cell[] {
  const best = bestVariant(variants);
  // A work may be cited by DOI here and without there: the identifier is kept whichever variant is the fullest.
  const doi = best.doi ?? variants.map((variant) => variant.doi).filter((value) => value !== null).sort()[0] ?? null;
  const title = best.title ?? (best.author === null && best.source === null ? best.raw : null);
  const authors = best.family ? [{ family: best.family }] : [];
  return [
    id, workKey, 0, 'other', title || null, title ? title.slice(0, 160).toLowerCase() : null, JSON.stringify(authors), best.author, best.family, best.year, best.source, best.volume, best.issue,
    best.page, null, null, null, doi, JSON.stringify(doi ? { doi } : best.pmid ? { pmid: best.pmid } : {}), null, '[]', null, null, 0, 0, 0,
  ];
}

/** Makes cited-only works that are not there yet. All variants that lead to them must be given. */
export async function createCitedOnly(transaction: Transaction, works: readonly { workKey: Buffer; variants: VariantText[] }[]): Promise<void> {
  await insertRows(transaction, `INSERT INTO works (${columns.join(', ')})`, works.map(({ workKey, variants }) => citedOnlyRow(null, workKey, variants)));
}

/**
 * Settles those of the given works on which no record stands: the ones still cited get their fields from the fullest variant in use, the others go.
 */
export async function settleCitedOnly(transaction: Transaction, workIds: readonly number[]): Promise<void> {
  for (let from = 0; from < workIds.length; from += 5_000) {
    const slice = workIds.slice(from, from + 5_000);
    const bare = await selectIn<{ id: number; workKey: Buffer }, number>(
      transaction,
      'SELECT id, workKey FROM works WHERE id IN (?) AND NOT EXISTS (SELECT 1 FROM import_records record WHERE record.workId = works.id AND record.catalogued = 1)',
      slice,
    );
    const variants = await selectIn<VariantText & { workId: number }, number>(
      transaction,
      'SELECT workId, doi, pmid, author, family, year, title, source, volume, issue, page, raw, standing FROM reference_variants WHERE standing > 0 AND workId IN (?)',
      bare.map((work) => work.id),
    );
    const byWork = new Map<number, VariantText[]>();
    for (const variant of variants) {
      const held = byWork.get(variant.workId);
      if (held) held.push(variant);
      else byWork.set(variant.workId, [variant]);
    }
    const rows: Cell[][] = [];
    const gone: number[] = [];
    for (const { id, workKey } of bare) {
      const held = byWork.get(id);
      if (!held) {
        gone.push(id);
        continue;
      }
      rows.push(citedOnlyRow(id, workKey, held));
    }
    await insertRows(transaction, `INSERT INTO works (${columns.join(', ')})`, rows, update);
    for (let at = 0; at < gone.length; at += 2_000) await run(transaction, 'DELETE FROM works WHERE id IN (?)', [gone.slice(at, at + 2_000)]);
    const kept = rows.map((row) => row[0] as number);
    for (let at = 0; at < kept.length; at += 2_000) await run(transaction, 'DELETE FROM work_texts WHERE workId IN (?)', [kept.slice(at, at + 2_000)]);
  }
}

/** Ids of the works in a temporary table of this transaction. */
export async function temporaryIds(transaction: Transaction, table: 'touched_works' | 'moved_targets'): Promise<number[]> {
  return (await select<{ id: number }>(transaction, `SELECT id FROM ${table} ORDER BY id`)).map((row) => row.id);
}
