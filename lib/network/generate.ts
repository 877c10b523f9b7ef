import { createRandom, type Random } from '@/lib/network/random';
import { type AnalysisInput, type AnalysisWorkInput } from '@/lib/network/types';

/**
 * A made citation network for measurements and tests: works in topics, reference lists of uneven length, references copied from recent
 * works of the same topic (so that citations concentrate and age), a few citations across topics and against time, and works that are
 * only cited. Seeded: the same request gives the same bytes. Nothing in it stands for a real work.
 */
export interface GenerateRequest {
  /** Catalogued works. */
  works: number;
  /** Mean number of references to catalogued works. */
  meanReferences: number;
  /** Citations of works outside the catalogue, in all. */
  outsideCitations: number;
  seed: number;
}

const firstYear = 1985;
const years = 40;
const syllables = ['peat', 'reed', 'tide', 'silt', 'fen', 'marsh', 'dune', 'kelp', 'loam', 'moss', 'weir', 'bank', 'salt', 'clay', 'drain', 'flood', 'root', 'sand', 'shell', 'spring'];
const commonWords = ['effects', 'changes', 'analysis', 'model', 'long-term', 'observations', 'response', 'patterns', 'dynamics', 'review'];

export function generateNetwork({ works, meanReferences, outsideCitations, seed }: GenerateRequest): AnalysisInput {
  const random = createRandom(seed);
  const topics = Math.max(4, Math.round(0.35 * Math.sqrt(works)));
  const topic = Int32Array.from({ length: works }, () => Math.min(topics - 1, Math.floor(topics * random.unit() ** 1.4)));
  const year = Int32Array.from({ length: works }, (_, work) => firstYear + Math.min(years - 1, Math.floor(years * Math.sqrt((work + random.unit()) / works))));
  const citing: number[] = [];
  const cited: number[] = [];
  citeInside(topic, topics, meanReferences, random, citing, cited);
  const outside = citeOutside(works, topic, topics, outsideCitations, random, citing, cited);
  const list: AnalysisWorkInput[] = [];
  for (let work = 0; work < works; work += 1) list.push(makeWork(`w${work}`, topic[work], year[work], true, random));
  for (let work = 0; work < outside.length; work += 1) list.push(makeWork(`x${work}`, outside[work], firstYear - 30 + random.below(31), false, random));
  return { works: list, citing: Uint32Array.from(citing), cited: Uint32Array.from(cited) };
}

function citeInside(topic: Int32Array, topics: number, mean: number, random: Random, citing: number[], cited: number[]): void {
  const members: number[][] = Array.from({ length: topics }, () => []);
  /** Citations of each topic's works, in the order in which they were made: a draw from its recent end is preferential attachment that ages. */
  const history: number[][] = Array.from({ length: topics }, () => []);
  for (let work = 0; work < topic.length; work += 1) {
    const wanted = Math.min(Math.floor(work * 0.6), Math.max(1, Math.round(mean * 1.02 * Math.exp(0.6 * roughNormal(random) - 0.18))));
    const chosen = new Set<number>();
    for (let attempt = 0; chosen.size < wanted && attempt < wanted * 12; attempt += 1) {
      const place = random.unit();
      const from = place < 0.78 ? topic[work] : place < 0.95 ? (topic[work] ^ (1 + random.below(3))) % topics : random.below(topics);
      const pool = history[from].length > 0 && random.unit() < 0.7 ? history[from] : members[from];
      if (pool.length === 0) continue;
      const depth = Math.floor(-Math.log(1 - random.unit()) * Math.max(20, pool.length * 0.25));
      if (depth < pool.length) chosen.add(pool[pool.length - 1 - depth]);
    }
    for (const target of chosen) {
      citing.push(work);
      cited.push(target);
      history[topic[target]].push(target);
    }
    // An article in press, cited before its year: rare, and the source of loops.
    if (random.unit() < 0.03 && work + 12 < topic.length) {
      citing.push(work);
      cited.push(work + 1 + random.below(10));
    }
    members[topic[work]].push(work);
  }
}

/** Returns the topic of each work outside, in order of their numbers (which follow those of the catalogued works). */
function citeOutside(works: number, topic: Int32Array, topics: number, citations: number, random: Random, citing: number[], cited: number[]): number[] {
  const outside: number[] = [];
  const history: number[][] = Array.from({ length: topics }, () => []);
  for (let citation = 0; citation < citations; citation += 1) {
    const work = random.below(works);
    const own = history[topic[work]];
    let target: number;
    if (own.length > 0 && random.unit() < 0.55) target = own[random.below(own.length)];
    else {
      target = works + outside.length;
      outside.push(topic[work]);
    }
    own.push(target);
    citing.push(work);
    cited.push(target);
  }
  return outside;
}

function makeWork(key: string, topic: number, year: number, catalogued: boolean, random: Random): AnalysisWorkInput {
  const own = (shift: number): string => `${syllables[(topic + shift) % syllables.length]}${syllables[(topic * 3 + shift * 7 + 1) % syllables.length]}`;
  const common = (): string => commonWords[random.below(commonWords.length)];
  const one = own(random.below(4));
  const other = own(random.below(4));
  const title = `${common()} of ${one} ${other} in ${common()} ${syllables[random.below(syllables.length)]} areas`;
  return { key, year, catalogued, title: title[0].toUpperCase() + title.slice(1), keywords: random.unit() < 0.6 ? [own(0), one] : [] };
}

/** Sum of twelve uniforms less six: near enough to a normal draw, and free of transcendental functions. */
function roughNormal(random: Random): number {
  let sum = -6;
  for (let draw = 0; draw < 12; draw += 1) sum += random.unit();
  return sum;
}
