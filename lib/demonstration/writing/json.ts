import { type PersonName } from '@/lib/bibliography/record';
import { familyWithParticle } from '@/lib/demonstration/names';
import { sourceOf, type Publication, type WrittenRecord } from '@/lib/demonstration/publication';
import { count, dropped, misprint, writeCitedText } from '@/lib/demonstration/writing/cited-line';
import { type FormatWriter, type WritingContext } from '@/lib/demonstration/writing/writer';

const registryTypes: Record<string, string> = { article: 'journal-article', thesis: 'dissertation', report: 'report', chapter: 'book-chapter', 'conference-paper': 'proceedings-article', dataset: 'dataset', book: 'book' };
const cslTypes: Record<string, string> = { article: 'article-journal', thesis: 'thesis', report: 'report', chapter: 'chapter', 'conference-paper': 'paper-conference', dataset: 'dataset', book: 'book' };

type Json = Record<string, unknown>;

function registryReference(cited: Publication, key: string, { chance, counts, onReference }: WritingContext): Json {
  const item: Json = { key };
  if (chance.happens(0.05)) {
    count(counts, 'running-text');
    item.unstructured = writeCitedText(cited, chance);
  } else {
    const name = cited.authors[0];
    if (cited.doi && !dropped(chance, 0.12, 'doi-missing', counts)) {
      item.DOI = dropped(chance, 0.04, 'doi-in-capitals', counts) ? cited.doi.toUpperCase() : cited.doi;
      item['doi-asserted-by'] = 'publisher';
    }
    if (name) item.author = name.literal ?? familyWithParticle(name);
    item.year = String(cited.year);
    if (cited.venue) item['journal-title'] = dropped(chance, 0.3, 'source-in-full', counts) ? cited.venue.name : cited.venue.short;
    else item['volume-title'] = sourceOf(cited).full;
    if (cited.volume && !dropped(chance, 0.03, 'volume-missing', counts)) item.volume = cited.volume;
    const page = cited.firstPage ?? cited.articleNumber;
    if (page && !dropped(chance, 0.03, 'page-missing', counts)) item['first-page'] = dropped(chance, 0.006, 'page-misprinted', counts) ? misprint(page, chance) : page;
    if (chance.happens(0.4) && cited.venue) item['article-title'] = cited.title;
  }
  onReference(cited, JSON.stringify({ ...item, key: undefined }));
  return item;
}

function registryName(name: PersonName, place: number, affiliation: string): Json {
  const sequence = place === 0 ? 'first' : 'additional';
  if (name.literal) return { name: name.literal, sequence };
  return {
    ...(name.orcid ? { ORCID: `https://orcid.org/${name.orcid}`, 'authenticated-orcid': false } : {}),
    ...(name.given ? { given: name.given } : {}),
    family: familyWithParticle(name),
    ...(name.suffix ? { suffix: name.suffix } : {}),
    sequence,
    affiliation: place === 0 ? [{ name: affiliation }] : [],
  };
}

function writeRegistryItem(record: WrittenRecord, context: WritingContext): string {
  const { publication } = record;
  const { venue } = publication;
  const item: Json = {
    DOI: publication.doi,
    type: registryTypes[publication.type] ?? 'other',
    title: [publication.title],
    'container-title': venue ? [venue.name] : publication.container ? [publication.container] : [],
    ...(venue ? { 'short-container-title': [venue.short], ISSN: [venue.issn] } : {}),
    author: publication.authors.map((name, place) => registryName(name, place, record.affiliation)),
    published: { 'date-parts': [[publication.year, publication.month]] },
    publisher: publication.publisher,
    volume: publication.volume,
    issue: publication.issue,
    page: publication.firstPage ? `${publication.firstPage}-${publication.lastPage ?? publication.firstPage}` : undefined,
    'article-number': publication.articleNumber,
    subject: record.keywords,
    ...(record.abstract ? { abstract: `<jats:p>${record.abstract}</jats:p>` } : {}),
    ...(record.retracted ? { 'updated-by': [{ type: 'retraction', DOI: `${publication.doi}.r`, label: 'Retraction' }] } : {}),
    'reference-count': record.cited.length,
    reference: record.cited.map((cited, place) => registryReference(cited, `ref${place + 1}`, context)),
  };
  return JSON.stringify(item, null, 1);
}

function cslName(name: PersonName): Json {
  if (name.literal) return { literal: name.literal };
  return { family: name.family, given: name.given, 'non-dropping-particle': name.particle, suffix: name.suffix, ORCID: name.orcid && `https://orcid.org/${name.orcid}` };
}

function writeCslItem(record: WrittenRecord, { chance }: WritingContext): string {
  const { publication } = record;
  const { venue } = publication;
  const year = chance.happens(0.15) ? String(publication.year) : publication.year;
  const item: Json = {
    id: record.key,
    type: cslTypes[publication.type] ?? 'document',
    title: `${record.retracted ? 'RETRACTED: ' : ''}${publication.title}`,
    'container-title': venue?.name ?? publication.container,
    'container-title-short': venue?.short,
    author: publication.authors.map(cslName),
    issued: { 'date-parts': [[year, publication.month]] },
    volume: publication.volume,
    issue: publication.issue,
    page: publication.firstPage && `${publication.firstPage}-${publication.lastPage ?? publication.firstPage}`,
    number: publication.articleNumber,
    publisher: publication.publisher,
    'publisher-place': publication.place,
    ISSN: venue?.issn,
    DOI: publication.doi,
    keyword: record.keywords.join(', '),
    abstract: record.abstract,
    language: 'en',
  };
  return JSON.stringify(item, null, 1);
}

const faults = [
  { kind: 'invalid-json', rejected: true },
  { kind: 'empty-entry', rejected: true },
  { kind: 'invalid-doi', rejected: false },
] as const;

function breakItem(text: string, kind: string): string {
  // A value without quotes: the brackets still balance, so only this item is lost.
  if (kind === 'invalid-json') return text.replace(/"type": "([a-z-]+)"/, '"type": $1');
  if (kind === 'empty-entry') return '{}';
  return text.replace(/"DOI": "10\.[^"]*"/, '"DOI": "not assigned"');
}

export const registryWriter: FormatWriter = {
  format: 'registry-json',
  opening: (records) => `{"status":"ok","message-type":"work-list","message":{"total-results":${records},"items":[\n`,
  between: ',\n',
  ending: '\n]}}\n',
  record: writeRegistryItem,
  faults,
  break: breakItem,
};

export const cslWriter: FormatWriter = { format: 'csl-json', opening: () => '[\n', between: ',\n', ending: '\n]\n', record: writeCslItem, faults, break: breakItem };
