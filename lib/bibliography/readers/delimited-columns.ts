import { DelimitedRows, delimiters, splitCells, type Delimiter } from '@/lib/bibliography/readers/delimited-rows';

/** What a column of a table can hold. */
export const columnKinds = [
  'title', 'authors', 'editors', 'year', 'venue', 'venueShort', 'volume', 'issue', 'firstPage', 'lastPage', 'pages', 'articleNumber', 'publisher', 'place', 'doi', 'pmid', 'serial', 'abstract', 'keywords', 'language', 'type',
  'url', 'references', 'key', 'affiliations',
] as const;
export type ColumnKind = (typeof columnKinds)[number];

const mostColumns = 1_000;

/** Heads in lower case, letters and digits only. English, German and Spanish; common practice, no source. */
const heads: Record<ColumnKind, string[]> = {
  title: ['title', 'articletitle', 'documenttitle', 'worktitle', 'itemtitle', 'titel', 'titulo', 'titre'],
  authors: ['authors', 'author', 'authornames', 'creator', 'creators', 'autoren', 'autor', 'autorinnen', 'autores', 'verfasser', 'auteurs'],
  editors: ['editors', 'editor', 'herausgeber', 'editores'],
  year: ['year', 'publicationyear', 'yearpublished', 'pubyear', 'date', 'publicationdate', 'published', 'issued', 'jahr', 'erscheinungsjahr', 'ano', 'fecha', 'annee'],
  venue: ['journal', 'source', 'sourcetitle', 'publicationtitle', 'journaltitle', 'containertitle', 'venue', 'booktitle', 'conference', 'zeitschrift', 'quelle', 'revista', 'fuente', 'revue'],
  venueShort: ['journalabbreviation', 'abbreviatedjournal', 'abbreviatedsourcetitle', 'isoabbreviation', 'shortjournal'],
  volume: ['volume', 'vol', 'band', 'volumen', 'jahrgang'],
  issue: ['issue', 'number', 'no', 'heft', 'nummer', 'numero'],
  firstPage: ['firstpage', 'startpage', 'pagestart', 'beginningpage', 'ersteseite', 'paginainicial'],
  lastPage: ['lastpage', 'endpage', 'pageend', 'endingpage', 'letzteseite', 'paginafinal'],
  pages: ['pages', 'page', 'pagerange', 'pp', 'seiten', 'paginas'],
  articleNumber: ['articlenumber', 'artno', 'articleno', 'elocationid', 'artikelnummer'],
  publisher: ['publisher', 'verlag', 'editorial'],
  place: ['place', 'publisherplace', 'publicationplace', 'city', 'ort', 'lugar'],
  doi: ['doi', 'dois', 'digitalobjectidentifier', 'doilink', 'doiurl'],
  pmid: ['pmid', 'pubmedid'],
  serial: ['issn', 'eissn', 'isbn', 'issnisbn', 'isbnissn', 'printissn', 'onlineissn'],
  abstract: ['abstract', 'zusammenfassung', 'resumen', 'summary'],
  keywords: ['keywords', 'keyword', 'authorkeywords', 'subjects', 'schlagworte', 'schlagworter', 'palabrasclave'],
  language: ['language', 'languages', 'sprache', 'idioma'],
  type: ['type', 'documenttype', 'publicationtype', 'itemtype', 'typ', 'dokumenttyp', 'tipo'],
  url: ['url', 'link', 'uri'],
  references: ['references', 'citedreferences', 'cited', 'referencelist', 'bibliography', 'literatur', 'referenzen', 'referencias'],
  key: ['id', 'key', 'recordid', 'citationkey', 'accession', 'accessionnumber'],
  affiliations: ['affiliations', 'affiliation', 'institutions', 'addresses'],
};
const kindByHead = new Map(Object.entries(heads).flatMap(([kind, names]) => names.map((name) => [name, kind as ColumnKind] as const)));

/** What the head of a column says that the column holds; null where it says nothing known. */
export function guessColumn(head: string): ColumnKind | null {
  const plain = head.slice(0, 100).normalize('NFD').replace(/\p{M}/gu, '').toLowerCase().replace(/[^a-z0-9]/g, '');
  return kindByHead.get(plain) ?? null;
}

export interface TableHead {
  delimiter: Delimiter;
  heads: string[];
  columns: (ColumnKind | null)[];
}

const isTelling = (columns: readonly (ColumnKind | null)[]) => columns.includes('title') || columns.includes('doi');

/**
 * Reads the first line of a table: the delimiter that gives the most known columns, else the most cells.
 *
 * @param chosen what the columns hold, where a person has said so; they must be as many as the line has cells
 * @returns null when the line is no head of a table
 */
export function splitTableHead(line: string, chosen?: readonly (ColumnKind | null)[]): TableHead | null {
  let best: { head: TableHead; known: number } | null = null;
  for (const delimiter of delimiters) {
    const cells = splitCells(line.replace(/^\uFEFF/, ''), delimiter);
    if (!cells || cells.length < 2 || cells.length > mostColumns || (chosen && cells.length !== chosen.length)) continue;
    const columns = chosen ? [...chosen] : cells.map((cell) => guessColumn(cell));
    const known = columns.filter((kind) => kind !== null).length;
    const better = !best || known > best.known || (known === best.known && cells.length > best.head.heads.length);
    if (better) best = { head: { delimiter, heads: cells.map((cell) => cell.trim()), columns }, known };
  }
  return best?.head ?? null;
}

/** The head of a table that tells what its works are. Null when no column does, or only one column says anything. */
export function readTableHead(line: string, chosen?: readonly (ColumnKind | null)[]): TableHead | null {
  const head = splitTableHead(line, chosen);
  return head && isTelling(head.columns) && (chosen || head.columns.filter((kind) => kind !== null).length >= 2) ? head : null;
}

export interface TableSketch extends TableHead {
  /** First rows, each with as many cells as there are heads. */
  rows: string[][];
}

/** Head and first rows of a table, from its beginning. Null when it looks like none. */
export function sketchTable(beginning: string, most = 5): TableSketch | null {
  let line = 0;
  const lines = beginning.split('\n');
  while (line < lines.length && (lines[line].replace(/^\uFEFF/, '').trim() === '' || isSeparatorLine(lines[line]))) line += 1;
  if (line === lines.length) return null;
  const head = splitTableHead(lines[line]);
  if (!head) return null;
  const rows: string[][] = [];
  const reader = new DelimitedRows(head.delimiter, 100_000, ({ cells }) => {
    if (rows.length < most && cells.some((cell) => cell.trim() !== '')) rows.push(head.heads.map((_, at) => (cells[at] ?? '').trim().slice(0, 200)));
  }, () => undefined);
  reader.write(lines.slice(line + 1).join('\n'));
  reader.end();
  return { ...head, rows };
}

/** "sep=;", by which some spreadsheets tell the delimiter. */
export const isSeparatorLine = (line: string) => /^\uFEFF?"?sep=.{1,2}$/i.test(line);
