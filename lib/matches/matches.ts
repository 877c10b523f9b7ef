import { type Transaction } from 'sequelize';

import { grantLevelOf } from '@/lib/access/grants';
import { type Actor } from '@/lib/access/permissions';
import { type Loaded } from '@/lib/api/route';
import { type Page } from '@/lib/api/schemas';
import { type MatchSide, type MatchView } from '@/lib/api/types';
import { formatNames } from '@/lib/bibliography/names';
import { changeCatalogue } from '@/lib/catalogue/apply';
import { parseFields } from '@/lib/catalogue/plan';
import { database } from '@/lib/db/connection';
import { run, select } from '@/lib/db/bulk';
import { countImport } from '@/lib/imports/check';
import { Import } from '@/models/import';
import { ImportRecord } from '@/models/import-record';
import { Match } from '@/models/match';

interface Row {
  id: number;
  state: MatchView['state'];
  score: number;
  reasons: MatchView['reasons'] | string;
  decidedAt: Date | null;
  decidedBy: string | null;
}

interface SideRow {
  id: number;
  workId: number | null;
  fields: string;
  line: number;
  referenceCount: number;
  fileName: string;
  portfolioId: number;
}

/** A match belongs to the portfolio into which its left record was imported. */
export async function loadMatch({ params }: { actor: Actor; params: { matchId: number } }): Promise<Loaded<Match>> {
  const row = await Match.findByPk(params.matchId);
  if (!row) return null;
  const [{ portfolioId }] = await select<{ portfolioId: number }>(null, 'SELECT import.portfolioId FROM import_records record JOIN imports import ON import.id = record.importId WHERE record.id = ?', [row.leftRecordId]);
  return { row, portfolioId };
}

function presentSide(row: SideRow, visible: boolean): MatchSide {
  const fields = parseFields(row.fields);
  const pages = [fields.firstPage, fields.lastPage].filter(Boolean).join('–') || fields.articleNumber || null;
  return {
    recordId: String(row.id),
    workId: row.workId === null ? null : String(row.workId),
    // The work is in the shared catalogue, the file may be another portfolio's.
    fileName: visible ? row.fileName : 'a file of another portfolio',
    line: visible ? row.line : 0,
    title: fields.title ?? null,
    authors: fields.authors.length > 0 ? formatNames(fields.authors, 6) : null,
    year: fields.year ?? null,
    venue: fields.venue ?? fields.venueShort ?? null,
    volume: fields.volume ?? null,
    pages,
    doi: fields.identifiers.doi ?? null,
    references: row.referenceCount,
  };
}

async function presentMatches(actor: Actor, ids: number[]): Promise<MatchView[]> {
  if (ids.length === 0) return [];
  const rows = await select<Row & { leftRecordId: number; rightRecordId: number }>(
    null,
    `SELECT matches.id, matches.state, matches.score, matches.reasons, matches.decidedAt, user.name AS decidedBy, matches.leftRecordId, matches.rightRecordId
     FROM matches LEFT JOIN users user ON user.id = matches.decidedById WHERE matches.id IN (?)`,
    [ids],
  );
  const sides = await select<SideRow>(
    null,
    `SELECT record.id, record.workId, record.fields, record.line, record.referenceCount, import.fileName, import.portfolioId
     FROM import_records record JOIN imports import ON import.id = record.importId WHERE record.id IN (?)`,
    [rows.flatMap((row) => [row.leftRecordId, row.rightRecordId])],
  );
  const visible = new Map<number, boolean>();
  for (const portfolioId of new Set(sides.map((side) => side.portfolioId))) visible.set(portfolioId, (await grantLevelOf(actor, portfolioId)) !== null);
  const sideOf = new Map(sides.map((side) => [side.id, presentSide(side, visible.get(side.portfolioId) ?? false)]));
  const byId = new Map(rows.map((row) => [row.id, row]));
  return ids.flatMap((id) => {
    const row = byId.get(id);
    if (!row) return [];
    return [{
      id: String(row.id),
      state: row.state,
      score: row.score,
      reasons: typeof row.reasons === 'string' ? (JSON.parse(row.reasons) as MatchView['reasons']) : row.reasons,
      left: sideOf.get(row.leftRecordId) as MatchSide,
      right: sideOf.get(row.rightRecordId) as MatchSide,
      decidedBy: row.decidedBy,
      decidedAt: row.decidedAt ? new Date(row.decidedAt).toISOString() : null,
    }];
  });
}

