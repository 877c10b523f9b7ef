import { type PersonName } from '@/lib/bibliography/record';
import { describeOther } from '@/lib/demonstration/catalogue';
import { Chance } from '@/lib/demonstration/chance';
import { type NameRegister } from '@/lib/demonstration/names';
import { type Publication } from '@/lib/demonstration/publication';
import { topics } from '@/lib/demonstration/topics';
import { type TitleRegister } from '@/lib/demonstration/titles';
import { chooseVenue, type PageLedger } from '@/lib/demonstration/venues';

/** Works that nobody of the faculty wrote: made when first cited. */
export class OutsideLiterature {
  readonly works: Publication[] = [];
  private readonly chance: Chance;
  private readonly people: PersonName[];

  constructor(seed: number, private readonly registers: { names: NameRegister; titles: TitleRegister; pages: PageLedger }) {
    this.chance = new Chance(seed, 2);
    this.people = Array.from({ length: 1600 }, () => registers.names.make(this.chance, 0));
  }

  /** A new work of a topic, as old as cited works are: a few years mostly, some decades at times. Returns its number. */
  add(topic: number, citingYear: number): number {
    const { chance, registers } = this;
    const year = Math.max(1948, citingYear - Math.max(1, Math.round(chance.logNormal(9, 0.85))));
    // People keep to their topics: each topic draws on its own stretch of the list.
    const base = topic * 60;
    const authors: PersonName[] = [];
    for (let count = chance.between(1, 4); count > 0; count -= 1) {
      const person = this.people[(base + chance.skewed(160, 1.6)) % this.people.length];
      if (!authors.includes(person)) authors.push(person);
    }
    const isArticle = chance.happens(0.88);
    const publication: Publication = { type: isArticle ? 'article' : chance.pick(['book', 'report', 'thesis', 'chapter', 'book']), title: registers.titles.take(topics[topic], chance), authors, year, month: 1 };
    if (isArticle) {
      const venue = chooseVenue(topics[topic].owner, topic + 1, year, chance);
      Object.assign(publication, { venue, publisher: venue.publisher, ...registers.pages.place(venue, year, chance) });
    } else describeOther(publication, chance);
    const number = this.works.length;
    if (chance.happens(isArticle ? 0.82 : 0.2)) publication.doi = `10.5555/out.${year}.${String(number + 1).padStart(5, '0')}`;
    this.works.push(publication);
    return number;
  }
}
