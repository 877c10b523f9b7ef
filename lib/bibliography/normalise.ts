/** Normal forms for comparing. Never shown: what a person sees stays as it was read. */

const texMarkup = /\\[a-zA-Z]+\s*|[{}$\\]/g;

/**
 * NFKD, marks dropped, lower-case, TeX markup gone, "&" -> "and", everything but letters and digits -> one space.
 * Letters of all scripts are kept: a Latin-only filter would empty Chinese titles.
 */
export function normaliseText(text: string): string {
  if (text === '') return '';
  return text
    .replace(texMarkup, ' ')
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '')
    .toLowerCase()
    .replace(/ß/g, 'ss')
    .replace(/&/g, ' and ')
    .replace(/[^\p{L}\p{N}]+/gu, ' ')
    .trim();
}

/** Letters alone: "van der Meer" -> "vandermeer", "O'Neill" -> "oneill". */
export function normaliseFamily(name: string): string {
  return name
    .normalize('NFKD')
    .replace(/\p{M}+/gu, '')
    .toLowerCase()
    .replace(/ß/g, 'ss')
    .replace(/ø/g, 'o')
    .replace(/ł/g, 'l')
    .replace(/[^\p{L}]+/gu, '');
}

/** First four-digit number from 1500 to 2100 in a text; undefined without one. */
export function findYear(text: string): number | undefined {
  for (const match of text.matchAll(/(?<!\d)(\d{4})(?!\d)/g)) {
    const year = Number(match[1]);
    if (year >= 1500 && year <= 2100) return year;
  }
  return undefined;
}
