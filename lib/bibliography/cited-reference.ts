/**
 * Cited references as lines: "AUTHOR II, YEAR, ABBREVIATED SOURCE, Vvol, Ppage, DOI 10.x/y".
 * Author and year are taken from the left, the rest is told apart by pattern; anything may be missing. Common practice, no standard.
 */
import { findDoi, normaliseArxiv, normaliseDoi, normalisePmid } from '@/lib/bibliography/identifiers';
import { parseListedName } from '@/lib/bibliography/names';
import { findYear } from '@/lib/bibliography/normalise';
import { tidyText } from '@/lib/bibliography/plain-text';
import { type CitedReference } from '@/lib/bibliography/record';

/** A line longer than this is cut: a reference is a line, not a chapter. */
export const longestReference = 10_000;
const anonymous = /^[[*]?anon(?:ymous)?\.?\]?$/i;
const yearPart = /^\(?(\d{4})[a-z]?\)?$/;
const initialsPart = /^(?:\p{Lu}\.?[-\s]?){1,5}$/u;
const namePart = /^\p{Lu}[\p{L}\p{M}.'’ -]{0,40}$/u;
const volumePart = /^V(?:ol)?\.?\s?([A-Z]{0,2}\d[\w./-]{0,20}|[IVXLC]{1,8})$/i;
const pagePart = /^PP?\.?\s?([a-z]{0,3}\d[\w./-]{0,20})$/i;
const articlePart = /^(?:ARTN|ART|ARTICLE)\.?\s?(?:NO\.?\s?|NUMBER\s?)?([a-z]{0,3}\d[\w./-]{0,20})$/i;
/** Each repetition begins with "DOI", so that a thousand of them are read in one way only. */
const identifierStart = /^(?:(?:DOI\b[\s:]{0,9}){1,9}(?=\[?\s?10\.)|(?=https?:\/\/(?:dx\.)?doi\.org\/))/i;

/** Family name of an author as cited-reference lines write it: "MACARTHUR RH" -> "MACARTHUR", "de Vries, J." -> "de Vries". Undefined for anonymous works. */
export function familyOf(author: string): string | undefined {
  const text = author.trim();
  if (text === '' || text.length > 120 || anonymous.test(text)) return undefined;
  const name = parseListedName(text);
  if (!name?.family) return undefined;
  return name.particle ? `${name.particle} ${name.family}` : name.family;
}

function yearOf(part: string | undefined): number | undefined {
  const match = part === undefined ? null : yearPart.exec(part);
  return match ? findYear(match[1]) : undefined;
}

/** "DOI 10.x/y", "DOI [10.x/y, DOI 10.z/w]", "https://doi.org/10.x/y": the first valid one counts. */
function takeIdentifiers(reference: CitedReference, part: string): void {
  for (const candidate of part.split(/[[\],\s]+/)) {
    const doi = candidate.length > 6 ? normaliseDoi(candidate) : undefined;
    if (!doi) continue;
    reference.doi = doi;
    return;
  }
  // A suffix with a comma or a blank in it is rare, a whole DOI that fails is not: the part as one is tried last.
  const whole = findDoi(part);
  if (whole) reference.doi = whole;
}

function takePlace(reference: CitedReference, part: string): boolean {
  const volume = reference.volume ? null : volumePart.exec(part);
  if (volume) {
    reference.volume = volume[1];
    return true;
  }
  const page = reference.page ? null : (pagePart.exec(part) ?? articlePart.exec(part));
  if (page) {
    reference.page = page[1].split('-')[0];
    return true;
  }
  const pmid = /^PMID\b/i.test(part) ? normalisePmid(part) : undefined;
  if (pmid) reference.pmid = pmid;
  return pmid !== undefined;
}

/** Author and year from the left; the number of parts taken. */
function takeAuthorAndYear(reference: CitedReference, parts: string[]): number {
  if (parts.length === 0) return 0;
  let taken = 0;
  if (yearOf(parts[0]) === undefined) {
    // "de Vries, J., 1990, ..." and "Kuhn, Thomas, 1962, ...": what stands between the first part and the year belongs to the author.
    const withInitials = parts.length > 2 && yearOf(parts[1]) === undefined && (yearOf(parts[2]) !== undefined ? namePart.test(parts[1]) : initialsPart.test(parts[1]) && !/^V\.?$/i.test(parts[1]));
    const author = withInitials ? `${parts[0]}, ${parts[1]}` : parts[0];
    const count = withInitials ? 2 : 1;
    const placeFollows = volumePart.test(parts[count] ?? '') || pagePart.test(parts[count] ?? '');
    // One part before the volume is the source; an author stands before a year, or before a source.
    if (yearOf(parts[count]) === undefined && (parts.length < 3 || placeFollows)) return 0;
    taken = count;
    if (!anonymous.test(author)) {
      reference.author = author;
      // "SMITH J, JONES K, 1990": initials before the comma close the first name.
      const family = familyOf(/\s\p{Lu}{1,3}$/u.test(parts[0]) ? parts[0] : author);
      if (family) reference.family = family;
    }
  }
  const year = yearOf(parts[taken]);
  if (year === undefined) return taken;
  reference.year = year;
  return taken + 1;
}

/** One line of the comma layout. Never throws; what cannot be told apart ends in `source`, and a line that tells nothing is `unstructured`. */
export function parseCitedLine(raw: string, line: number): CitedReference {
  const bounded = raw.length > longestReference ? raw.slice(0, longestReference) : raw;
  const reference: CitedReference = { raw: bounded, line };
  const text = tidyText(bounded).replace(/[;.]$/, '');
  const parts: string[] = [];
  let identifiers = '';
  let from = 0;
  // A bracketed list of DOIs holds commas and may be followed by nothing: once identifiers begin, the rest is theirs.
  for (;;) {
    const end = text.indexOf(', ', from);
    const part = text.slice(from, end < 0 ? text.length : end).trim();
    if (identifierStart.test(part)) {
      identifiers = text.slice(from);
      break;
    }
    if (part !== '') parts.push(part);
    if (end < 0) break;
    from = end + 2;
  }
  if (identifiers !== '') takeIdentifiers(reference, identifiers);
  const source = parts.slice(takeAuthorAndYear(reference, parts)).filter((part) => !takePlace(reference, part));
  if (source.length > 0) reference.source = source.join(', ');
  if (!reference.author && !reference.source && !reference.doi) reference.unstructured = true;
  return reference;
}

/** A reference that is running text: DOI, preprint number and year are all that is taken from it. */
export function parseUnstructured(raw: string, line: number): CitedReference {
  const bounded = raw.length > longestReference ? raw.slice(0, longestReference) : raw;
  const reference: CitedReference = { raw: bounded, line, unstructured: true };
  const doi = findDoi(bounded);
  if (doi) reference.doi = doi;
  else {
    const preprint = /\barxiv:\s?([\w./-]{9,30})/i.exec(bounded);
    const id = preprint ? normaliseArxiv(preprint[1].replace(/[.,;]$/, '')) : undefined;
    // The archive registers its numbers as DOIs of this form.
    if (id) reference.doi = `10.48550/arxiv.${id}`;
  }
  const year = findUnstructuredYear(bounded.slice(0, 2_000));
  if (year) reference.year = year;
  return reference;
}

/** A year in brackets is the year of the work rather than a number of pages or a year within the title. */
function findUnstructuredYear(text: string): number | undefined {
  const withoutDoi = text.replace(/10\.\d{4,9}\/\S{1,300}/g, ' ');
  for (const match of withoutDoi.matchAll(/\((?:[A-Za-z]{3,9}\.? )?(\d{4})[a-z]?\)/g)) {
    const year = findYear(match[1]);
    if (year) return year;
  }
  return findYear(withoutDoi);
}

/** A line whose layout is not known beforehand: the comma layout where a year or volume and page stand in their places, running text else. */
export function parseAnyReference(raw: string, line: number): CitedReference {
  const found = parseCitedLine(raw, line);
  const fits = !found.unstructured && (found.year !== undefined || (found.volume !== undefined && found.page !== undefined));
  return fits ? found : parseUnstructured(raw, line);
}
