/** BibTeX and BibLaTeX. Ours and linear: bibtex-scanner.ts finds the entries, bibtex-fields.ts takes them apart, bibtex-record.ts makes records of them. */
import { BibtexBodyReader, type BibtexField } from '@/lib/bibliography/readers/bibtex-fields';
import { BibtexRecordFiller, describesWork } from '@/lib/bibliography/readers/bibtex-record';
import { BibtexScanner, type ScannedEntry } from '@/lib/bibliography/readers/bibtex-scanner';
import { EntryBuilder, ReadSession, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';

type Fields = Map<string, BibtexField>;

/** Fields that a child takes over, and under which name: BibTeX and BibLaTeX rules, common practice. */
const inheritedNames = new Map([['title', 'booktitle'], ['subtitle', 'booksubtitle'], ['booktitle', 'booktitle']]);
const neverInherited = new Set(['crossref', 'xdata', 'ids', 'xref', 'entryset', 'label', 'keywords', 'abstract', 'shorttitle', 'doi', 'pages', 'note', 'options', 'sortkey', 'url', 'urldate']);
const parentTypes = new Set(['book', 'mvbook', 'proceedings', 'mvproceedings', 'collection', 'mvcollection', 'periodical', 'xdata', 'reference', 'mvreference', 'conference']);
/** Up to this many entries every one may be a parent; beyond, only the types that are meant to be. */
const anyParentUntil = 20_000;
/** Characters of entries that wait for their parents, and of possible parents: beyond, an entry inherits from what came before it. */
const mostWaiting = 120_000_000;
/** Links of one chain of inheritance, and parents that one entry may name. */
const longestChain = 6;
const mostParents = 20;
const mostInherited = 300;
/** Parents looked up in one file: real files stay far below, built ones would take minutes. */
const mostInheritances = 1_000_000;
const mildFaults = new Set(['undefined-abbreviation', 'repeated-field', 'comma-expected', 'quote-in-value', 'field-expected']);

interface Held {
  entry: ScannedEntry;
  builder: EntryBuilder;
  fields: Fields;
  position: number;
}

class BibtexReader implements Reader {
  private readonly session: ReadSession;
  private readonly scanner: BibtexScanner;
  private readonly macros = new Map<string, string>();
  private macroSize = 0;
  /** Line of the first entry under each key. */
  private readonly seen = new Map<string, number>();
  private readonly parents = new Map<string, Fields>();
  private held: Held[] = [];
  private waiting = 0;
  private nextPosition = 0;
  private inheritances = 0;

  constructor(private readonly options: ReaderOptions) {
    this.session = new ReadSession('bibtex', options);
    this.scanner = new BibtexScanner((entry) => this.take(entry), (code, message, line) => this.session.problem('warning', code, message, line));
  }

  write(text: string): void {
    this.scanner.write(text);
  }

  end() {
    this.scanner.end();
    for (const one of this.held) this.emitWithInheritance(one);
    this.held = [];
    return this.session.summary();
  }

  private take(entry: ScannedEntry): void {
    if (entry.type === 'comment' || entry.type === 'preamble') return;
    if (entry.type === 'string') return this.defineMacros(entry);
    const builder = new EntryBuilder(entry.line, this.options.limits);
    const reader = new BibtexBodyReader(entry.body, entry.bodyLine, this.macros, this.options.limits.macroGrowth, (code, message, line) => builder.problem(mildFaults.has(code) ? 'warning' : 'error', code, message, line));
    const key = reader.readKey();
    builder.key = key || undefined;
    if (!entry.closed) builder.problem('error', 'unbalanced-braces', `The entry @${entry.type}{${key.slice(0, 60)} is not closed; what could be read of it was kept.`);
    const fields = reader.readFields();
    this.register(entry, builder, key, fields);
    const one = { entry, builder, fields, position: this.nextPosition };
    this.nextPosition += 1;
    if (!fields.has('crossref') && !fields.has('xdata')) return this.emit(one);
    // Parents usually stand behind their children: whoever inherits waits for the end of the file.
    this.waiting += entry.raw.length;
    if (this.waiting <= mostWaiting) this.held.push(one);
    else this.emitWithInheritance(one);
  }

  private register(entry: ScannedEntry, builder: EntryBuilder, key: string, fields: Fields): void {
    const name = key.toLowerCase();
    if (name === '') return;
    const first = this.seen.get(name);
    if (first !== undefined) builder.problem('warning', 'duplicate-key', `The key "${key.slice(0, 60)}" stands on line ${first} already; both entries were kept.`);
    else this.seen.set(name, entry.line);
    if (this.parents.has(name) || this.waiting > mostWaiting || (!parentTypes.has(entry.type) && this.nextPosition >= anyParentUntil)) return;
    this.parents.set(name, fields.size > mostInherited ? new Map([...fields].slice(0, mostInherited)) : fields);
    this.waiting += entry.raw.length;
  }

  private defineMacros(entry: ScannedEntry): void {
    const reader = new BibtexBodyReader(entry.body, entry.bodyLine, this.macros, this.options.limits.macroGrowth, (code, message, line) => this.session.problem('warning', code, message, line));
    for (const [name, field] of reader.readFields()) {
      this.macroSize += field.value.length;
      // A bomb of abbreviations that double each other stops here; fields that use them stay short.
      if (this.macroSize > this.options.limits.macroGrowth * 10) return this.session.problem('error', 'abbreviations-too-long', 'The abbreviations of the file grow beyond measure; later ones were left out.', field.line);
      this.macros.set(name, field.value);
    }
  }

  private emit({ entry, builder, fields, position }: Held): void {
    if (entry.type === 'xdata') builder.problem('warning', 'not-a-work', 'An @xdata entry holds fields for other entries and describes no work of its own.');
    else if (describesWork(fields)) {
      new BibtexRecordFiller(builder, fields).fill(entry.type);
      return this.session.emit((at) => builder.record(at, entry.raw), position);
    } else builder.problem('error', 'empty-entry', `The entry @${entry.type} has no field that describes a work.`);
    this.session.emit((at) => builder.rejected(at, entry.raw), position);
  }

  private emitWithInheritance(one: Held): void {
    const name = one.builder.key?.toLowerCase();
    this.emit({ ...one, fields: this.inherit(one.fields, one.builder, name ? [name] : []) });
  }

  private inherit(fields: Fields, builder: EntryBuilder, visited: readonly string[]): Fields {
    const merged = new Map(fields);
    // Chains of a few links are real; deeper or wider ones are built to multiply.
    if (visited.length > longestChain) return merged;
    const sources = (fields.get('xdata')?.value.slice(0, 10_000).split(',') ?? []).slice(0, mostParents).map((key) => ({ key, whole: true }));
    const crossref = fields.get('crossref');
    if (crossref) sources.push({ key: crossref.value.slice(0, 1_000), whole: false });
    // Wide trees would grow by the power of their depth: only the entry itself may name many parents.
    for (const { key, whole } of visited.length > 1 ? sources.slice(0, visited.length > 2 ? 1 : 4) : sources) {
      const name = key.trim().toLowerCase();
      if (name === '') continue;
      this.inheritances += 1;
      if (this.inheritances > mostInheritances) {
        builder.problem('error', 'inheritance-too-wide', 'The entries of the file inherit from each other beyond measure; this one was left as it stands.');
        return merged;
      }
      const parent = this.parents.get(name);
      if (visited.includes(name)) builder.problem('warning', 'inheritance-loop', `"${key.trim().slice(0, 60)}" inherits from itself; the loop was cut.`);
      else if (!parent) builder.problem('warning', 'parent-missing', `"${key.trim().slice(0, 60)}", from which this entry inherits, is not in the file.`);
      else {
        for (const [field, value] of this.inherit(parent, builder, [...visited, name])) {
          if (!whole && neverInherited.has(field)) continue;
          const target = whole ? field : (inheritedNames.get(field) ?? field);
          if (!merged.has(target)) merged.set(target, value);
        }
      }
    }
    return merged;
  }
}

export function createBibtexReader(options: ReaderOptions): Reader {
  return new BibtexReader(options);
}
