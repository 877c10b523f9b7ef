import { type Format } from '@/lib/bibliography/record';
import { demonstrationPeople } from '@/lib/demonstration/accounts';
import { affiliationOf, makeCatalogue, type CataloguedWork } from '@/lib/demonstration/catalogue';
import { Chance } from '@/lib/demonstration/chance';
import { makeReferences, type ReferenceList } from '@/lib/demonstration/citing';
import { describeOtherwise, doubtfulDifferences } from '@/lib/demonstration/duplicates';
import { NameRegister } from '@/lib/demonstration/names';
import { OutsideLiterature } from '@/lib/demonstration/outside';
import { planFiles, type PlannedFile } from '@/lib/demonstration/plan';
import { portfolioFrames, units, type DemonstrationUnit, type PortfolioFrame } from '@/lib/demonstration/portfolios';
import { type Publication, type WrittenRecord } from '@/lib/demonstration/publication';
import { emptyStatistics, VariantLedger, type DemonstrationStatistics, type FileStatistics } from '@/lib/demonstration/statistics';
import { TitleRegister } from '@/lib/demonstration/titles';
import { topics } from '@/lib/demonstration/topics';
import { PageLedger } from '@/lib/demonstration/venues';

export interface DemonstrationFile {
  name: string;
  format: Format;
  content: string;
}

export interface DemonstrationPortfolio extends PortfolioFrame {
  files: DemonstrationFile[];
}

/** What is true of the invented world, whatever the files make of it. */
export interface DemonstrationTruth {
  works: { key: string; title: string; year: number; doi: string | null; topic: string; owner: string; retracted: boolean; firstAuthor: string }[];
  /** Citations among catalogued works, as numbers in `works`. */
  citing: Uint32Array;
  cited: Uint32Array;
}

export interface Demonstration {
  units: DemonstrationUnit[];
  portfolios: DemonstrationPortfolio[];
  people: typeof demonstrationPeople;
  statistics: DemonstrationStatistics;
  truth: DemonstrationTruth;
}

const catalogueSize = 3000;
/** Share of references that stand twice in one list. */
const repeatedShare = 0.003;

/**
 * The bibliography of Tarnholm University, which does not exist: units, portfolios with their export files, and what is true of them.
 * The same seed gives the same bytes.
 */
export function generateDemonstration(seed = 1): Demonstration {
  const registers = { names: new NameRegister(), titles: new TitleRegister(), pages: new PageLedger() };
  const works = makeCatalogue(catalogueSize, seed, registers);
  const outside = new OutsideLiterature(seed, registers);
  const lists = makeReferences(works, outside, seed);
  const truth = describeTruth(works, lists);
  const citations = new Int32Array(works.length);
  for (const number of truth.cited) citations[number] += 1;

  const plan = planFiles(works, citations, new Chance(seed, 4));
  const statistics = emptyStatistics();
  const publications = [...works.map(({ publication }) => publication), ...outside.works];
  const ledger = new VariantLedger(new Map(publications.map((publication, number) => [publication, number])), works.length);
  const world = { works, lists, publications, ranks: rankForLists(publications) };
  const written = plan.map((file, place) => writeFile(file, world, new Chance(seed, 5, place), statistics, ledger));

  Object.assign(statistics, {
    works: works.length,
    outsideWorks: outside.works.length,
    citations: { inside: truth.cited.length, outside: lists.reduce((sum, list) => sum + list.outside.length, 0) },
    worksWithoutDoi: works.filter(({ publication }) => publication.doi === undefined).length,
    retracted: works.filter(({ retracted }) => retracted).length,
    mostCited: [...citations].sort((a, b) => b - a).slice(0, 10),
  });
  Object.assign(statistics.variants, ledger.summarise());
  const portfolios = portfolioFrames.map((frame) => ({ ...frame, files: written.filter(({ owner }) => owner === frame.owner).map(({ file }) => file) }));
  return { units, portfolios, people: demonstrationPeople, statistics, truth };
}

