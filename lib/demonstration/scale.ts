import { type Format, type PersonName } from '@/lib/bibliography/record';
import { Chance } from '@/lib/demonstration/chance';
import { NameRegister } from '@/lib/demonstration/names';
import { type Publication } from '@/lib/demonstration/publication';
import { topics } from '@/lib/demonstration/topics';
import { capitalise, chooseKeywords, writeTitle } from '@/lib/demonstration/titles';
import { placeAt, venues } from '@/lib/demonstration/venues';
import { makeBibtexWriter } from '@/lib/demonstration/writing/bibtex';
import { registryWriter } from '@/lib/demonstration/writing/json';
import { taggedWriter } from '@/lib/demonstration/writing/tagged';
import { type FormatWriter } from '@/lib/demonstration/writing/writer';

export interface ScaleRequest {
  works: number;
  /** References in all; each list gets its share, unevenly, and the sum is met exactly. */
  references: number;
  seed: number;
  format: Extract<Format, 'tagged' | 'bibtex' | 'registry-json'>;
}

const writers: Record<ScaleRequest['format'], FormatWriter> = { tagged: taggedWriter, bibtex: makeBibtexWriter('bibtex'), 'registry-json': registryWriter };
const firstYear = 1985;
const years = 41;
/** Venues that existed before the earliest outside work, so that every volume is positive. */
const standing = venues.filter((venue) => venue.firstYear <= 1966);

/**
 * The works of a large file. Each is a function of its number and the seed alone: nothing is kept, so the file may be of any size.
 */
class ScaleWorld {
  private readonly people: PersonName[];

  constructor(private readonly request: ScaleRequest) {
    const names = new NameRegister();
    const chance = new Chance(request.seed, 1);
    this.people = Array.from({ length: 3000 }, () => names.make(chance, 0.2));
  }

  /** Works stand in order of year, more of them every year. */
  private yearOf(number: number): number {
    return firstYear + Math.min(years - 1, Math.floor(years * Math.sqrt((number + 0.5) / this.request.works)));
  }

  topicOf = (number: number): number => number % topics.length;

  publication(number: number, withTitle: boolean): Publication {
    return this.describe(number, this.yearOf(number), venues, 'scale', 7, withTitle);
  }

  /** Works outside: their numbers have no order in time. */
  outsidePublication(number: number, withTitle: boolean): Publication {
    return this.describe(number, 1966 + ((number * 7) % 58), standing, 'far', 11, withTitle);
  }

  private describe(number: number, year: number, candidates: typeof venues, prefix: string, strand: number, withTitle: boolean): Publication {
    const chance = new Chance(this.request.seed, strand, number);
    const open = candidates.filter((venue) => venue.firstYear <= year);
    const venue = open[number % open.length];
    const authors = Array.from({ length: chance.between(1, 5) }, () => chance.pick(this.people));
    // No two works of a venue may share a page: the page grows with the number, and works outside begin elsewhere.
    const page = (prefix === 'far' ? 7 : 1) + Math.floor(number / open.length) * 12;
    const publication: Publication = { type: 'article', title: '', authors: [...new Set(authors)], year, venue, publisher: venue.publisher, ...placeAt(venue, year, page, chance.between(4, 11)) };
    if (chance.happens(0.88)) publication.doi = `10.5555/${prefix}.${year}.${number}`;
    // The station makes every title the only one of its kind, however many are drawn.
    if (withTitle) publication.title = capitalise(`${writeTitle(topics[this.topicOf(number)], new Chance(this.request.seed, strand + 1, number)).replace(/\?$/, '')}, station ${prefix === 'far' ? 'F' : 'S'}${number}`);
    return publication;
  }

  /** Numbers of earlier works: of the same topic mostly, half of them recent, half from the topic's well-cited beginnings. */
  private chooseInside(number: number, chance: Chance): number {
    const topic = chance.happens(0.8) ? this.topicOf(number) : chance.below(topics.length);
    const generations = Math.floor(number / topics.length);
    if (generations < 1) return -1;
    const back = chance.happens(0.5) ? 1 + chance.skewed(Math.max(1, Math.floor(generations / 4)), 2) : generations - chance.skewed(generations, 5);
    return (generations - Math.min(back, generations)) * topics.length + topic;
  }

  cited(number: number, wanted: number, chance: Chance, withTitle: boolean): Publication[] {
    const pool = Math.max(200, Math.floor(this.request.references / 4));
    const inside = new Set<number>();
    const outside = new Set<number>();
    for (let attempt = 0; inside.size + outside.size < wanted; attempt += 1) {
      const target = attempt < wanted * 3 && chance.happens(0.45) ? this.chooseInside(number, chance) : -1;
      if (target >= 0 && target < number) inside.add(target);
      else {
        const place = chance.skewed(Math.ceil(pool / topics.length), 2.2) * topics.length + this.topicOf(number);
        // A list longer than what the topic offers goes through the rest of the pool.
        outside.add(attempt < wanted * 6 ? place : (place + attempt) % (pool + wanted));
      }
    }
    return [...[...inside].map((target) => this.publication(target, withTitle)), ...[...outside].map((target) => this.outsidePublication(target, withTitle))];
  }
}

/**
 * A large file of the same kind as the demonstration's, in pieces of one record, for measurements. Memory does not grow with its size.
 * Every work and every reference that was asked for is there; nothing is broken in it.
 */
export function* generateScale(request: ScaleRequest): Generator<string, void, undefined> {
  const { works, references, seed, format } = request;
  const writer = writers[format];
  const world = new ScaleWorld(request);
  const withTitle = format === 'registry-json';
  yield writer.opening(works);
  let left = references;
  for (let number = 0; number < works; number += 1) {
    const chance = new Chance(seed, 3, number);
    const mean = left / (works - number);
    const wanted = number === works - 1 ? left : Math.min(left, Math.round(mean * (0.4 + 1.2 * chance.unit())));
    left -= wanted;
    const publication = world.publication(number, true);
    // Registries hold only works with a DOI.
    if (format === 'registry-json') publication.doi ??= `10.5555/scale.${publication.year}.${number}`;
    const text = writer.record(
      { key: `tarn${number + 1}`, publication, keywords: chooseKeywords(topics[world.topicOf(number)], chance), retracted: false, affiliation: 'Tarnholm University, Tarnholm', cited: world.cited(number, wanted, chance, withTitle) },
      { chance, counts: {}, onReference: () => undefined },
    );
    yield number === 0 ? text : `${writer.between}${text}`;
  }
  yield writer.ending;
}
