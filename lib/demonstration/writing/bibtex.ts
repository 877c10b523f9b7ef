import { type PersonName } from '@/lib/bibliography/record';
import { familyWithParticle } from '@/lib/demonstration/names';
import { type WrittenRecord } from '@/lib/demonstration/publication';
import { venues } from '@/lib/demonstration/venues';
import { writeCitedLine } from '@/lib/demonstration/writing/cited-line';
import { type FormatWriter, type WritingContext } from '@/lib/demonstration/writing/writer';

const types: Record<string, string> = { article: 'article', thesis: 'phdthesis', report: 'techreport', chapter: 'incollection', 'conference-paper': 'inproceedings', dataset: 'misc', book: 'book' };
const months = ['jan', 'feb', 'mar', 'apr', 'may', 'jun', 'jul', 'aug', 'sep', 'oct', 'nov', 'dec'];
const accents: Record<string, string> = { '\u0300': '`', '\u0301': "'", '\u0302': '^', '\u0303': '~', '\u0308': '"', '\u030c': 'v', '\u0327': 'c', '\u0328': 'k', '\u030a': 'r', '\u0306': 'u', '\u0307': '.', '\u030b': 'H' };
const letters: Record<string, string> = { ø: '{\\o}', Ø: '{\\O}', ł: '{\\l}', Ł: '{\\L}', ı: '{\\i}', æ: '{\\ae}', ß: '{\\ss}', '–': '--', '&': '\\&', '%': '\\%', '#': '\\#' };

/** Unicode to TeX: "Žukowski" -> "{\v{Z}}ukowski". */
export function texEncode(text: string): string {
  return text
    .normalize('NFD')
    .replace(/(\p{L})(\p{M})/gu, (whole, letter: string, mark: string) => (accents[mark] ? `{\\${accents[mark]}{${letter}}}` : whole))
    .replace(/[øØłŁıæß–&%#]/g, (sign) => letters[sign]);
}

/** Names within a title keep their capitals in braces. */
const protect = (title: string): string => title.replace(/(?<=[^.?:] )(\p{Lu}\p{L}+)/gu, '{$1}');

function writeName(name: PersonName): string {
  if (name.literal) return `{${name.literal}}`;
  return [familyWithParticle(name), name.suffix, name.given].filter(Boolean).join(', ');
}

function writeRecord(record: WrittenRecord, style: 'bibtex' | 'biblatex', { chance, counts, onReference }: WritingContext): string {
  const { publication } = record;
  const { venue } = publication;
  const modern = style === 'biblatex';
  const encode = modern ? (text: string) => text.replace(/[&%#]/g, (sign) => `\\${sign}`) : texEncode;
  const fields: string[] = [];
  const add = (name: string, value: string | undefined) => value && fields.push(`  ${name} = {${encode(value)}}`);
  const raw = (name: string, value: string | undefined) => value && fields.push(`  ${name} = ${value}`);
  add('author', publication.authors.map(writeName).join(' and '));
  fields.push(`  title = {${encode(`${record.retracted ? 'Retracted: ' : ''}${protect(publication.title)}`)}}`);
  if (venue && modern) {
    add('journaltitle', venue.name);
    add('shortjournal', venue.short);
  } else if (venue) raw('journal', venue.key);
  else add(publication.type === 'report' || publication.type === 'book' ? 'series' : 'booktitle', publication.container);
  if (modern) add('date', `${publication.year}-${String(publication.month).padStart(2, '0')}`);
  else {
    raw('year', String(publication.year));
    raw('month', months[publication.month - 1]);
  }
  add('volume', publication.volume);
  add('number', publication.issue);
  if (publication.firstPage) fields.push(`  pages = {${publication.firstPage}--${publication.lastPage ?? publication.firstPage}}`);
  add('eid', publication.articleNumber);
  add(publication.type === 'thesis' ? 'school' : publication.type === 'report' ? 'institution' : 'publisher', publication.publisher);
  raw('issn', venue && `{${venue.issn}}`);
  raw('doi', publication.doi && `{${publication.doi}}`);
  add('abstract', record.abstract);
  if (record.cited.length > 0) {
    const lines = record.cited.map((cited) => {
      const text = writeCitedLine(cited, publication.year < 2000, chance, counts);
      onReference(cited, text);
      return encode(text);
    });
    raw('cited-references', `{${lines.join('\n   ')}}`);
    raw('number-of-cited-references', `{${lines.length}}`);
  }
  add('keywords', record.keywords.join(', '));
  return `@${modern && publication.type === 'report' ? 'report' : types[publication.type]}{${record.key},\n${fields.join(',\n')}\n}\n`;
}

export const makeBibtexWriter = (style: 'bibtex' | 'biblatex'): FormatWriter => ({
  format: 'bibtex',
  opening: () => `% Tarnholm University and everything in this file is invented.\n${style === 'bibtex' ? `${venues.map(({ key, name }) => `@string{${key} = "${texEncode(name)}"}`).join('\n')}\n` : ''}\n`,
  between: '\n',
  ending: '',
  record: (record, context) => writeRecord(record, style, context),
  faults: [
    { kind: 'unbalanced-braces', rejected: false },
    { kind: 'empty-entry', rejected: true },
    { kind: 'undefined-abbreviation', rejected: false },
  ],
  break(text, kind) {
    // The keywords come last, so a brace that is missing there costs nothing else.
    if (kind === 'unbalanced-braces') return text.replace(/\}\n\}\n$/, '\n}\n');
    if (kind === 'empty-entry') return text.replace(/\n[\s\S]*$/, '\n}\n');
    return text.replace(/\n\}\n$/, ',\n  note = shelf-mark-unknown\n}\n');
  },
});
