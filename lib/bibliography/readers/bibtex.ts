/** BibTeX and BibLaTeX. Ours and linear: see bibtex-scanner.ts for how entries are found, bibtex-fields.ts for how they are taken apart. */
import { parseCitedLine, parseUnstructured } from '@/lib/bibliography/cited-reference';
import { parseDate, parseMonth, parsePages } from '@/lib/bibliography/dates';
import { findDoi, normaliseArxiv, normaliseOrcid, normalisePmcid, normalisePmid } from '@/lib/bibliography/identifiers';
import { texToUnicode, texVerbatim } from '@/lib/bibliography/latex';
import { body, parseName } from '@/lib/bibliography/names';
import { findYear } from '@/lib/bibliography/normalise';
import { type PersonName, type WorkType } from '@/lib/bibliography/record';
import { BibtexBodyReader, splitOutsideBraces, type BibtexField } from '@/lib/bibliography/readers/bibtex-fields';
import { BibtexScanner, type ScannedEntry } from '@/lib/bibliography/readers/bibtex-scanner';
import { EntryBuilder, ReadSession, type Reader, type ReaderOptions } from '@/lib/bibliography/readers/builder';

const types = new Map<string, WorkType>(Object.entries({
  article: 'article', inbook: 'chapter', incollection: 'chapter', inreference: 'chapter', suppbook: 'chapter', book: 'book', mvbook: 'book', collection: 'book', mvcollection: 'book', proceedings: 'book', booklet: 'book', manual: 'report',
  phdthesis: 'thesis', mastersthesis: 'thesis', thesis: 'thesis', techreport: 'report', report: 'report', inproceedings: 'conference-paper', conference: 'conference-paper', dataset: 'dataset', data: 'dataset',
  unpublished: 'preprint', preprint: 'preprint', patent: 'patent', software: 'software', online: 'web', electronic: 'web', www: 'web', webpage: 'web',
}));

/** Fields that a child takes over, and under which name: BibTeX and BibLaTeX rules, common practice. */
const inheritedNames = new Map([['title', 'booktitle'], ['subtitle', 'booksubtitle'], ['booktitle', 'booktitle']]);
const neverInherited = new Set(['crossref', 'xdata', 'ids', 'xref', 'entryset', 'label', 'keywords', 'abstract', 'shorttitle', 'doi', 'pages', 'note']);
const parentTypes = new Set(['book', 'mvbook', 'proceedings', 'mvproceedings', 'collection', 'mvcollection', 'periodical', 'xdata', 'reference', 'mvreference', 'conference']);
/** Up to this many entries every one may be a parent; beyond, only the types that are meant to be. */
const anyParentUntil = 20_000;

const used = new Set(['author', 'editor', 'title', 'subtitle', 'year', 'date', 'month', 'journal', 'journaltitle', 'journalsubtitle', 'shortjournal', 'booktitle', 'booksubtitle', 'maintitle', 'volume', 'number', 'issue', 'pages', 'eid', 'doi', 'eprint',
  'archiveprefix', 'eprinttype', 'pmid', 'pmcid', 'isbn', 'issn', 'url', 'publisher', 'institution', 'school', 'organization', 'address', 'location', 'edition', 'keywords', 'keyword', 'abstract', 'language', 'langid', 'crossref', 'xdata', 'orcid',
  'cited-references', 'cited_references', 'citedreferences', 'series', 'type', 'howpublished', 'note', 'number-of-cited-references']);

interface Held {
  entry: ScannedEntry;
  builder: EntryBuilder;
  fields: Map<string, BibtexField>;
  position: number;
}

