import { type PersonName } from '@/lib/bibliography/record';
import { type Chance } from '@/lib/demonstration/chance';
import { bareInitials, familyWithParticle, foldMarks, initialsOf } from '@/lib/demonstration/names';
import { sourceOf, type Publication, type VariantCounts } from '@/lib/demonstration/publication';

export function count(counts: VariantCounts, kind: string): void {
  counts[kind] = (counts[kind] ?? 0) + 1;
}

/** First author as cited-reference lines have it. */
export function citedAuthor(name: PersonName | undefined, upperCase: boolean, chance: Chance, counts: VariantCounts): string {
  if (!name) return '[Anonymous]';
  if (name.literal) return upperCase ? `*${foldMarks(name.literal).toUpperCase()}` : name.literal;
  const roll = chance.unit();
  if (upperCase) {
    const family = foldMarks(name.particle && chance.happens(0.6) ? familyWithParticle(name).replace(/ /g, '') : familyWithParticle(name)).toUpperCase();
    return `${family} ${foldMarks(bareInitials(name.given)).toUpperCase()}`.trim();
  }
  if (roll < 0.05) {
    count(counts, 'initials-with-dots');
    return `${familyWithParticle(name)}, ${initialsOf(name.given)}`;
  }
  if (roll < 0.08) {
    count(counts, 'initials-missing');
    return familyWithParticle(name);
  }
  return `${familyWithParticle(name)} ${bareInitials(name.given)}`;
}

/** The page of another article: one digit is wrong, as happens in print. */
export function misprint(page: string, chance: Chance): string {
  const place = chance.below(page.length);
  const digit = (Number(page[place]) + 1 + chance.below(8)) % 10;
  return `${page.slice(0, place)}${place === 0 && digit === 0 ? 1 : digit}${page.slice(place + 1)}`;
}

/**
 * One cited reference in the comma layout, with the faults that such lines have.
 *
 * @param upperCase the way of old exports: capitals without accents, seldom a DOI
 */
export function writeCitedLine(cited: Publication, upperCase: boolean, chance: Chance, counts: VariantCounts): string {
  const source = sourceOf(cited);
  const parts = [citedAuthor(cited.authors[0], upperCase, chance, counts), String(cited.year)];
  const roll = chance.unit();
  if (roll < 0.06 && cited.venue) {
    count(counts, 'source-abbreviated-otherwise');
    parts.push(source.short);
  } else if (roll < 0.09 && cited.venue) {
    count(counts, 'source-in-full');
    parts.push(source.full);
  } else parts.push(source.cited);
  if (cited.volume && !dropped(chance, 0.025, 'volume-missing', counts)) parts.push(`V${cited.volume}`);
  if (cited.articleNumber) parts.push(`ARTN ${cited.articleNumber}`);
  else if (cited.firstPage && !dropped(chance, 0.025, 'page-missing', counts)) {
    const wrong = dropped(chance, 0.006, 'page-misprinted', counts);
    parts.push(`P${wrong ? misprint(cited.firstPage, chance) : cited.firstPage}`);
  }
  if (cited.doi && !dropped(chance, upperCase ? 0.62 : 0.18, 'doi-missing', counts)) {
    const capitals = dropped(chance, 0.05, 'doi-in-capitals', counts);
    parts.push(`DOI ${capitals ? cited.doi.toUpperCase() : cited.doi}`);
  }
  return parts.join(', ');
}

export function dropped(chance: Chance, probability: number, kind: string, counts: VariantCounts): boolean {
  if (!chance.happens(probability)) return false;
  count(counts, kind);
  return true;
}

/** Title, source and pages as running text: the way in which registries keep what they could not take apart. */
export function writeCitedText(cited: Publication, chance: Chance): string {
  const authors = cited.authors.slice(0, 3).map((name) => name.literal ?? `${familyWithParticle(name)}, ${initialsOf(name.given)}`).join(', ');
  const source = cited.venue || cited.container ? ` ${sourceOf(cited).full}` : '';
  const pages = cited.firstPage ? `, ${cited.firstPage}–${cited.lastPage ?? cited.firstPage}` : cited.articleNumber ? `, ${cited.articleNumber}` : '';
  const doi = cited.doi && chance.happens(0.5) ? ` https://doi.org/${cited.doi}` : '';
  return `${authors}, ${cited.year}. ${cited.title}.${source}${cited.volume ? ` ${cited.volume}` : ''}${pages}.${doi}`;
}
