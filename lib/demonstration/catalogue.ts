import { type PersonName } from '@/lib/bibliography/record';
import { Chance } from '@/lib/demonstration/chance';
import { corporateAuthors, ownAuthor, type NameRegister } from '@/lib/demonstration/names';
import { type Publication } from '@/lib/demonstration/publication';
import { topics, type Owner } from '@/lib/demonstration/topics';
import { chooseKeywords, type TitleRegister, writeAbstract } from '@/lib/demonstration/titles';
import { chooseVenue, otherTypes, type PageLedger } from '@/lib/demonstration/venues';

export const firstYear = 1985;
export const lastYear = 2025;

/** A work of the faculty: what it is, and what drives how often it is cited. */
export interface CataloguedWork {
  key: string;
  publication: Publication;
  owner: Owner;
  /** Number of its topic. */
  topic: number;
  /** A method that every topic draws on. */
  hub: boolean;
  keywords: string[];
  abstract?: string;
  retracted: boolean;
  /** How readily it is cited, beside its citations and its age: log-normal around one. */
  fitness: number;
}

/** Methods that all topics cite, and the topic they came from. */
const hubTitles: [string, string, number][] = [
  ['A random-slope treatment of repeated surveys at wet sites', 'stream-invertebrates', 1994],
  ['Sampling water levels: how often is often enough?', 'peat-hydrology', 1991],
  ['Partitioning variance among correlated site descriptors', 'diatoms', 1996],
  ['Guidelines for uncertainty in environmental mass balances', 'reed-bed-nutrients', 2001],
  ['Bootstrap intervals for short environmental series', 'lake-stratification', 1998],
  ['Loss on ignition as a measure of organic matter: an interlaboratory trial', 'drained-peat-carbon', 1989],
  ['Calibrating optical sensors for suspended matter', 'sediment-transport', 1993],
  ['A common protocol for vegetation plots on soft ground', 'ditch-blocking', 2004],
  ['Open terrain models from airborne lidar in flat country', 'remote-sensing', 2009],
];

interface Researcher {
  name: PersonName;
  from: number;
  until: number;
}

const departmentNames: Record<Owner, string> = { freshwater: 'Department of Freshwater Ecology', peat: 'Department of Peat and Soil Science', coast: 'Department of Coastal Engineering', faculty: 'Faculty of Water and Land' };
export const affiliationOf = (owner: Owner): string => `Tarnholm University, ${departmentNames[owner]}, Tarnholm`;

/** Output by year: grows by some four per cent a year, unevenly; the last year is not complete. */
function shareYears(works: number, chance: Chance): number[] {
  const weights: number[] = [];
  for (let year = firstYear; year <= lastYear; year += 1) weights.push(Math.exp(0.042 * (year - firstYear)) * (0.9 + 0.2 * chance.unit()) * (year === lastYear ? 0.55 : 1));
  const total = weights.reduce((sum, weight) => sum + weight, 0);
  const counts = weights.map((weight) => Math.floor((works * weight) / total));
  for (let place = counts.length - 2; counts.reduce((sum, count) => sum + count, 0) < works; place -= 1) counts[place] += 1;
  return counts;
}

/** Weight of each topic in a year: a bell over time on a floor. */
const topicWeights = (year: number): number[] => topics.map(({ weight, peak, width }) => weight * (0.12 + Math.exp(-(((year - peak) / width) ** 2) / 2)));

/** The people of each topic: some twenty, a few of whom write most. */
function makeResearchers(names: NameRegister, chance: Chance): Researcher[][] {
  return topics.map((topic) =>
    Array.from({ length: topic.owner === 'faculty' ? 18 : 24 }, (_, place) => {
      // The first six cover the whole period between them, so that no year is without a senior author.
      const from = place < 6 ? firstYear - 6 + place * 7 : chance.between(firstYear - 10, lastYear - 3);
      return { name: names.make(chance, 0.45), from, until: from + (place < 6 ? 24 : chance.between(4, 34)) };
    }),
  );
}

function chooseAuthors(researchers: Researcher[][], topic: number, year: number, chance: Chance): PersonName[] {
  const active = (group: Researcher[]) => group.filter(({ from, until }) => from <= year && year <= until);
  const own = active(researchers[topic]);
  const size = Math.max(1, Math.min(9, Math.round(chance.logNormal(1.8 + ((year - firstYear) / 40) * 2.8, 0.45))));
  const authors: PersonName[] = [];
  for (let attempt = 0; authors.length < size && attempt < size * 4; attempt += 1) {
    const group = chance.happens(topics[topic].owner === 'faculty' && attempt > 0 ? 0.45 : 0.86) ? own : active(researchers[sibling(topic, chance)]);
    if (group.length === 0) continue;
    const { name } = group[chance.skewed(group.length, 1.7)];
    if (!authors.includes(name)) authors.push(name);
  }
  return authors.length > 0 ? authors : [researchers[topic][0].name];
}

/** Another topic of the same department; for a bridging topic, of any. */
function sibling(topic: number, chance: Chance): number {
  const { owner } = topics[topic];
  const candidates = topics.flatMap((other, place) => (place !== topic && (owner === 'faculty' || other.owner === owner) ? [place] : []));
  return chance.pick(candidates);
}

