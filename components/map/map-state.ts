import { isUncertain } from '@/components/map/threads';
import { type AnalysisMap } from '@/lib/api/types';

/** What of a map is shown. Filters hide works; they never move them. */
export interface MapFilters {
  yearFrom: number | null;
  yearTo: number | null;
  /** Letters of clusters that are hidden; '-' stands for works in no cluster. */
  off: ReadonlySet<string>;
}

const yearOf = (text: string | null): number | null => (text !== null && /^\d{4}$/.test(text) ? Number(text) : null);

export function filtersOf(search: URLSearchParams): MapFilters {
  return { yearFrom: yearOf(search.get('yearFrom')), yearTo: yearOf(search.get('yearTo')), off: new Set((search.get('off') ?? '').split(',').filter((letter) => /^([A-Z]{1,4}|-)$/.test(letter))) };
}

/** 1 for each work that is shown. Works without a year are hidden as soon as years are chosen. */
export function visibleWorks(map: AnalysisMap, { yearFrom, yearTo, off }: MapFilters): Uint8Array {
  const letters = new Map(map.clusters.map((cluster) => [cluster.number, cluster.letter]));
  return Uint8Array.from(map.ids, (_, work) => {
    const year = map.years[work];
    if (yearFrom !== null && (year === null || year < yearFrom)) return 0;
    if (yearTo !== null && (year === null || year > yearTo)) return 0;
    return off.has(letters.get(map.cluster[work]) ?? '-') ? 0 : 1;
  });
}

export interface Neighbour {
  work: number;
  weight: number;
}

/** Drawn links from both ends, the strongest first. */
export function neighboursOf(map: Pick<AnalysisMap, 'ids' | 'links'>): Neighbour[][] {
  const neighbours: Neighbour[][] = map.ids.map(() => []);
  const { source, target, weight } = map.links;
  for (let link = 0; link < source.length; link += 1) {
    neighbours[source[link]].push({ work: target[link], weight: weight[link] });
    neighbours[target[link]].push({ work: source[link], weight: weight[link] });
  }
  for (const list of neighbours) list.sort((a, b) => b.weight - a.weight || a.work - b.work);
  return neighbours;
}

export type Arrow = 'ArrowLeft' | 'ArrowRight' | 'ArrowUp' | 'ArrowDown';
const arrows: Record<Arrow, [number, number]> = { ArrowLeft: [-1, 0], ArrowRight: [1, 0], ArrowUp: [0, 1], ArrowDown: [0, -1] };

/**
 * The linked work that lies best in the direction of an arrow key: within 60 degrees of it, near rather than far, straight rather than
 * aslant. Null where no link leads that way.
 */
export function walkTo(map: Pick<AnalysisMap, 'x' | 'y'>, from: number, neighbours: readonly Neighbour[], visible: Uint8Array, arrow: Arrow): number | null {
  const [dx, dy] = arrows[arrow];
  let best: number | null = null;
  let bestCost = Infinity;
  for (const { work } of neighbours) {
    if (!visible[work]) continue;
    const [x, y] = [map.x[work] - map.x[from], map.y[work] - map.y[from]];
    const distance = Math.hypot(x, y);
    const straight = distance === 0 ? 0 : (x * dx + y * dy) / distance;
    if (straight < 0.5) continue;
    const cost = distance / (straight * straight);
    if (cost < bestCost || (cost === bestCost && best !== null && work < best)) {
      best = work;
      bestCost = cost;
    }
  }
  return best;
}

/** The work of best rank among those shown; where walking begins. */
export function firstWork(map: Pick<AnalysisMap, 'ids' | 'rank'>, visible: Uint8Array): number | null {
  return map.ids.reduce<number | null>((best, _, work) => (visible[work] && (best === null || map.rank[work] < map.rank[best]) ? work : best), null);
}

/** Shown works whose title, authors or year hold every word typed, best rank first. */
export function findWorks(map: Pick<AnalysisMap, 'ids' | 'titles' | 'authors' | 'years' | 'rank'>, visible: Uint8Array, typed: string, most: number): number[] {
  const plain = (text: string) => text.normalize('NFKD').replace(/\p{M}/gu, '').toLowerCase();
  const words = plain(typed).split(/\s+/).filter(Boolean);
  if (words.length === 0) return [];
  const found = map.ids.flatMap((_, work) => {
    if (!visible[work]) return [];
    const text = plain(`${map.titles[work] ?? ''} ${map.authors[work] ?? ''} ${map.years[work] ?? ''}`);
    return words.every((word) => text.includes(word)) ? [work] : [];
  });
  return found.sort((a, b) => map.rank[a] - map.rank[b] || a - b).slice(0, most);
}

/** A work as it is said to those who do not see the map. */
export function describeWork(map: AnalysisMap, work: number, neighbours: readonly Neighbour[]): string {
  const cluster = map.clusters.find((one) => one.number === map.cluster[work]);
  const parts = [
    `${map.retracted[work] ? 'Retracted: ' : ''}${map.titles[work] ?? 'Untitled work'}`,
    [map.authors[work], map.years[work]].filter((part) => part !== null).join(', '),
    cluster ? `cluster ${cluster.letter}, ${cluster.name}${isUncertain(map.firmness[work]) ? ', uncertain' : ''}` : 'in no cluster',
    `rank ${map.rank[work]}`,
    `${map.size[work]} citations here`,
    `${neighbours.length} links`,
  ];
  return `${parts.filter(Boolean).join('. ')}.`;
}

/** "0.512,0.433,0.8": where the camera stands; null for anything else. */
export function parseCamera(text: string | null): { x: number; y: number; ratio: number } | null {
  const parts = (text ?? '').split(',').map(Number);
  if (parts.length !== 3 || !parts.every(Number.isFinite)) return null;
  const [x, y, ratio] = parts;
  return ratio > 0.005 && ratio < 5 && Math.abs(x) < 5 && Math.abs(y) < 5 ? { x, y, ratio } : null;
}

export const cameraText = ({ x, y, ratio }: { x: number; y: number; ratio: number }) => [x, y, ratio].map((value) => Number(value.toFixed(4))).join(',');
