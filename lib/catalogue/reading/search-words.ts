import { normaliseDoi } from '@/lib/bibliography/identifiers';

/** InnoDB's own list of words that its full-text index leaves out. A required one would make a search find nothing. */
const unindexed = new Set('a about an are as at be by com de en for from how i in is it la of on or that the this to was what when where who will with und www'.split(' '));
/** Lengths of the words that the index holds (innodb_ft_min_token_size, innodb_ft_max_token_size). */
const shortest = 3;
const longest = 84;
/** The index parts words at spaces; scripts written without them are looked for letter by letter. */
const unspaced = /[\p{Script=Han}\p{Script=Hiragana}\p{Script=Katakana}\p{Script=Thai}\p{Script=Hangul}]/u;

export type SearchTerms =
  | { kind: 'doi'; doi: string }
  /** `fullText` is a boolean query with every word required and the last one prefixed, or null; `contained` must stand in the text as they are. */
  | { kind: 'words'; fullText: string | null; contained: string[]; all: string[] }
  | { kind: 'nothing' };

const escaped = (word: string) => `%${word.replace(/[\\%_]/g, '\\$&')}%`;

/**
 * What somebody typed, made safe for a search: a DOI (bare, with "doi:" or as an address) is looked for exactly, everything else word by word.
 * Operators of the boolean mode lose their meaning because only letters, digits and "_" are kept.
 */
export function searchTerms(typed: string): SearchTerms {
  const doi = normaliseDoi(typed.trim());
  if (doi) return { kind: 'doi', doi };
  const words = (typed.normalize('NFC').match(/[\p{L}\p{N}\p{M}_]+/gu) ?? []).slice(0, 12);
  if (words.length === 0) return { kind: 'nothing' };
  const inIndex = (word: string) => word.length >= shortest && word.length <= longest && !unspaced.test(word) && !unindexed.has(word.toLowerCase());
  const single = words.length === 1 && words[0].length <= longest && !unspaced.test(words[0]);
  const indexed = single ? words : words.filter(inIndex);
  const last = words[words.length - 1];
  const fullText = indexed.map((word, index) => `+${word}${index === indexed.length - 1 && word === last ? '*' : ''}`).join(' ');
  return { kind: 'words', fullText: fullText || null, contained: single ? [] : words.filter((word) => !inIndex(word)).map(escaped), all: words.map(escaped) };
}

/**
 * Conditions on the table `work` for what was typed. Catalogued works are found through their full text; cited-only works have none, so their
 * few fields are looked through.
 *
 * @returns SQL with named replacements, all beginning with `search`; null where nothing was typed
 */
export function searchCondition(typed: string | undefined, scope: 'catalogued' | 'cited-only' | 'all'): { sql: string; replacements: Record<string, string> } | null {
  const terms = typed ? searchTerms(typed) : ({ kind: 'nothing' } as const);
  if (terms.kind === 'nothing') return typed?.trim() ? { sql: '1 = 0', replacements: {} } : null;
  if (terms.kind === 'doi') return { sql: 'work.doi = :searchDoi', replacements: { searchDoi: terms.doi } };
  const replacements: Record<string, string> = {};
  const inText: string[] = [];
  if (terms.fullText) {
    replacements.searchWords = terms.fullText;
    inText.push('MATCH(text.content) AGAINST(:searchWords IN BOOLEAN MODE)');
  }
  terms.contained.forEach((word, index) => {
    replacements[`searchContained${index}`] = word;
    inText.push(`text.content LIKE :searchContained${index}`);
  });
  const catalogued = `work.id IN (SELECT text.workId FROM work_texts text WHERE ${inText.join(' AND ')})`;
  if (scope === 'catalogued') return { sql: catalogued, replacements };
  const inFields = terms.all.map((word, index) => {
    replacements[`searchWord${index}`] = word;
    return `CONCAT_WS(' ', work.title, work.authorsLabel, work.venue, work.year) LIKE :searchWord${index}`;
  });
  const citedOnly = `(work.catalogued = 0 AND ${inFields.join(' AND ')})`;
  return { sql: scope === 'cited-only' ? citedOnly : `(${catalogued} OR ${citedOnly})`, replacements };
}
