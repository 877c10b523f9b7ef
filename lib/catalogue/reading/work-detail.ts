import { type Actor } from '@/lib/access/permissions';
import { type WorkDetail, type WorkRecordView } from '@/lib/api/types';
import { type Format } from '@/lib/bibliography/record';
import { visiblePortfolios } from '@/lib/catalogue/reading/visibility';
import { select } from '@/lib/db/bulk';
import { type Work } from '@/models/work';

/** Longest raw text of a record that is sent; whole files have been seen in one record. */
const rawLimit = 20_000;

/** The catalogued records on which the work stands: those that the person may see, and the number of the others. */
async function readRecords(actor: Actor, workId: number): Promise<{ records: WorkRecordView[]; hiddenRecords: number }> {
  const portfolios = visiblePortfolios(actor);
  const rows = await select<{ id: number; importId: number; fileName: string; format: Format | null; line: number; raw: string | null; referenceCount: number; visible: number }>(
    null,
    `SELECT record.id, record.importId, import.fileName, import.format, record.line, record.referenceCount, import.portfolioId IN (${portfolios.sql}) AS visible,
       CASE WHEN import.portfolioId IN (${portfolios.sql}) THEN LEFT(record.raw, ${rawLimit}) END AS raw
     FROM import_records record JOIN imports import ON import.id = record.importId WHERE record.workId = :workId AND record.catalogued = 1 ORDER BY record.id`,
    { workId, ...portfolios.replacements },
  );
  const records = rows.filter((row) => row.visible).map((row) => ({
    id: String(row.id), importId: String(row.importId), fileName: row.fileName, format: row.format, line: row.line, raw: row.raw ?? '', references: row.referenceCount,
  }));
  return { records, hiddenRecords: rows.length - records.length };
}

/** Where the work stands in the latest finished analysis of each portfolio that the person may see. */
async function readStandings(actor: Actor, workId: number): Promise<WorkDetail['standings']> {
  const portfolios = visiblePortfolios(actor);
  const rows = await select<{ portfolioId: number; portfolioName: string; analysisId: number; place: number; rankLow: number; rankHigh: number; inDegree: number; pageRank: number }>(
    null,
    `SELECT portfolio.id AS portfolioId, portfolio.name AS portfolioName, standing.analysisId, standing.rank AS place, standing.rankLow, standing.rankHigh, standing.inDegree, standing.pageRank
     FROM (SELECT portfolioId, MAX(id) AS id FROM analyses WHERE state = 'finished' AND portfolioId IN (${portfolios.sql}) GROUP BY portfolioId) latest
     JOIN analysis_works standing ON standing.analysisId = latest.id AND standing.workId = :workId
     JOIN portfolios portfolio ON portfolio.id = latest.portfolioId ORDER BY portfolio.name, portfolio.id`,
    { workId, ...portfolios.replacements },
  );
  return rows.map(({ portfolioId, analysisId, place, ...row }) => ({
    portfolioId: String(portfolioId), portfolioName: row.portfolioName, analysisId: String(analysisId), rank: place, rankLow: row.rankLow, rankHigh: row.rankHigh, inDegree: row.inDegree, pageRank: row.pageRank,
  }));
}

async function readPortfolios(actor: Actor, workId: number): Promise<WorkDetail['portfolios']> {
  const portfolios = visiblePortfolios(actor);
  const rows = await select<{ id: number; name: string }>(
    null,
    `SELECT holder.id, holder.name FROM portfolio_works membership JOIN portfolios holder ON holder.id = membership.portfolioId
     WHERE membership.workId = :workId AND membership.membership <> 'removed' AND holder.id IN (${portfolios.sql}) ORDER BY holder.name, holder.id`,
    { workId, ...portfolios.replacements },
  );
  return rows.map((row) => ({ id: String(row.id), name: row.name }));
}

/** Everything that a work's page shows. MariaDB gives JSON columns as text or parsed, depending on the driver's path; both are taken. */
export async function readWork(actor: Actor, work: Work): Promise<WorkDetail> {
  const json = <Value>(value: Value | string | null, empty: Value): Value => (typeof value === 'string' ? (JSON.parse(value) as Value) : (value ?? empty));
  const [{ records, hiddenRecords }, standings, portfolios] = await Promise.all([readRecords(actor, work.id), readStandings(actor, work.id), readPortfolios(actor, work.id)]);
  return {
    id: String(work.id),
    title: work.title,
    authors: json(work.authors, []),
    authorsLabel: work.authorsLabel,
    type: work.type,
    year: work.year,
    venue: work.venue,
    volume: work.volume,
    issue: work.issue,
    firstPage: work.firstPage,
    lastPage: work.lastPage,
    articleNumber: work.articleNumber,
    publisher: work.publisher,
    doi: work.doi,
    identifiers: { ...json(work.identifiers, {}) } as WorkDetail['identifiers'],
    abstract: work.abstract,
    keywords: json(work.keywords, []),
    language: work.language,
    url: work.url,
    catalogued: Boolean(work.catalogued),
    retracted: Boolean(work.retracted),
    references: work.referenceCount,
    citing: work.citingCount,
    cited: work.citedCount,
    records,
    hiddenRecords,
    portfolios,
    standings,
  };
}
