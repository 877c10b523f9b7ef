import { type AnalysisMap } from '@/lib/api/types';

const pick = <Value>(values: readonly Value[], kept: readonly number[]): Value[] => kept.map((index) => values[index]);

/** The part of a map whose works are kept, with the links among them; places and clusters stay as they were. */
export function restrictMap(map: AnalysisMap, keep: ReadonlySet<string> | null): AnalysisMap {
  if (keep === null) return map;
  const kept = map.ids.flatMap((id, index) => (keep.has(id) ? [index] : []));
  const place = new Map(kept.map((index, position) => [index, position]));
  const links = map.links.source.flatMap((source, index) => (place.has(source) && place.has(map.links.target[index]) ? [index] : []));
  return {
    ...map,
    ids: pick(map.ids, kept),
    titles: pick(map.titles, kept),
    authors: pick(map.authors, kept),
    years: pick(map.years, kept),
    x: pick(map.x, kept),
    y: pick(map.y, kept),
    size: pick(map.size, kept),
    pageRank: pick(map.pageRank, kept),
    rank: pick(map.rank, kept),
    catalogued: pick(map.catalogued, kept),
    retracted: pick(map.retracted, kept),
    cluster: pick(map.cluster, kept),
    firmness: pick(map.firmness, kept),
    links: {
      source: links.map((index) => place.get(map.links.source[index]) as number),
      target: links.map((index) => place.get(map.links.target[index]) as number),
      weight: pick(map.links.weight, links),
    },
  };
}
