import { familyWithParticle } from '@/lib/demonstration/names';
import { type WrittenRecord } from '@/lib/demonstration/publication';
import { writeCitedLine } from '@/lib/demonstration/writing/cited-line';
import { type FormatWriter, type WritingContext } from '@/lib/demonstration/writing/writer';

const types: Record<string, string> = { article: 'JOUR', thesis: 'THES', report: 'RPRT', chapter: 'CHAP', 'conference-paper': 'CPAPER', dataset: 'DATA', book: 'BOOK' };

function writeRecord(record: WrittenRecord, withReferences: boolean, { chance, counts, onReference }: WritingContext): string {
  const { publication } = record;
  const { venue } = publication;
  const lines = [`TY  - ${types[publication.type] ?? 'GEN'}`, `ID  - ${record.key}`];
  const add = (tag: string, value: string | undefined) => value && lines.push(`${tag}  - ${value}`);
  for (const name of publication.authors) add('AU', name.literal ?? [familyWithParticle(name), name.given, name.suffix].filter(Boolean).join(', '));
  add('TI', `${record.retracted ? 'RETRACTED: ' : ''}${publication.title}`);
  add('PY', String(publication.year));
  add('DA', `${publication.year}/${String(publication.month).padStart(2, '0')}//`);
  if (venue) {
    add('JF', venue.name);
    add('JA', venue.short);
    add('SN', venue.issn);
  } else add('T2', publication.container);
  add('VL', publication.volume);
  add('IS', publication.issue);
  add('SP', publication.firstPage ?? publication.articleNumber);
  add('EP', publication.lastPage);
  add('PB', publication.publisher);
  add('CY', publication.place);
  add('DO', publication.doi);
  for (const word of record.keywords) add('KW', word);
  add('AB', record.abstract);
  add('AD', record.affiliation);
  if (withReferences) {
    for (const cited of record.cited) {
      const text = writeCitedLine(cited, false, chance, counts);
      onReference(cited, text);
      add('CR', text);
    }
  }
  lines.push('ER  - ', '');
  return `${lines.join('\n')}\n`;
}

/** RIS has no tag for references; some exports use CR, and with `withReferences` so does this one. */
export const makeRisWriter = (withReferences: boolean): FormatWriter => ({
  format: 'ris',
  opening: () => '',
  between: '',
  ending: '',
  record: (record, context) => writeRecord(record, withReferences, context),
  faults: [
    { kind: 'end-missing', rejected: false },
    { kind: 'empty-entry', rejected: true },
    { kind: 'year-not-read', rejected: false },
  ],
  break(text, kind) {
    if (kind === 'end-missing') return text.replace(/\nER {2}- \n\n$/, '\n');
    if (kind === 'empty-entry') return 'TY  - JOUR\nER  - \n\n';
    return text.replace(/\nPY {2}- (\d)\d(\d\d)\nDA {2}- [^\n]*/, '\nPY  - $1O$2');
  },
});
