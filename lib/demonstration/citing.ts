import { type CataloguedWork } from '@/lib/demonstration/catalogue';
import { Chance } from '@/lib/demonstration/chance';
import { type OutsideLiterature } from '@/lib/demonstration/outside';
import { neighbourNumbers, topics } from '@/lib/demonstration/topics';

/** Reference list of one work: numbers of catalogued works, and of outside works. */
export interface ReferenceList {
  inside: number[];
  outside: number[];
}

const meanReferences = 20.3;

/** Age at which an article is cited most, and how slowly that fades; hubs fade far more slowly. */
function ageFactor(age: number, hub: boolean): number {
  if (age < 0) return 0;
  const rise = age === 0 ? 0.15 : age === 1 ? 0.6 : 1;
  return rise * Math.exp(-age / (hub ? 30 : 13));
}

class CitingModel {
  private readonly lists: ReferenceList[] = [];
  /** Catalogued works by topic, in order of year. */
  private readonly members: number[][] = topics.map(() => []);
  /** Every citation made so far, by the cited work's topic: a draw from it is preferential attachment. */
  private readonly insideHistory: number[][] = topics.map(() => []);
  private readonly outsideHistory: number[][] = topics.map(() => []);
  private readonly hubs: number[] = [];

  constructor(private readonly works: CataloguedWork[], private readonly outside: OutsideLiterature, private readonly chance: Chance) {}

  run(): ReferenceList[] {
    this.works.forEach((work, number) => {
      this.lists.push(this.cite(work, number));
      this.members[work.topic].push(number);
      if (work.hub) this.hubs.push(number);
    });
    return this.lists;
  }

  /** Mostly the work's own topic, then those it draws on, rarely any other. */
  private chooseTopic(own: number): number {
    const roll = this.chance.unit();
    if (roll < 0.74) return own;
    return roll < 0.95 ? this.chance.pick(neighbourNumbers[own]) : this.chance.below(topics.length);
  }

  private accepts(target: number, year: number): boolean {
    const { publication, fitness, hub } = this.works[target];
    return this.chance.happens(Math.min(1, (fitness / 3) * ageFactor(year - publication.year, hub) * 1.6));
  }

  private drawInside(topic: number, year: number): number | null {
    const { chance } = this;
    if (this.hubs.length > 0 && chance.happens(0.012)) {
      const hub = chance.pick(this.hubs);
      return this.accepts(hub, year) ? hub : null;
    }
    const history = this.insideHistory[topic];
    const pool = history.length > 12 && chance.happens(0.62) ? history : this.members[topic];
    if (pool.length === 0) return null;
    const target = chance.pick(pool);
    return this.accepts(target, year) ? target : null;
  }

  private drawOutside(topic: number, year: number): number {
    const { chance } = this;
    const history = this.outsideHistory[topic];
    for (let attempt = 0; attempt < 4 && history.length > 10; attempt += 1) {
      if (chance.happens(0.09)) break;
      const target = history[history.length - 1 - chance.skewed(history.length, 1.3)];
      const age = year - this.outside.works[target].year;
      if (age >= 0 && chance.happens(Math.exp(-age / 30))) return target;
    }
    return this.outside.add(topic, year);
  }

  private cite(work: CataloguedWork, number: number): ReferenceList {
    const { chance } = this;
    const { year, type } = work.publication;
    const mean = type === 'article' ? meanReferences + (year - 2008) * 0.18 : type === 'thesis' || type === 'book' ? 42 : 15;
    const wanted = Math.max(2, Math.min(160, Math.round(chance.logNormal(mean, 0.5))));
    const inside = new Set<number>();
    const outside = new Set<number>();
    // The more of the topic the faculty has written, the more of it a list can hold.
    const known = this.members[work.topic].length;
    const insideShare = 0.47 * (known / (known + 14));
    for (let attempt = 0; inside.size + outside.size < wanted && attempt < wanted * 40; attempt += 1) {
      if (chance.happens(0.16) && inside.size > 0 && this.copy([...inside], inside, outside, year)) continue;
      const topic = this.chooseTopic(work.topic);
      const wantsInside = inside.size < Math.round(wanted * insideShare);
      if (!wantsInside) outside.add(this.drawOutside(topic, year));
      else {
        const target = this.drawInside(topic, year);
        if (target !== null && target !== number) inside.add(target);
        else if (attempt > wanted * 20) outside.add(this.drawOutside(topic, year));
      }
    }
    for (const target of inside) this.insideHistory[this.works[target].topic].push(target);
    for (const target of outside) this.outsideHistory[work.topic].push(target);
    return { inside: [...inside], outside: [...outside] };
  }

  /** Takes a reference over from a work that is cited already: the source of shared references. */
  private copy(from: number[], inside: Set<number>, outside: Set<number>, year: number): boolean {
    const { chance } = this;
    const list = this.lists[chance.pick(from)];
    const fromInside = list.inside.length > 0 && chance.happens(0.5);
    if (fromInside) {
      const target = chance.pick(list.inside);
      if (inside.has(target) || !this.accepts(target, year)) return false;
      inside.add(target);
      return true;
    }
    if (list.outside.length === 0) return false;
    const target = chance.pick(list.outside);
    if (outside.has(target)) return false;
    outside.add(target);
    return true;
  }
}

/**
 * Reference lists by topic, with preferential attachment, ageing, hubs and copying; a few works cite one that was still in press, so the
 * network is not free of loops.
 */
export function makeReferences(works: CataloguedWork[], outside: OutsideLiterature, seed: number): ReferenceList[] {
  const chance = new Chance(seed, 3);
  const lists = new CitingModel(works, outside, chance).run();
  for (let number = 0; number + 40 < works.length; number += 1) {
    if (!chance.happens(0.015)) continue;
    const later = number + chance.between(1, 40);
    if (works[later].topic === works[number].topic && works[later].publication.year - works[number].publication.year <= 1) lists[number].inside.push(later);
  }
  return lists;
}
