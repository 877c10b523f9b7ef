/** What the readers of line formats share: a record is a run of tagged lines, each with its place, and the raw text they stood in. */
import { EntryBuilder, ReadSession, type ReaderOptions } from '@/lib/bibliography/readers/builder';
import { LineSplitter } from '@/lib/bibliography/readers/lines';
import { type Format } from '@/lib/bibliography/record';

export interface TaggedValue {
  text: string;
  line: number;
}

/** Values of one record by tag, in the order of the file. */
export class TaggedValues {
  private readonly byTag = new Map<string, TaggedValue[]>();

  get tags(): IterableIterator<[string, TaggedValue[]]> {
    return this.byTag.entries();
  }

  has(tag: string): boolean {
    return this.byTag.has(tag);
  }

  add(tag: string, value: TaggedValue): void {
    const former = this.byTag.get(tag);
    if (former) former.push(value);
    else this.byTag.set(tag, [value]);
  }

  /** Values that are not empty. */
  all(tag: string): TaggedValue[] {
    return this.byTag.get(tag)?.filter((value) => value.text !== '') ?? [];
  }

  /** First value that is not empty, of the first tag that has one. */
  first(...tags: string[]): TaggedValue | undefined {
    for (const tag of tags) {
      const values = this.byTag.get(tag);
      if (values) for (const value of values) if (value.text !== '') return value;
    }
    return undefined;
  }

  /** True when no tag but the given ones has a value. */
  isEmpty(...but: string[]): boolean {
    for (const [tag, values] of this.byTag) if (!but.includes(tag) && values.some((value) => value.text !== '')) return false;
    return true;
  }
}

/** The record under way, and the lines it is made of. */
export class TaggedRecord {
  readonly values = new TaggedValues();
  lastTag = '';
  private current: TaggedValue | null = null;
  private pieces: string[] = [];
  private length = 0;
  private raw: string[] = [];
  private rawLength = 0;

  constructor(readonly line: number, private readonly options: ReaderOptions) {}

  keepRaw(text: string): void {
    if (this.rawLength > this.options.limits.rawLength) return;
    this.raw.push(text);
    this.rawLength += text.length + 1;
  }

  get rawText(): string {
    return this.raw.join('\n').trimEnd();
  }

  add(tag: string, text: string, line: number): void {
    this.settle();
    this.current = { text: text.trim(), line };
    this.length = text.length;
    this.lastTag = tag;
    this.values.add(tag, this.current);
  }

  /** A line that continues the value before it. Pieces are joined once, at the end: joining line by line would be quadratic in a hostile file. */
  continueWith(text: string, separator: ' ' | '\n' = ' '): void {
    if (!this.current) return;
    // One character beyond the limit is let through, so that the cut is noticed and told.
    if (this.length > this.options.limits.fieldLength) return;
    this.pieces.push(separator, text.trim());
    this.length += text.length + 1;
  }

  settle(): void {
    if (this.current && this.pieces.length > 0) this.current.text = (this.current.text + this.pieces.join('')).trim();
    this.pieces = [];
  }
}

/** Frame of a line reader: collects records, hands them over, tells strays. */
export abstract class TaggedLineReader {
  protected readonly session: ReadSession;
  protected record: TaggedRecord | null = null;
  private readonly lines: LineSplitter;

  constructor(format: Format, protected readonly options: ReaderOptions) {
    this.session = new ReadSession(format, options);
    this.lines = new LineSplitter((text, line) => this.takeLine(text, line), (line) => this.session.problem('error', 'line-too-long', 'The line is longer than four million characters; the rest of it was left out.', line));
  }

  protected abstract takeLine(text: string, line: number): void;
  /** Fills the builder; false when the record holds nothing. */
  protected abstract fill(builder: EntryBuilder, values: TaggedValues): boolean;
  /** What is said of a record without its end; undefined where records end without a sign. */
  protected abstract readonly endTag: string | undefined;

  write(text: string): void {
    this.lines.write(text);
  }

  end() {
    this.lines.end();
    if (this.record && this.endTag) this.session.problem('warning', 'end-missing', `The file ends within a record; ${this.endTag} is missing.`, this.record.line);
    this.close();
    return this.session.summary();
  }

  protected begin(line: number): TaggedRecord {
    this.record = new TaggedRecord(line, this.options);
    return this.record;
  }

  protected close(): void {
    const { record } = this;
    if (!record) return;
    this.record = null;
    record.settle();
    const builder = new EntryBuilder(record.line, this.options.limits);
    const filled = this.fill(builder, record.values);
    if (!filled) builder.problem('error', 'empty-entry', 'The record holds nothing that describes a work.');
    this.session.emit((position) => (filled ? builder.record(position, record.rawText) : builder.rejected(position, record.rawText)));
  }

  protected stray(text: string, line: number): void {
    if (text.trim() !== '') this.session.problem('warning', 'stray-text', `Text outside a record: ${text.trim().slice(0, 60)}`, line);
  }
}

/** Text of the first tag that has a value, cut at the limit. */
export function boundedText(builder: EntryBuilder, values: TaggedValues, ...tags: string[]): string | undefined {
  const found = values.first(...tags);
  return found ? builder.bounded(found.text, tags.join('/'), found.line) : undefined;
}
