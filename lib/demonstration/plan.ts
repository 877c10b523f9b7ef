import { type CataloguedWork } from '@/lib/demonstration/catalogue';
import { type Chance } from '@/lib/demonstration/chance';
import { doubtfulDifferences, harmlessDifferences, type Difference } from '@/lib/demonstration/duplicates';
import { type Owner } from '@/lib/demonstration/topics';
import { makeBibtexWriter } from '@/lib/demonstration/writing/bibtex';
import { cslWriter, registryWriter } from '@/lib/demonstration/writing/json';
import { makeRisWriter } from '@/lib/demonstration/writing/ris';
import { taggedWriter } from '@/lib/demonstration/writing/tagged';
import { type FormatWriter } from '@/lib/demonstration/writing/writer';

/** One record to be written: the first of its work, or a further one that differs in a known way. */
export interface PlannedRecord {
  work: number;
  difference: Difference | null;
}

export interface PlannedFile {
  owner: Owner;
  name: string;
  writer: FormatWriter;
  records: PlannedRecord[];
}

/** What a source holds of its owner's works. The first source of an owner that takes a work is the one that has its first record. */
interface Source {
  owner: Owner;
  name: string;
  writer: FormatWriter;
  takes: (work: CataloguedWork) => boolean;
  /** Number of records of works that another file holds already. */
  copies: number;
  /** Of which so many leave it to a person whether they are the same. */
  doubtful: number;
}

const indexed = ({ publication: { type } }: CataloguedWork) => type !== 'thesis' && type !== 'report';
const until = (year: number) => (work: CataloguedWork) => indexed(work) && work.publication.year <= year;
const registered = (work: CataloguedWork) => indexed(work) && work.publication.doi !== undefined;
const rest = () => true;
const none = () => false;

/** Departments first: what the faculty's lists repeat is catalogued by then. */
const sources: Source[] = [
  { owner: 'freshwater', name: 'freshwater-ecology-1985-2006.txt', writer: taggedWriter, takes: until(2006), copies: 4, doubtful: 0 },
  { owner: 'freshwater', name: 'freshwater-ecology-2007-2016.txt', writer: taggedWriter, takes: until(2016), copies: 4, doubtful: 0 },
  { owner: 'freshwater', name: 'freshwater-ecology-2017-2025.json', writer: registryWriter, takes: registered, copies: 2, doubtful: 0 },
  { owner: 'freshwater', name: 'freshwater-reading-room.ris', writer: makeRisWriter(false), takes: rest, copies: 130, doubtful: 9 },
  { owner: 'peat', name: 'peat-and-soil-1985-2009.bib', writer: makeBibtexWriter('bibtex'), takes: until(2009), copies: 4, doubtful: 0 },
  { owner: 'peat', name: 'peat-and-soil-2010-2025.txt', writer: taggedWriter, takes: indexed, copies: 4, doubtful: 0 },
  { owner: 'peat', name: 'peat-theses-and-reports.json', writer: cslWriter, takes: rest, copies: 140, doubtful: 7 },
  { owner: 'coast', name: 'coastal-engineering-1985-2008.txt', writer: taggedWriter, takes: until(2008), copies: 4, doubtful: 0 },
  { owner: 'coast', name: 'coastal-engineering-2009-2025.json', writer: registryWriter, takes: registered, copies: 2, doubtful: 0 },
  { owner: 'coast', name: 'coastal-reports.ris', writer: makeRisWriter(true), takes: rest, copies: 110, doubtful: 8 },
  { owner: 'faculty', name: 'faculty-joint-works.bib', writer: makeBibtexWriter('biblatex'), takes: rest, copies: 4, doubtful: 0 },
  { owner: 'faculty', name: 'faculty-annual-lists.ris', writer: makeRisWriter(false), takes: none, copies: 430, doubtful: 12 },
  { owner: 'faculty', name: 'faculty-repository.json', writer: cslWriter, takes: none, copies: 560, doubtful: 8 },
  { owner: 'faculty', name: 'faculty-registry-extract.json', writer: registryWriter, takes: none, copies: 280, doubtful: 0 },
];

/** Works that a source may repeat: its owner's own; for the faculty those of the departments, the most cited likelier than others. */
function chooseCopies(source: Source, works: CataloguedWork[], citations: Int32Array, own: PlannedRecord[], chance: Chance): PlannedRecord[] {
  const registry = source.writer.format === 'registry-json';
  const eligible = (work: CataloguedWork, number: number) =>
    (source.takes === none ? work.owner !== 'faculty' : work.owner === source.owner) && (!registry || work.publication.doi !== undefined) && !own.some((record) => record.work === number && source.copies > 100);
  // A record that repeats its own file: only sources that hold works of their own have such.
  const candidates = source.copies < 100 ? own.map((record) => record.work) : works.flatMap((work, number) => (eligible(work, number) ? [number] : []));
  const keyed = candidates.map((number) => ({ number, key: chance.unit() ** (1 / (1 + (source.takes === none ? citations[number] : 0))) }));
  keyed.sort((a, b) => b.key - a.key || a.number - b.number);
  let doubtful = source.doubtful;
  return keyed.slice(0, source.copies).map(({ number }) => {
    const { publication, retracted } = works[number];
    // Only a telling title lets a person decide, and a notice of retraction would decide for them.
    const fit = doubtful > 0 && !works[number].hub && publication.type === 'article' && publication.title.length > 40 && !retracted && publication.year < 2024;
    if (fit) doubtful -= 1;
    const harmless = registry ? harmlessDifferences.filter((difference) => difference !== 'doi-missing') : retracted ? (['none'] as const) : harmlessDifferences;
    return { work: number, difference: fit ? chance.pick(doubtfulDifferences) : chance.pick(harmless) };
  });
}

/**
 * Which file holds which records. Every work has exactly one first record.
 *
 * @param citations number of catalogued works that cite each work
 */
export function planFiles(works: CataloguedWork[], citations: Int32Array, chance: Chance): PlannedFile[] {
  const placed = new Set<number>();
  return sources.map((source) => {
    const own: PlannedRecord[] = [];
    works.forEach((work, number) => {
      if (work.owner !== source.owner || placed.has(number) || !source.takes(work)) return;
      placed.add(number);
      own.push({ work: number, difference: null });
    });
    const copies = chooseCopies(source, works, citations, own, chance);
    return { owner: source.owner, name: source.name, writer: source.writer, records: chance.shuffled([...own, ...copies]) };
  });
}