/** Theses, reports, chapters ...: they stand in no journal. */
export function describeOther(publication: Publication, chance: Chance): void {
  const { type } = publication;
  const first = chance.between(3, 420);
  if (type === 'thesis') Object.assign(publication, { publisher: 'Tarnholm University', place: 'Tarnholm', authors: publication.authors.slice(0, 1) });
  else if (type === 'report') {
    Object.assign(publication, { publisher: 'Faculty of Water and Land', place: 'Tarnholm', container: 'Tarnholm Technical Reports', volume: String((publication.year - 1980) * 10 + chance.below(10)) });
    if (chance.happens(0.35)) publication.authors = [chance.pick(corporateAuthors)];
  } else if (type === 'dataset') publication.publisher = 'Tarnholm Data Archive';
  else if (type === 'book') Object.assign(publication, { publisher: 'Wendale Press', place: 'Tarnholm' });
  else if (type === 'chapter') Object.assign(publication, { container: chance.pick(['Wet Landscapes: A Handbook', 'Soft Ground and Open Water', 'Essays on the Northern Coast', 'Managing Water and Land']), firstPage: String(first), lastPage: String(first + chance.between(8, 30)), publisher: 'Halden Academic', place: 'Skarne' });
  else if (type === 'conference-paper') Object.assign(publication, { container: `Proceedings of the ${publication.year - 1970}th Meeting on Water and Land`, firstPage: String(first), lastPage: String(first + chance.between(4, 12)), publisher: 'Society for Wet Land Studies', place: 'Oldmere' });
}

/** Works in order of year. The number of a work in the list is its number everywhere. */
export function makeCatalogue(works: number, seed: number, registers: { names: NameRegister; titles: TitleRegister; pages: PageLedger }): CataloguedWork[] {
  const chance = new Chance(seed, 1);
  const researchers = makeResearchers(registers.names, chance);
  const list: CataloguedWork[] = [];
  shareYears(works, chance).forEach((count, yearPlace) => {
    const year = firstYear + yearPlace;
    const weights = topicWeights(year);
    const hubs = hubTitles.filter(([, , when]) => when === year);
    for (let ordinal = 0; ordinal < count; ordinal += 1) {
      const hub = hubs[ordinal];
      const topic = hub ? topics.findIndex(({ key }) => key === hub[1]) : chance.weighted(weights);
      list.push(makeWork(topic, year, chance, chooseAuthors(researchers, topic, year, chance), registers, hub?.[0]));
      list[list.length - 1].key = `tarn${year}${String(ordinal + 1).padStart(4, '0')}`;
      addDoi(list[list.length - 1], ordinal, chance);
    }
  });
  givePlaceToOwnAuthor(list);
  retractSome(list, chance);
  return list;
}

function makeWork(topic: number, year: number, chance: Chance, authors: PersonName[], registers: { titles: TitleRegister; pages: PageLedger }, hubTitle: string | undefined): CataloguedWork {
  const { owner } = topics[topic];
  const title = hubTitle ?? registers.titles.take(topics[topic], chance);
  const isArticle = hubTitle !== undefined || chance.happens(0.86);
  const publication: Publication = { type: isArticle ? 'article' : otherTypes[chance.weighted(otherTypes.map(({ share }) => share))].type, title, authors, year, month: chance.between(1, 12) };
  if (isArticle) {
    const venue = chooseVenue(owner, topic, year, chance);
    Object.assign(publication, { venue, publisher: venue.publisher, place: venue.place, ...registers.pages.place(venue, year, chance) });
  } else describeOther(publication, chance);
  const fitness = hubTitle ? 2 : Math.min(4, chance.logNormal(1, 0.95));
  return { key: '', publication, owner, topic, hub: hubTitle !== undefined, keywords: chooseKeywords(topics[topic], chance), ...(chance.happens(0.4) ? { abstract: writeAbstract(topics[topic], chance) } : {}), retracted: false, fitness };
}

/** Fifteen in a hundred have none: most theses and reports, some articles, more of the old ones. */
function addDoi(work: CataloguedWork, ordinal: number, chance: Chance): void {
  const { type, year } = work.publication;
  const without = work.hub ? 0 : type === 'thesis' || type === 'report' ? 0.8 : type === 'article' ? (year < 1998 ? 0.26 : 0.065) : 0.3;
  if (!chance.happens(without)) work.publication.doi = `10.5555/tarn.${year}.${String(ordinal + 1).padStart(4, '0')}`;
}

/** Sixteen works between 2003 and 2025, of her two topics; she leads every other one. */
function givePlaceToOwnAuthor(list: CataloguedWork[]): void {
  const fields = new Set(['reed-bed-nutrients', 'catchment-carbon']);
  const candidates = list.filter(({ topic, hub, publication }) => fields.has(topics[topic].key) && !hub && publication.type === 'article' && publication.year >= 2003);
  const step = candidates.length / 16;
  for (let place = 0; place < 16; place += 1) {
    const work = candidates[Math.floor(place * step)];
    const others = work.publication.authors.slice(0, 4);
    work.publication.authors = place % 2 === 0 ? [ownAuthor, ...others.slice(1)] : [...others, ownAuthor];
  }
}

function retractSome(list: CataloguedWork[], chance: Chance): void {
  const eligible = list.filter(({ hub, publication }) => !hub && publication.type === 'article' && publication.doi && publication.year > 1999 && publication.year < 2022 && !publication.authors.includes(ownAuthor));
  for (const work of chance.shuffled(eligible).slice(0, 5)) work.retracted = true;
}
