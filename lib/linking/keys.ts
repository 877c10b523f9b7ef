/**
 * The keys by which records and references are recognised. All are plain text, readable in a test; the services store a hash of each.
 *
 * Why these and no others: in a real bibliography of 2,720 entries, title and year alone would wrongly join 656 pairs; title, year and
 * first author still fail for short, generic titles ("Calendar", "Editor's introduction"). So a title of fewer than four words counts only
 * together with volume and first page, and author and year alone never count.
 */
import { normaliseFamily, normaliseText } from '@/lib/bibliography/normalise';
import { type CitedReference, type PersonName, type RecordFields } from '@/lib/bibliography/record';

/** Least number of words that make a title telling. */
export const tellingTitleWords = 4;

export interface RecordKeys {
  /** 'doi:…', 'pmid:…', 'pmcid:…', 'arxiv:…' */
  identifiers: string[];
  /** 'fp:title|year|author', longer for short titles; 'ct:…' (all that the record says) where title, year or author is missing; null for an empty record. */
  fingerprint: string | null;
  /** 'volume|page' where both are known: two records that contradict each other in it are not joined by a fingerprint. */
  volumePage: string | null;
  /** Keys under which references find it: 'rf:family|year|volume|page', 'rs:source|year|page', 'rt:title|year|family'. */
  referenceKeys: string[];
  /** Keys under which near matches are sought; records share a block when they share one. */
  blocks: string[];
  /** Normalised title, '' without one. */
  title: string;
}

const wordCount = (normalised: string) => (normalised === '' ? 0 : normalised.split(' ').length);

/** Digits and letters of a volume, issue or page, lower-case, without leading zeros: "p. 0283A" -> "283a". */
export function normalisePage(page: string | undefined): string {
  if (!page) return '';
  const match = /[a-z]?\d+[a-z]?/i.exec(page.replace(/^\s*(?:pp?|art(?:icle)?|no)\.?\s*/i, ''));
  return match ? match[0].toLowerCase().replace(/^([a-z]?)0+(?=\d)/, '$1') : normaliseText(page);
}

function firstNames(name: PersonName | undefined): { full: string; bare: string } {
  if (!name) return { full: '', bare: '' };
  if (!name.family) return { full: normaliseText(name.literal ?? ''), bare: '' };
  const bare = normaliseFamily(name.family);
  return { full: normaliseFamily(`${name.particle ?? ''}${name.family}`), bare };
}

/** All keys of a record. Deterministic; depends on nothing but the fields. */
export function recordKeys(fields: RecordFields): RecordKeys {
  const ids = fields.identifiers;
  const identifiers = [ids.doi && `doi:${ids.doi}`, ids.pmid && `pmid:${ids.pmid}`, ids.pmcid && `pmcid:${ids.pmcid}`, ids.arxiv && `arxiv:${ids.arxiv}`].filter(
    (value): value is string => Boolean(value),
  );
  const title = normaliseText(fields.title ?? '');
  const year = fields.year ? String(fields.year) : '';
  const author = firstNames(fields.authors[0]);
  // A particle may be kept apart, glued on or dropped; the bare family name is what all spellings share.
  const family = author.bare || author.full;
  const volume = normalisePage(fields.volume);
  const page = normalisePage(fields.firstPage ?? fields.articleNumber);
  const telling = wordCount(title) >= tellingTitleWords;

  let fingerprint: string | null = null;
  if (title && year && family) fingerprint = telling ? `fp:${title}|${year}|${family}` : `fp:${title}|${year}|${family}|${volume}|${page}`;
  else {
    const everything = [title, year, fields.authors.map((name) => firstNames(name).full).join(' '), normaliseText(fields.venue ?? ''), volume, page, normaliseText(fields.publisher ?? ''), fields.url ?? ''];
    // Two entries that say nothing but "Introduction" are not one work: what is the same must also tell.
    if (telling || (volume && page) || fields.url) fingerprint = `ct:${everything.join('|')}`;
  }

  const referenceKeys = new Set<string>();
  for (const name of new Set([author.full, author.bare])) if (name && year && volume && page) referenceKeys.add(`rf:${name}|${year}|${volume}|${page}`);
  for (const source of new Set([normaliseText(fields.venue ?? ''), normaliseText(fields.venueShort ?? '')])) if (source && year && page) referenceKeys.add(`rs:${source}|${year}|${page}`);
  if (telling && year) for (const name of new Set([author.full, author.bare])) if (name) referenceKeys.add(`rt:${title}|${year}|${name}`);

  const blocks = new Set<string>();
  if (year && title) blocks.add(`bt:${title.split(' ').slice(0, 4).join(' ')}|${year}`);
  if (year && family && page) blocks.add(`bp:${family}|${year}|${page}`);
  if (year && family) blocks.add(`ba:${family}|${year}|${title.split(' ').slice(-2).join(' ')}`);
  return { identifiers, fingerprint, volumePage: volume && page ? `${volume}|${page}` : null, referenceKeys: [...referenceKeys], blocks: [...blocks], title };
}

/** The blocks in which a record's near matches may stand: its own, and those of the year before and after. */
export function neighbouringBlocks(blocks: string[]): string[] {
  const all = new Set<string>();
  for (const block of blocks) {
    const parts = block.split('|');
    const year = Number(parts[1]);
    for (const shifted of [year - 1, year, year + 1]) all.add([parts[0], String(shifted), ...parts.slice(2)].join('|'));
  }
  return [...all];
}

export interface ReferenceKeys {
  /** 'doi:…', else 'pmid:…' */
  identifierKey: string | null;
  /** 'rf:family|year|volume|page', else 'rs:source|year|page' */
  fieldKey: string | null;
  /** 'rt:title|year|family' */
  titleKey: string | null;
  /** Key under which equal references are drawn together when nothing better is known. */
  ownKey: string;
}

/** All keys of a cited reference. */
export function referenceKeys(reference: CitedReference): ReferenceKeys {
  const family = normaliseFamily(reference.family ?? '');
  const year = reference.year ? String(reference.year) : '';
  const volume = normalisePage(reference.volume);
  const page = normalisePage(reference.page);
  const source = normaliseText(reference.source ?? '');
  const title = normaliseText(reference.title ?? '');
  let fieldKey: string | null = null;
  if (family && year && volume && page) fieldKey = `rf:${family}|${year}|${volume}|${page}`;
  else if (source && year && page) fieldKey = `rs:${source}|${year}|${page}`;
  const titleKey = title && year && family && wordCount(title) >= tellingTitleWords ? `rt:${title}|${year}|${family}` : null;
  const parts = [family || normaliseText(reference.author ?? ''), year, volume, page, source, title, reference.isbn ?? ''];
  const told = parts.filter((part) => part !== '').length;
  return {
    identifierKey: reference.doi ? `doi:${reference.doi}` : reference.pmid ? `pmid:${reference.pmid}` : null,
    fieldKey,
    titleKey,
    // Author and year alone say too little: the whole text must be equal then.
    ownKey: told >= 3 ? `ro:${parts.join('|')}` : `ro:${normaliseText(reference.raw)}`,
  };
}
