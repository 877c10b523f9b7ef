import { type ComponentPageRank } from '@/lib/network/pagerank-by-components';
import { createRandom, type Random } from '@/lib/network/random';
import { Ranker } from '@/lib/network/ranks';
import { type DirectedNetwork } from '@/lib/network/types';

/**
 * Intervals of ranks by resampling the citing works.
 *
 * Each replicate draws as many reference lists as there are citing works, with replacement; list i is drawn m_i times. A work's citations are
 * then the sum of m_i over the works that cite it, its PageRank is solved with list i counting m_i times (`pagerank-by-components.ts`), and
 * competition ranks are given anew. The interval runs from the 2.5 % to the 97.5 % quantile of the ranks, each the smallest rank whose
 * cumulative share reaches the level, and is widened where needed to hold the rank itself: with many ties at the foot of a list (works with one
 * citation lose it in a third of the replicates) the quantiles alone can miss it.
 * Source: Efron (1979), doi 10.1214/aos/1176344552; ranks: Goldstein & Spiegelhalter (1996), doi 10.2307/2983325.
 * Cost O(replicates * (links + works log works)) time, 8 bytes * replicates * works memory.
 * With 0 replicates, or without citing works, every interval is the rank itself.
 * The interval tells how far a rank hangs on which citing works are present; it covers neither missing records nor faults of linking.
 */
export interface RankIntervals {
  low: Uint32Array;
  high: Uint32Array;
}

export interface BootstrapRequest {
  network: DirectedNetwork;
  pageRank: ComponentPageRank;
  damping: number;
  replicates: number;
  seed: number;
  /** The ranks that the intervals must hold. */
  rank: Uint32Array;
  citationRank: Uint32Array;
  onReplicate?: (done: number) => void;
}

export function bootstrapRanks(request: BootstrapRequest): { pageRank: RankIntervals; citations: RankIntervals } {
  const { network, pageRank, damping, replicates, seed, rank, citationRank, onReplicate } = request;
  const { size } = network;
  const citing = citingWorks(network);
  const rounds = citing.length === 0 ? 0 : replicates;
  const random = createRandom(seed);
  const ranker = new Ranker(size);
  const drawn = new Uint32Array(size);
  const scores = new Float64Array(size);
  const citations = new Float64Array(size);
  const pageRanks = new Uint32Array(rounds * size);
  const citationRanks = new Uint32Array(rounds * size);
  for (let replicate = 0; replicate < rounds; replicate += 1) {
    drawLists(citing, drawn, random);
    countDrawnCitations(network, drawn, citations);
    ranker.rank(citations, citationRanks, replicate * size);
    pageRank.solve(damping, scores, drawn);
    ranker.rank(scores, pageRanks, replicate * size);
    onReplicate?.(replicate + 1);
  }
  return { pageRank: intervalsOf(pageRanks, rank, rounds), citations: intervalsOf(citationRanks, citationRank, rounds) };
}

function citingWorks(network: DirectedNetwork): Uint32Array {
  const citing = new Uint32Array(network.size);
  let count = 0;
  for (let work = 0; work < network.size; work += 1) if (network.offsets[work + 1] > network.offsets[work]) citing[count++] = work;
  return citing.slice(0, count);
}

function drawLists(citing: Uint32Array, drawn: Uint32Array, random: Random): void {
  drawn.fill(0);
  for (let draw = 0; draw < citing.length; draw += 1) drawn[citing[random.below(citing.length)]] += 1;
}

function countDrawnCitations({ size, offsets, targets }: DirectedNetwork, drawn: Uint32Array, citations: Float64Array): void {
  citations.fill(0);
  for (let work = 0; work < size; work += 1) {
    const times = drawn[work];
    if (times === 0) continue;
    for (let place = offsets[work], end = offsets[work + 1]; place < end; place += 1) citations[targets[place]] += times;
  }
}

function intervalsOf(ranks: Uint32Array, rank: Uint32Array, replicates: number): RankIntervals {
  const low = rank.slice();
  const high = rank.slice();
  if (replicates === 0) return { low, high };
  const size = rank.length;
  // Whole-number arithmetic: 0.975 * replicates can round to just above a whole number.
  const lowPlace = Math.ceil((replicates * 25) / 1000) - 1;
  const highPlace = Math.ceil((replicates * 975) / 1000) - 1;
  const own = new Uint32Array(replicates);
  for (let work = 0; work < size; work += 1) {
    for (let replicate = 0; replicate < replicates; replicate += 1) own[replicate] = ranks[replicate * size + work];
    own.sort();
    low[work] = Math.min(low[work], own[lowPlace]);
    high[work] = Math.max(high[work], own[highPlace]);
  }
  return { low, high };
}
