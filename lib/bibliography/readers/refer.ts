/** %-tagged text (refer): "%T title", one tag a line, untagged lines continue; a blank line ends the record. Tag meanings: common practice. */
import { parseDate, parsePages } from '@/lib/bibliography/dates';
import { findDoi, normaliseDoi } from '@/lib/bibliography/identifiers';
import { body, parseInvertedName, parseName } from '@/lib/bibliography/names';
import { type WorkType } from '@/lib/bibliography/record';
import { type EntryBuilder, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { boundedText, TaggedLineReader, type TaggedValues } from '@/lib/bibliography/readers/tagged-lines';

const tagLine = /^%([0-9A-Z@!$&()*+?^<>~[\]#=|])(?:\s(.*)|)$/;
const placed = new Set([...'0ATJBDVNPR@UXKEICF7G+M8']);
const types: [RegExp, WorkType][] = [
  [/journal|magazine|newspaper|electronic article/i, 'article'], [/book section|chapter/i, 'chapter'], [/conference paper/i, 'conference-paper'], [/conference|proceedings/i, 'conference-paper'], [/book/i, 'book'], [/thesis|dissertation/i, 'thesis'], [/report|standard/i, 'report'],
  [/dataset/i, 'dataset'], [/patent/i, 'patent'], [/program|software/i, 'software'], [/web|blog|online/i, 'web'], [/unpublished|preprint/i, 'preprint'],
];

class ReferReader extends TaggedLineReader implements Reader {
  protected readonly endTag = undefined;
  private blankBefore = false;

  constructor(options: ReaderOptions) {
    super('refer', options);
  }

  protected takeLine(text: string, line: number): void {
    if (text.trim() === '') {
      this.blankBefore = true;
      return;
    }
    const match = tagLine.exec(text);
    const { blankBefore } = this;
    this.blankBefore = false;
    if (!match) {
      if (!this.record) return this.stray(text, line);
      this.record.keepRaw(text);
      return this.record.continueWith(text);
    }
    // A blank line may also stand within an abstract: where records name their type, only the next type begins a record.
    const named = this.record?.values.has('0') ?? false;
    if (this.record && (named ? match[1] === '0' : blankBefore)) this.close();
    const record = this.record ?? this.begin(line);
    record.keepRaw(text);
    record.add(match[1], match[2] ?? '', line);
  }

  protected fill(builder: EntryBuilder, values: TaggedValues): boolean {
    const text = (...tags: string[]) => boundedText(builder, values, ...tags);
    const kind = text('0');
    const known = kind ? types.find(([pattern]) => pattern.test(kind))?.[1] : undefined;
    const pages = text('P');
    const date = parseDate(text('D') ?? '');
    const fuller = parseDate(text('8') ?? '');
    builder.key = text('F', 'L', 'M');
    builder.set({
      // Without %0 the fields tell the kind: a journal, a book around it, or a publisher alone.
      type: known ?? (kind ? 'other' : values.has('J') ? 'article' : values.has('B') ? 'chapter' : values.has('I') ? 'book' : 'other'),
      title: text('T'),
      ...(date.year && !date.month && fuller.year === date.year ? fuller : date),
      venue: text('J', 'B'),
      volume: text('V'),
      issue: text('N'),
      ...(pages ? parsePages(pages) : {}),
      publisher: text('I'),
      place: text('C'),
      edition: text('7'),
      abstract: text('X'),
      language: text('G'),
      url: text('U'),
    });
    if (values.has('D') && builder.fields.year === undefined) builder.problem('warning', 'year-not-read', `"${(text('D') ?? '').slice(0, 60)}" holds no year.`, values.first('D')?.line);
    for (const { text: name, line } of values.all('A')) builder.addAuthor(name.endsWith(',') ? body(name.slice(0, -1)) : name.includes(',') ? parseInvertedName(name) : parseName(name), line);
    for (const { text: name, line } of values.all('E')) builder.addEditor(parseInvertedName(name), line);
    for (const { text: words, line } of values.all('K')) builder.addKeywords(words, words.includes(';') ? /;/ : /,/, line);
    for (const { text: numbers, line } of values.all('@')) builder.addSerialNumber(numbers, line);
    for (const { text: place, line } of values.all('+')) builder.addAffiliation(place, line);
    // %R is a DOI in newer files and the number of a report in older ones.
    const doi = normaliseDoi(text('R') ?? '');
    const report = text('R');
    if (report && !doi) builder.other('R', report, values.first('R')?.line);
    const { url } = builder.fields;
    builder.identify({ doi: doi ?? (url && /doi\.org\//i.test(url) ? findDoi(url) : undefined), accession: text('M')?.slice(0, 200) });
    for (const [tag, all] of values.tags) if (!placed.has(tag)) for (const { text: value, line } of all) builder.other(tag, value, line);
    return !builder.tellsNothing;
  }
}

export function createReferReader(options: ReaderOptions): Reader {
  return new ReferReader(options);
}
