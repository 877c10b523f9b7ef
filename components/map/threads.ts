import { type AnalysisMap } from '@/lib/api/types';

/** Links to draw, as indices into `map.links`, the strongest first. */
export interface Threads {
  within: number[];
  between: number[];
}

/**
 * Parts the links of a map into those within a cluster and those between two, and keeps the strongest of each: beyond some thousand,
 * threads between clusters tell nothing any more and hide what lies under them.
 */
export function partThreads(map: Pick<AnalysisMap, 'cluster' | 'links'>, mostWithin: number, mostBetween: number): Threads {
  const { source, target, weight } = map.links;
  const order = source.map((_, link) => link).sort((a, b) => weight[b] - weight[a] || a - b);
  const inside = (link: number) => map.cluster[source[link]] >= 0 && map.cluster[source[link]] === map.cluster[target[link]];
  return { within: order.filter(inside).slice(0, mostWithin), between: order.filter((link) => !inside(link)).slice(0, mostBetween) };
}

/** Side of a knot in pixels: its area follows the citations, and it stays large enough to be seen. */
export function knotSide(citations: number, most: number, works: number): number {
  // Many works on one map need smaller knots.
  const largest = Math.min(26, Math.max(12, 400 / Math.sqrt(Math.max(1, works))));
  const smallest = Math.min(5, largest / 3);
  return smallest + (largest - smallest) * Math.sqrt(citations / Math.max(1, most));
}

/** Works that their cluster holds in fewer than this share of the repeats stand between groups and are drawn hollow. */
export const firmFrom = 0.6;

export const isUncertain = (firmness: number | null): boolean => firmness !== null && firmness < firmFrom;
