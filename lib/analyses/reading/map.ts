import { type AnalysisMap } from '@/lib/api/types';
import { type Basis } from '@/lib/network/types';
import { storage } from '@/lib/services/storage';

const keyOf = (analysisId: number, basis: Basis) => `analyses/${analysisId}/map-${basis}.json`;

/** The stored map as it is; it is JSON already and may be large. */
export function readMapBytes(analysisId: number, basis: Basis): Promise<Buffer> {
  return storage().read(keyOf(analysisId, basis));
}

export async function readMap(analysisId: number, basis: Basis): Promise<AnalysisMap> {
  return JSON.parse((await readMapBytes(analysisId, basis)).toString('utf8')) as AnalysisMap;
}

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
