import { delimiters, splitCells, type Delimiter } from '@/lib/bibliography/readers/delimited-rows';

/** What a column of a table can hold. */
export const columnKinds = [
  'title', 'authors', 'editors', 'year', 'venue', 'venueShort', 'volume', 'issue', 'firstPage', 'lastPage', 'pages', 'articleNumber', 'publisher', 'place', 'doi', 'pmid', 'serial', 'abstract', 'keywords', 'language', 'type',
  'url', 'references', 'key', 'affiliations',
] as const;
export type ColumnKind = (typeof columnKinds)[number];

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

/** Reads the first line of a table: the delimiter that gives the most known columns. Null when no column tells what a work is. */
export function readTableHead(line: string): TableHead | null {
  let best: { head: TableHead; known: number } | null = null;
  for (const delimiter of delimiters) {
    const cells = splitCells(line.replace(/^\uFEFF/, ''), delimiter);
    if (!cells || cells.length < 2 || cells.length > 1_000) continue;
    const columns = cells.map((cell) => guessColumn(cell));
    const known = columns.filter((kind) => kind !== null).length;
    if (!columns.includes('title') && !columns.includes('doi')) continue;
    if (known >= 2 && (!best || known > best.known)) best = { head: { delimiter, heads: cells.map((cell) => cell.trim()), columns }, known };
  }
  return best?.head ?? null;
}