export async function presentMatch(actor: Actor, id: number): Promise<MatchView> {
  return (await presentMatches(actor, [id]))[0];
}

/** Matches whose two records are still there: catalogued, or in an import that waits to be accepted. Strongest first. */
export async function listMatches(actor: Actor, portfolioId: number, query: { page: number; pageSize: number; state?: string; import?: number }): Promise<Page<MatchView>> {
  const standing = (record: string, imported: string) => `(${record}.catalogued = 1 OR ${imported}.state IN ('review', 'accepting'))`;
  const from = `FROM matches
    JOIN import_records leftRecord ON leftRecord.id = matches.leftRecordId JOIN imports leftImport ON leftImport.id = leftRecord.importId
    JOIN import_records rightRecord ON rightRecord.id = matches.rightRecordId JOIN imports rightImport ON rightImport.id = rightRecord.importId
    WHERE leftImport.portfolioId = :portfolioId AND ${standing('leftRecord', 'leftImport')} AND ${standing('rightRecord', 'rightImport')}
    ${query.state ? 'AND matches.state = :state' : ''} ${query.import ? 'AND leftRecord.importId = :import' : ''}`;
  const replacements = { portfolioId, state: query.state, import: query.import, limit: query.pageSize, offset: (query.page - 1) * query.pageSize };
  const [{ total }] = await select<{ total: number }>(null, `SELECT COUNT(*) AS total ${from}`, replacements);
  const rows = await select<{ id: number }>(null, `SELECT matches.id ${from} ORDER BY matches.score DESC, matches.id LIMIT :limit OFFSET :offset`, replacements);
  return { items: await presentMatches(actor, rows.map((row) => row.id)), total, page: query.page, pageSize: query.pageSize };
}

/** What follows from a decision: for catalogued records the catalogue is derived again; for a waiting import its counts. */
async function follow(transaction: Transaction, match: Match): Promise<void> {
  const records = await ImportRecord.findAll({ where: { id: [match.leftRecordId, match.rightRecordId] }, attributes: ['id', 'importId', 'catalogued', 'outcome'], transaction });
  if (records.every((record) => record.catalogued)) await changeCatalogue(transaction, { kind: 'regroup', recordIds: records.map((record) => record.id) });
  const left = records.find((record) => record.id === match.leftRecordId);
  if (!left) return;
  const [{ open }] = await select<{ open: number }>(transaction, "SELECT COUNT(*) AS open FROM matches WHERE leftRecordId = ? AND state IN ('open', 'later')", [left.id]);
  const [{ same }] = await select<{ same: number }>(transaction, "SELECT COUNT(*) AS same FROM matches WHERE leftRecordId = ? AND state = 'same'", [left.id]);
  if (left.outcome === 'rejected') return;
  await run(transaction, 'UPDATE import_records SET outcome = ? WHERE id = ?', [same > 0 ? 'known' : open > 0 ? 'review' : 'new', left.id]);
  await Import.update({ counts: await countImport(transaction, left.importId) }, { where: { id: left.importId }, transaction });
}

/** Decides a match; deciding anew replaces the earlier decision. */
export async function decideMatch(actor: Actor, match: Match, decision: 'same' | 'different' | 'later'): Promise<void> {
  await database().transaction(async (transaction) => {
    await match.update({ state: decision, decidedById: actor.userId, decidedAt: new Date() }, { transaction });
    await follow(transaction, match);
  });
}

/** Takes a decision back. */
export async function reopenMatch(match: Match): Promise<void> {
  await database().transaction(async (transaction) => {
    await match.update({ state: 'open', decidedById: null, decidedAt: null }, { transaction });
    await follow(transaction, match);
  });
}