function bibtexName(text: string): PersonName | undefined {
  const trimmed = text.trim();
  if (trimmed === '') return undefined;
  // A name that is one group of braces is a body, not a person.
  if (/^\{[^{}]*(?:\{[^{}]*\}[^{}]*)*\}$/.test(trimmed) && !/^\{\\/.test(trimmed)) return body(texToUnicode(trimmed));
  const parts = splitOutsideBraces(trimmed, ',').map(texToUnicode);
  return parseName(parts.join(', '));
}

export function createBibtexReader(options: ReaderOptions): Reader {
  const session = new ReadSession('bibtex', options);
  const macros = new Map<string, string>();
  let macroSize = 0;
  const seen = new Map<string, number>();
  const parents = new Map<string, Map<string, BibtexField>>();
  const held: Held[] = [];
  let position = 0;

  const names = (builder: EntryBuilder, field: BibtexField): { people: PersonName[]; others: boolean } => {
    const people: PersonName[] = [];
    let others = false;
    for (const part of splitOutsideBraces(builder.bounded(field.value, 'author', field.line), 'and')) {
      if (/^(?:others|et\.?\s*al\.?)$/i.test(part)) others = true;
      else {
        const name = bibtexName(part);
        if (name) people.push(name);
      }
    }
    return { people, others };
  };

  const fill = (builder: EntryBuilder, type: string, fields: Map<string, BibtexField>): void => {
    const { fields: out } = builder;
    const text = (...candidates: string[]): string | undefined => {
      for (const name of candidates) {
        const field = fields.get(name);
        if (!field) continue;
        const value = texToUnicode(builder.bounded(field.value, name, field.line));
        if (value !== '') return value;
      }
      return undefined;
    };
    const verbatim = (name: string): string | undefined => {
      const field = fields.get(name);
      return field ? texVerbatim(builder.bounded(field.value, name, field.line)) || undefined : undefined;
    };
    out.type = types.get(type) ?? 'other';
    const join = (main: string | undefined, sub: string | undefined) => (main && sub && !main.toLowerCase().includes(sub.toLowerCase()) ? `${main}: ${sub}` : main);
    out.title = join(text('title'), text('subtitle'));
    const authors = fields.get('author');
    if (authors) {
      const { people, others } = names(builder, authors);
      for (const name of people) builder.addAuthor(name, authors.line);
      if (others) out.othersFollow = true;
    }
    const editors = fields.get('editor');
    if (editors) out.editors = names(builder, editors).people.slice(0, options.limits.authors);
    const date = text('date', 'year');
    const parsed = date ? parseDate(date) : {};
    out.year = parsed.year ?? findYear(text('year') ?? '') ?? findYear(text('month') ?? '');
    if (out.year === undefined && date) builder.problem('warning', 'year-not-read', `"${date.slice(0, 60)}" holds no year.`, (fields.get('date') ?? fields.get('year'))?.line);
    out.month = parsed.month ?? parseMonth(text('month') ?? '');
    out.day = parsed.day;
    out.venue = join(text('journal', 'journaltitle'), text('journalsubtitle')) ?? join(text('booktitle', 'maintitle'), text('booksubtitle'));
    out.venueShort = text('shortjournal');
    out.volume = text('volume');
    out.issue = text('issue', 'number');
    const pages = text('pages');
    if (pages) Object.assign(out, parsePages(pages));
    out.articleNumber = text('eid');
    out.publisher = text('publisher', 'institution', 'school', 'organization');
    out.place = text('address', 'location');
    out.edition = text('edition');
    out.abstract = text('abstract');
    out.language = text('langid', 'language');
    out.url = verbatim('url');
    const keywords = text('keywords', 'keyword');
    if (keywords) builder.addKeywords(keywords, /[;,\n]/);
    builder.setDoi(verbatim('doi'), fields.get('doi')?.line);
    if (!out.identifiers.doi && out.url && /doi\.org\//i.test(out.url)) out.identifiers.doi = findDoi(out.url);
    const eprint = verbatim('eprint');
    const archive = (text('archiveprefix', 'eprinttype') ?? '').toLowerCase();
    if (eprint && (archive === 'arxiv' || archive === '')) out.identifiers.arxiv = normaliseArxiv(eprint);
    if (eprint && archive === 'pubmed') out.identifiers.pmid = normalisePmid(eprint);
    out.identifiers.pmid ??= normalisePmid(verbatim('pmid') ?? '');
    out.identifiers.pmcid = normalisePmcid(verbatim('pmcid') ?? '');
    for (const name of ['isbn', 'issn']) {
      const value = verbatim(name);
      if (value) builder.addSerialNumber(value, fields.get(name)?.line);
    }
    const orcid = normaliseOrcid(verbatim('orcid') ?? '');
    if (orcid && out.authors.length === 1) out.authors[0].orcid = orcid;
    const declared = Number(text('number-of-cited-references'));
    if (Number.isInteger(declared) && declared > 0) out.declaredReferences = declared;
    const cited = fields.get('cited-references') ?? fields.get('cited_references') ?? fields.get('citedreferences');
    if (cited) {
      const lines = cited.value.split('\n');
      builder.addReferences(lines.flatMap((line, index) => {
        const reference = texToUnicode(line.trim());
        if (reference === '') return [];
        const found = parseCitedLine(reference, cited.line + index);
        return [found.unstructured ? parseUnstructured(reference, cited.line + index) : found];
      }));
    }
    for (const [name, field] of fields) if (!used.has(name) || name === 'note' || name === 'series' || name === 'howpublished') builder.other(name.slice(0, 100), texToUnicode(builder.bounded(field.value, name, field.line)));
    if (/^\s*(?:retracted(?: article)?\s*[:.]|\[retracted\])/i.test(out.title ?? '')) out.retracted = true;
    for (const key of Object.keys(out) as (keyof typeof out)[]) if (out[key] === undefined) delete out[key];
    for (const key of Object.keys(out.identifiers) as (keyof typeof out.identifiers)[]) if (out.identifiers[key] === undefined) delete out.identifiers[key];
  };

  const emit = ({ entry, builder, fields, position: at }: Held): void => {
    fill(builder, entry.type, fields);
    session.entries += 1;
    if (fields.size === 0) {
      builder.problem('error', 'empty-entry', `The entry @${entry.type} has no field that could be read.`);
      options.onEntry(builder.rejected(at, entry.raw));
    } else options.onEntry(builder.record(at, entry.raw));
  };

  const defineMacros = (entry: ScannedEntry): void => {
    const reader = new BibtexBodyReader(entry.body, entry.line, macros, options.limits.macroGrowth, (code, message, line) => session.problem('warning', code, message, line));
    for (const [name, field] of reader.read(false).fields) {
      macroSize += field.value.length;
      // A bomb of abbreviations that double each other stops here; fields that use them stay short.
      if (macroSize > options.limits.macroGrowth * 10) {
        session.problem('error', 'abbreviations-too-long', 'The abbreviations of the file grow beyond measure; later ones were left out.', field.line);
        return;
      }
      macros.set(name, field.value);
    }
  };

  const take = (entry: ScannedEntry): void => {
    if (entry.type === 'comment' || entry.type === 'preamble') return;
    if (entry.type === 'string') return defineMacros(entry);
    const builder = new EntryBuilder(entry.line, options.limits);
    const faults: [string, string, number][] = [];
    const { key, fields } = new BibtexBodyReader(entry.body, entry.line, macros, options.limits.macroGrowth, (code, message, line) => faults.push([code, message, line])).read(true);
    builder.key = key || undefined;
    if (!entry.closed) builder.problem('error', 'unbalanced-braces', `The entry @${entry.type}{${key.slice(0, 60)} is not closed; what could be read of it was kept.`);
    for (const [code, message, line] of faults) builder.problem(code === 'undefined-abbreviation' || code === 'repeated-field' || code === 'comma-expected' ? 'warning' : 'error', code, message, line);
    const name = key.toLowerCase();
    if (name !== '') {
      const first = seen.get(name);
      if (first !== undefined) builder.problem('warning', 'duplicate-key', `The key "${key.slice(0, 60)}" stands on line ${first} already; both entries were kept.`);
      else seen.set(name, entry.line);
      if (!parents.has(name) && (parentTypes.has(entry.type) || position < anyParentUntil)) parents.set(name, fields);
    }
    if (entry.type === 'xdata') return;
    const one = { entry, builder, fields, position: position++ };
    // Parents usually stand behind their children: whoever inherits waits for the end of the file.
    if (fields.has('crossref') || fields.has('xdata')) held.push(one);
    else emit(one);
  };

  const inherit = (fields: Map<string, BibtexField>, builder: EntryBuilder, visited: Set<string>): Map<string, BibtexField> => {
    const merged = new Map(fields);
    const sources = [...(fields.get('xdata')?.value.split(',') ?? []).map((key) => ({ key, xdata: true })), ...(fields.has('crossref') ? [{ key: fields.get('crossref')?.value ?? '', xdata: false }] : [])];
    // Chains of a few links are real; deeper or wider ones are built to multiply.
    if (visited.size > 6) return merged;
    for (const { key, xdata } of sources.slice(0, 20)) {
      const name = key.trim().toLowerCase();
      if (name === '') continue;
      const parent = parents.get(name);
      if (visited.has(name)) {
        builder.problem('warning', 'inheritance-loop', `"${key.trim().slice(0, 60)}" inherits from itself; the loop was cut.`);
        continue;
      }
      if (!parent) {
        builder.problem('warning', 'parent-missing', `"${key.trim().slice(0, 60)}", from which this entry inherits, is not in the file.`);
        continue;
      }
      for (const [field, value] of inherit(parent, builder, new Set([...visited, name]))) {
        if (!xdata && neverInherited.has(field)) continue;
        const target = xdata ? field : (inheritedNames.get(field) ?? field);
        if (!merged.has(target)) merged.set(target, value);
      }
    }
    return merged;
  };

  const scanner = new BibtexScanner(take, (text, line) => session.problem('warning', 'stray-text', `Text that looks like an entry but is none: ${text.split('\n')[0].slice(0, 60)}`, line));
  return {
    write: (text) => scanner.write(text),
    end() {
      scanner.end();
      for (const one of held) {
        const name = one.builder.key?.toLowerCase();
        one.fields = inherit(one.fields, one.builder, new Set(name ? [name] : []));
        emit(one);
      }
      return session.summary();
    },
  };
}
