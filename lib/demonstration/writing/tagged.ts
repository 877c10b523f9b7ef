import { bareInitials, familyWithParticle, initialsOf } from '@/lib/demonstration/names';
import { type WrittenRecord } from '@/lib/demonstration/publication';
import { writeCitedLine } from '@/lib/demonstration/writing/cited-line';
import { type FormatWriter, type WritingContext } from '@/lib/demonstration/writing/writer';

const months = ['JAN', 'FEB', 'MAR', 'APR', 'MAY', 'JUN', 'JUL', 'AUG', 'SEP', 'OCT', 'NOV', 'DEC'];
const documentTypes: Record<string, [string, string]> = { article: ['J', 'Article'], 'conference-paper': ['C', 'Proceedings Paper'], chapter: ['B', 'Article; Book Chapter'], book: ['B', 'Book'], dataset: ['J', 'Data Set'] };
/** From this year on, exports keep the case and accents of cited authors. */
const mixedCaseFrom = 2006;

function wrap(tag: string, text: string): string[] {
  const lines: string[] = [];
  let line = tag;
  for (const word of text.split(' ')) {
    if (line.length + word.length + 1 > 80) {
      lines.push(line);
      line = '  ';
    }
    line += ` ${word}`;
  }
  return [...lines, line];
}

function items(tag: string, values: string[]): string[] {
  return values.map((value, place) => `${place === 0 ? tag : '  '} ${value}`);
}

function writeRecord(record: WrittenRecord, { chance, counts, onReference }: WritingContext): string {
  const { publication } = record;
  const [kind, documentType] = documentTypes[publication.type] ?? ['J', 'Article'];
  const people = publication.authors.filter((name) => !name.literal);
  const lines = [`PT ${kind}`];
  if (people.length > 0) {
    const end = (suffix: string | undefined) => (suffix ? `, ${suffix}` : '');
    lines.push(...items('AU', people.map((name) => `${familyWithParticle(name)}, ${bareInitials(name.given)}${end(name.suffix)}`)));
    lines.push(...items('AF', people.map((name) => `${familyWithParticle(name)}, ${name.given ?? initialsOf(name.given)}${end(name.suffix)}`)));
  }
  for (const name of publication.authors) if (name.literal) lines.push(`CA ${name.literal}`);
  lines.push(...wrap('TI', publication.title));
  const { venue } = publication;
  lines.push(...wrap('SO', (venue?.name ?? publication.container ?? publication.publisher ?? 'Tarnholm').toUpperCase()));
  lines.push('LA English', `DT ${documentType}${record.retracted ? '; Retracted Publication' : ''}`);
  if (record.keywords.length > 0) lines.push(...wrap('DE', record.keywords.join('; ')));
  if (record.abstract) lines.push(...wrap('AB', record.abstract));
  lines.push(`C1 ${record.affiliation}`);
  const known = people.filter((name) => name.orcid);
  if (known.length > 0) lines.push(...wrap('OI', known.map((name) => `${familyWithParticle(name)}, ${name.given}/${name.orcid}`).join('; ')));
  const cited = record.cited.map((one) => {
    const text = writeCitedLine(one, publication.year < mixedCaseFrom || chance.happens(0.1), chance, counts);
    onReference(one, text);
    return text;
  });
  if (cited.length > 0) lines.push(...items('CR', cited));
  lines.push(`NR ${cited.length}`);
  if (publication.publisher) lines.push(`PU ${publication.publisher.toUpperCase()}`);
  if (venue) lines.push(`SN ${venue.issn}`, `J9 ${venue.cited}`, `JI ${venue.short}`);
  lines.push(`PD ${months[publication.month - 1]}`, `PY ${publication.year}`);
  if (publication.volume) lines.push(`VL ${publication.volume}`);
  if (publication.issue) lines.push(`IS ${publication.issue}`);
  if (publication.firstPage) lines.push(`BP ${publication.firstPage}`, `EP ${publication.lastPage ?? publication.firstPage}`);
  if (publication.articleNumber) lines.push(`AR ${publication.articleNumber}`);
  if (publication.doi) lines.push(`DI ${publication.doi}`);
  lines.push(`UT TARN:${record.key.slice(4).padStart(12, '0')}`, 'ER', '');
  return `${lines.join('\n')}\n`;
}

export const taggedWriter: FormatWriter = {
  format: 'tagged',
  opening: () => 'FN Tarnholm University demonstration export (invented)\nVR 1.0\n',
  between: '',
  ending: 'EF\n',
  record: writeRecord,
  faults: [
    { kind: 'end-missing', rejected: false },
    { kind: 'empty-entry', rejected: true },
    { kind: 'reference-count', rejected: false },
    { kind: 'year-not-read', rejected: false },
  ],
  break(text, kind) {
    if (kind === 'end-missing') return text.replace(/\nER\n\n$/, '\n');
    if (kind === 'empty-entry') return 'PT J\nER\n\n';
    // Cited references lost on the way: the declared number stays.
    if (kind === 'reference-count') return text.replace(/\nNR (\d+)\n/, (_, declared: string) => `\nNR ${Number(declared) + 3}\n`);
    return text.replace(/\nPD [A-Z]{3}\nPY (\d)\d(\d\d)/, '\nPY $1O$2');
  },
};