function describeTruth(works: CataloguedWork[], lists: ReferenceList[]): DemonstrationTruth {
  const total = lists.reduce((sum, list) => sum + list.inside.length, 0);
  const truth: DemonstrationTruth = { works: [], citing: new Uint32Array(total), cited: new Uint32Array(total) };
  let at = 0;
  works.forEach(({ key, publication, topic, owner, retracted }, number) => {
    const [first] = publication.authors;
    truth.works.push({ key, title: publication.title, year: publication.year, doi: publication.doi ?? null, topic: topics[topic].key, owner, retracted, firstAuthor: first.literal ?? first.family ?? '' });
    for (const cited of lists[number].inside) {
      truth.citing[at] = number;
      truth.cited[at] = cited;
      at += 1;
    }
  });
  return truth;
}

interface World {
  works: CataloguedWork[];
  lists: ReferenceList[];
  /** Works of the faculty by number, then those outside. */
  publications: Publication[];
  ranks: Int32Array;
}

/** Place of each publication in the order of printed reference lists: by author, year, title. */
function rankForLists(publications: Publication[]): Int32Array {
  const keys = publications.map(({ authors: [first], year, title }) => `${first.literal ?? first.family}|${year}|${title}`);
  const order = [...publications.keys()].sort((a, b) => (keys[a] < keys[b] ? -1 : keys[a] > keys[b] ? 1 : 0));
  const ranks = new Int32Array(publications.length);
  order.forEach((number, rank) => (ranks[number] = rank));
  return ranks;
}

/** The reference list as printed; a careless list names a work twice. */
function orderList({ works, lists, publications, ranks }: World, number: number, chance: Chance): Publication[] {
  const cited = [...lists[number].inside, ...lists[number].outside.map((target) => works.length + target)].sort((a, b) => ranks[a] - ranks[b]);
  return cited.flatMap((target) => (chance.happens(repeatedShare) ? [publications[target], publications[target]] : [publications[target]]));
}

function writeFile(plan: PlannedFile, world: World, chance: Chance, statistics: DemonstrationStatistics, ledger: VariantLedger): { owner: string; file: DemonstrationFile } {
  const { writer } = plan;
  const file: FileStatistics = { name: plan.name, format: writer.format, entries: 0, rejected: 0, references: 0, characters: 0 };
  const pieces: string[] = [];
  const write = (number: number, publication: Publication): string => {
    const { works } = world;
    const { key, keywords, abstract, retracted, owner } = works[number];
    const record: WrittenRecord = { key, publication, keywords, abstract, retracted, affiliation: affiliationOf(owner), cited: orderList(world, number, chance) };
    return writer.record(record, {
      chance,
      counts: statistics.variants.kinds,
      onReference: (cited, text) => {
        file.references += 1;
        ledger.note(number, cited, text);
      },
    });
  };
  for (const { work, difference } of plan.records) {
    const { publication } = world.works[work];
    pieces.push(write(work, difference ? describeOtherwise(publication, difference, chance) : publication));
    file.entries += 1;
    if (difference === null) continue;
    statistics.duplicates.total += 1;
    if ((doubtfulDifferences as readonly string[]).includes(difference)) statistics.duplicates.doubtful += 1;
    statistics.duplicates.differences[difference] = (statistics.duplicates.differences[difference] ?? 0) + 1;
  }
  // Broken entries repeat works of the same file that have a DOI, so that what can be read of them still finds its work.
  const sound = plan.records.filter(({ work }) => world.works[work].publication.doi && world.works[work].publication.type === 'article');
  for (const { kind, rejected } of writer.faults) {
    const { work } = chance.pick(sound);
    const before = file.references;
    const broken = writer.break(write(work, world.works[work].publication), kind);
    if (rejected) file.references = before;
    pieces.splice(chance.between(1, pieces.length - 1), 0, broken);
    file.entries += 1;
    file.rejected += rejected ? 1 : 0;
    statistics.broken.total += 1;
    statistics.broken.rejected += rejected ? 1 : 0;
    statistics.broken.kinds[kind] = (statistics.broken.kinds[kind] ?? 0) + 1;
  }
  const content = `${writer.opening(pieces.length)}${pieces.join(writer.between)}${writer.ending}`;
  file.characters = content.length;
  statistics.files.push(file);
  statistics.entries += file.entries;
  statistics.references += file.references;
  return { owner: plan.owner, file: { name: plan.name, format: writer.format, content } };
}
