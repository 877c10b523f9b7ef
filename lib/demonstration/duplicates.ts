import { type Chance } from '@/lib/demonstration/chance';
import { initialsOf } from '@/lib/demonstration/names';
import { type Publication } from '@/lib/demonstration/publication';
import { capitalise } from '@/lib/demonstration/titles';

/** How a second record of a work differs from the first. */
export const harmlessDifferences = ['none', 'title-case', 'title-signs', 'initials', 'doi-missing'] as const;
/** Differences beyond what merges by itself: a person has to look. Such records carry no DOI. */
export const doubtfulDifferences = ['title-slip', 'year-slip'] as const;
export type Difference = (typeof harmlessDifferences)[number] | (typeof doubtfulDifferences)[number];

const smallWords = new Set(['a', 'an', 'and', 'as', 'at', 'by', 'for', 'from', 'in', 'of', 'on', 'or', 'the', 'to', 'with', 'under']);
const titleCase = (title: string): string => title.split(' ').map((word, place) => (place > 0 && smallWords.has(word) ? word : capitalise(word))).join(' ');

/** A hyphen lost, or a letter of the longest word. */
function slip(title: string, chance: Chance): string {
  if (/\p{L}-\p{L}/u.test(title)) return title.replace(/(\p{L})-(\p{L})/u, '$1$2');
  const longest = title.split(' ').reduce((best, word) => (word.length > best.length ? word : best), '');
  const place = chance.between(2, longest.length - 2);
  return title.replace(longest, `${longest.slice(0, place)}${longest.slice(place + 1)}`);
}

/** A copy of the publication as another source tells of it; the original is left alone. */
export function describeOtherwise(publication: Publication, difference: Difference, chance: Chance): Publication {
  const copy = { ...publication };
  if (difference === 'title-case') copy.title = titleCase(copy.title);
  else if (difference === 'title-signs') copy.title = copy.title.replace(/\?$/, '').replace(/: /, ' – ');
  else if (difference === 'initials') copy.authors = copy.authors.map((name) => (name.given ? { ...name, given: initialsOf(name.given), orcid: undefined } : name));
  else if (difference !== 'none') delete copy.doi;
  if (difference === 'title-slip') copy.title = slip(copy.title, chance);
  if (difference === 'year-slip') copy.year += chance.happens(0.5) ? 1 : -1;
  return copy;
}
