/**
 * Cited references as lines: "AUTHOR II, YEAR, ABBREVIATED SOURCE, Vvol, Ppage, DOI 10.x/y".
 * Author and year are taken from the left, the rest is told apart by pattern; anything may be missing. Common practice, no standard.
 */
import { findDoi, normaliseDoi } from '@/lib/bibliography/identifiers';
import { findYear } from '@/lib/bibliography/normalise';
import { type CitedReference } from '@/lib/bibliography/record';

const anonymous = /^\[?anonymous\]?$|^\*?anon\.?$/i;

/** Family name of an author as cited-reference lines write it: "MACARTHUR RH" -> "MACARTHUR", "de Vries, J." -> "de Vries". */
export function familyOf(author: string): string | undefined {
  const text = author.trim();
  if (text === '' || anonymous.test(text) || text.length > 120) return undefined;
  if (text.includes(',')) return text.split(',')[0].trim() || undefined;
  const words = text.split(/\s+/);
  while (words.length > 1 && /^(?:\p{Lu}\.?-?){1,4}$|^(?:jr|sr)\.?$/iu.test(words[words.length - 1]) && words[words.length - 1].replace(/[.-]/g, '').length <= 3) words.pop();
  return words.join(' ');
}

function takeIdentifier(reference: CitedReference, part: string): boolean {
  const match = /^(?:DOI\s*:?\s*)+(?=\[?\s*10\.)/i.exec(part) ?? /^(?=https?:\/\/(?:dx\.)?doi\.org\/)/i.exec(part);
  if (!match) return false;
  // Several DOIs stand in square brackets at times, and "DOI" is repeated; the first valid one counts.
  for (const candidate of part.slice(match[0].length).replace(/^\[/, '').split(/,\s*|\s+DOI\s+|\s+/i)) {
    const doi = normaliseDoi(candidate.replace(/\]$/, ''));
    if (doi) {
      reference.doi ??= doi;
      return true;
    }
  }
  return true;
}

function takePlace(reference: CitedReference, part: string): boolean {
  const volume = /^V\.?\s?(\d[\w./-]{0,20})$/i.exec(part);
  if (volume && !reference.volume) {
    reference.volume = volume[1];
    return true;
  }
  const page = /^(?:PP?\.?\s?)([a-z]?\d[\w./-]{0,20})$/i.exec(part) ?? /^ART(?:N|ICLE)?\.?\s?(?:NO\.?\s?)?([a-z]?\d[\w./-]{0,20})$/i.exec(part);
  if (page && !reference.page) {
    reference.page = page[1].split('-')[0];
    return true;
  }
  return false;
}

/** One line of the comma layout. Never throws; what cannot be told apart ends in `source`. */
export function parseCitedLine(raw: string, line: number): CitedReference {
  const reference: CitedReference = { raw, line };
  const text = raw.trim().replace(/[;.]$/, '');
  // A DOI may hold a comma and a bracketed list may too: both are taken off the end first.
  const tail = /,?\s*(DOI\s.*|https?:\/\/(?:dx\.)?doi\.org\/.*)$/i.exec(text);
  const before = tail ? text.slice(0, tail.index) : text;
  if (tail) takeIdentifier(reference, tail[1]);
  const parts = before.split(/,\s+/).map((part) => part.trim()).filter((part) => part !== '');
  let at = 0;
  const isYear = (part: string | undefined) => part !== undefined && /^\(?\d{4}[a-z]?\)?$/.test(part) && findYear(part.replace(/[()a-z]/g, '')) !== undefined;
  if (parts.length > 0 && !isYear(parts[0])) {
    // "de Vries, J., 1990, ...": initials after a comma belong to the author.
    const initials = parts.length > 2 && !isYear(parts[1]) && isYear(parts[2]) && /^(?:\p{Lu}\.?[-\s]?){1,5}$/u.test(parts[1]);
    const author = initials ? `${parts[0]}, ${parts[1]}` : parts[0];
    if (isYear(parts[initials ? 2 : 1]) || parts.length > 2) {
      at = initials ? 2 : 1;
      if (!anonymous.test(author)) {
        reference.author = author;
        reference.family = familyOf(author);
      }
    }
  }
  if (isYear(parts[at])) {
    reference.year = findYear(parts[at].replace(/[()a-z]/g, ''));
    at += 1;
  }
  const source: string[] = [];
  for (const part of parts.slice(at)) if (!takeIdentifier(reference, part) && !takePlace(reference, part)) source.push(part);
  if (source.length > 0) reference.source = source.join(', ');
  if (!reference.author && !reference.source && !reference.doi) reference.unstructured = true;
  return reference;
}

/** A reference that is running text: DOI and year are all that is taken from it. */
export function parseUnstructured(raw: string, line: number): CitedReference {
  const reference: CitedReference = { raw, line, unstructured: true };
  const doi = findDoi(raw);
  if (doi) reference.doi = doi;
  const year = findYear(raw.slice(0, 2_000));
  if (year) reference.year = year;
  return reference;
}
