import { buildNetwork, type Rows } from '@/lib/network/compressed-rows';
import { renumberMembers } from '@/lib/network/reference-lists';
import { type AnalysisInput, type AnalysisParameters, type AnalysisWorkInput, type DirectedNetwork } from '@/lib/network/types';

/**
 * Which works an analysis is about.
 * Citing side: the catalogued works of the period; works without a year only if the period is open at both ends.
 * Works of the analysis: these and, with scope 'with-cited', the cited-only works that at least `minimumCitations` of them cite (at least one:
 * a work that nobody in the scope cites has no place in it). Numbers follow the works' keys, compared by code unit, so that nothing
 * depends on the order of the input.
 */
export interface Scope {
  /** Index into the input of each work of the analysis, in order of key. */
  workIndex: Uint32Array;
  works: AnalysisWorkInput[];
  /** 1 where the work is catalogued (and so may cite). */
  catalogued: Uint8Array;
  /** Citations among the works of the analysis. */
  network: DirectedNetwork;
  /**
   * Everything that works of the analysis cite, works outside included: one row per work of the analysis, members numbered in key order over
   * all works of the input (so apart from the rows).
   */
  references: Rows;
  /** Number of a work of the analysis for each member of `references`, or -1. */
  numberOfReference: Int32Array;
}

/** Throws a RangeError when two works share a key or a citation names a work that does not exist. */
export function selectScope(input: AnalysisInput, parameters: AnalysisParameters): Scope {
  const order = orderByKey(input.works);
  const sorted = Array.from(order, (index) => input.works[index]);
  const place = new Uint32Array(sorted.length);
  order.forEach((index, number) => {
    place[index] = number;
  });
  requireIndices(input);
  const all = buildNetwork(sorted.length, input.citing.map((index) => place[index]), input.cited.map((index) => place[index])).network;
  const cites = Uint8Array.from(sorted, (work) => (work.catalogued && isInPeriod(work.year, parameters) ? 1 : 0));
  const takesPart = markWorks(all, sorted, cites, parameters);
  const numbers = new Int32Array(sorted.length).fill(-1);
  const chosen: number[] = [];
  for (let work = 0; work < sorted.length; work += 1) if (takesPart[work] === 1) numbers[work] = chosen.push(work) - 1;
  const references = takeRows(all, chosen, cites);
  const inside = renumberMembers(references, numbers);
  return {
    workIndex: Uint32Array.from(chosen, (work) => order[work]),
    works: chosen.map((work) => sorted[work]),
    catalogued: Uint8Array.from(chosen, (work) => cites[work]),
    network: { size: chosen.length, offsets: inside.offsets, targets: inside.members },
    references,
    numberOfReference: numbers,
  };
}

/** Indices of works in order of key. Throws when a key occurs twice: the order would then depend on the input's. */
export function orderByKey(works: readonly AnalysisWorkInput[]): Uint32Array {
  const order = Array.from(works.keys()).sort((one, other) => (works[one].key < works[other].key ? -1 : works[one].key > works[other].key ? 1 : 0));
  for (let number = 1; number < order.length; number += 1) {
    if (works[order[number]].key === works[order[number - 1]].key) throw new RangeError(`Two works have the key "${works[order[number]].key}".`);
  }
  return Uint32Array.from(order);
}

function requireIndices({ works, citing, cited }: AnalysisInput): void {
  if (citing.length !== cited.length) throw new RangeError(`There are ${citing.length} citing but ${cited.length} cited works.`);
  for (let pair = 0; pair < citing.length; pair += 1) {
    if (citing[pair] >= works.length || cited[pair] >= works.length) throw new RangeError(`Citation ${pair} names work ${Math.max(citing[pair], cited[pair])}, but there are only ${works.length} works.`);
  }
}

function isInPeriod(year: number | null, { periodFrom, periodTo }: AnalysisParameters): boolean {
  if (year === null) return periodFrom === null && periodTo === null;
  return (periodFrom === null || year >= periodFrom) && (periodTo === null || year <= periodTo);
}

function markWorks(all: DirectedNetwork, works: AnalysisWorkInput[], cites: Uint8Array, { scope, minimumCitations }: AnalysisParameters): Uint8Array {
  const takesPart = cites.slice();
  if (scope === 'catalogued') return takesPart;
  const citations = new Uint32Array(all.size);
  for (let work = 0; work < all.size; work += 1) {
    if (cites[work] === 1) for (let link = all.offsets[work]; link < all.offsets[work + 1]; link += 1) citations[all.targets[link]] += 1;
  }
  const least = Math.max(1, minimumCitations);
  for (let work = 0; work < all.size; work += 1) if (!works[work].catalogued && citations[work] >= least) takesPart[work] = 1;
  return takesPart;
}

/** Reference lists of the works chosen; works that do not cite in this scope have empty ones, whatever the input says. */
function takeRows(all: DirectedNetwork, chosen: number[], cites: Uint8Array): Rows {
  const offsets = new Uint32Array(chosen.length + 1);
  chosen.forEach((work, number) => {
    offsets[number + 1] = offsets[number] + (cites[work] === 1 ? all.offsets[work + 1] - all.offsets[work] : 0);
  });
  const members = new Uint32Array(offsets[chosen.length]);
  chosen.forEach((work, number) => {
    if (cites[work] === 1) members.set(all.targets.subarray(all.offsets[work], all.offsets[work + 1]), offsets[number]);
  });
  return { offsets, members };
}
