import { type DirectedNetwork, type WeightedNetwork } from '@/lib/network/types';

/** What became of the pairs that a network was built from: pairs = links + duplicates + self-links. */
export interface BuiltNetwork {
  network: DirectedNetwork;
  duplicates: number;
  selfLinks: number;
}

/** Rows of ascending numbers: `members[offsets[row] .. offsets[row + 1])`. Rows and members may count different things. */
export interface Rows {
  offsets: Uint32Array;
  members: Uint32Array;
}

function requireIndex(value: number, size: number, place: number, side: string): void {
  if (value >= size) throw new RangeError(`Citation ${place}: its ${side} work is number ${value}, but there are only ${size} works.`);
}

/**
 * Builds compressed sparse rows from pairs in any order.
 * Two counting sorts (by cited, then by citing work) leave every row ascending; duplicates then stand side by side and are dropped,
 * as are self-links; both are counted. Cost O(works + pairs), no comparison sort.
 * Empty input gives an empty network. Throws a RangeError for a pair that names a work that does not exist, or for lists of unequal length.
 */
export function buildNetwork(size: number, citing: ArrayLike<number>, cited: ArrayLike<number>): BuiltNetwork {
  if (citing.length !== cited.length) throw new RangeError(`There are ${citing.length} citing but ${cited.length} cited works.`);
  const pairs = citing.length;
  const byCited = new Uint32Array(size + 1);
  const byCiting = new Uint32Array(size + 1);
  for (let pair = 0; pair < pairs; pair += 1) {
    requireIndex(citing[pair], size, pair, 'citing');
    requireIndex(cited[pair], size, pair, 'cited');
    byCiting[citing[pair] + 1] += 1;
    byCited[cited[pair] + 1] += 1;
  }
  for (let work = 0; work < size; work += 1) {
    byCiting[work + 1] += byCiting[work];
    byCited[work + 1] += byCited[work];
  }
  const order = new Uint32Array(pairs);
  for (let pair = 0; pair < pairs; pair += 1) order[byCited[cited[pair]]++] = pair;
  const sorted = new Uint32Array(pairs);
  const next = byCiting.slice();
  for (let place = 0; place < pairs; place += 1) sorted[next[citing[order[place]]]++] = cited[order[place]];
  return dropRepeats(size, byCiting, sorted);
}

function dropRepeats(size: number, starts: Uint32Array, sorted: Uint32Array): BuiltNetwork {
  const offsets = new Uint32Array(size + 1);
  let kept = 0;
  let selfLinks = 0;
  for (let work = 0; work < size; work += 1) {
    const rowStart = kept;
    for (let place = starts[work]; place < starts[work + 1]; place += 1) {
      const target = sorted[place];
      if (target === work) selfLinks += 1;
      else if (kept === rowStart || sorted[kept - 1] !== target) sorted[kept++] = target;
    }
    offsets[work + 1] = kept;
  }
  return { network: { size, offsets, targets: sorted.slice(0, kept) }, duplicates: sorted.length - kept - selfLinks, selfLinks };
}

/** Turns rows round: row r of the result lists, ascending, the rows that hold r. Cost O(rows + members). */
export function transposeRows({ offsets, members }: Rows, columns: number): Rows {
  const turned = new Uint32Array(columns + 1);
  for (let place = 0; place < members.length; place += 1) turned[members[place] + 1] += 1;
  for (let column = 0; column < columns; column += 1) turned[column + 1] += turned[column];
  const next = turned.slice(0, columns);
  const rows = new Uint32Array(members.length);
  for (let row = 0; row + 1 < offsets.length; row += 1) {
    for (let place = offsets[row]; place < offsets[row + 1]; place += 1) rows[next[members[place]]++] = row;
  }
  return { offsets: turned, members: rows };
}

/** The same works with every link turned round: row i lists, ascending, the works that cite i. */
export function transposeNetwork(network: DirectedNetwork): DirectedNetwork {
  const turned = transposeRows({ offsets: network.offsets, members: network.targets }, network.size);
  return { size: network.size, offsets: turned.offsets, targets: turned.members };
}

/** Undirected pairs of a network in compressed rows, each pair once: row i holds partners greater than i, in any order. */
export interface WeightedPairs {
  size: number;
  offsets: Uint32Array;
  partners: Uint32Array;
  weights: Float64Array;
}

/**
 * Stores each pair from both ends, neighbours ascending whatever the order within the rows of the input:
 * a first pass turns the pairs round (rows of smaller partners, ascending by construction), a second one appends the greater partners.
 * Cost O(works + pairs).
 */
export function buildWeightedNetwork({ size, offsets, partners, weights }: WeightedPairs): WeightedNetwork {
  const smaller = new Uint32Array(size);
  const starts = new Uint32Array(size + 1);
  for (let work = 0; work < size; work += 1) starts[work + 1] = offsets[work + 1] - offsets[work];
  for (let place = 0; place < partners.length; place += 1) {
    smaller[partners[place]] += 1;
    starts[partners[place] + 1] += 1;
  }
  for (let work = 0; work < size; work += 1) starts[work + 1] += starts[work];
  const neighbours = new Uint32Array(2 * partners.length);
  const bothWays = new Float64Array(2 * partners.length);
  const next = starts.slice(0, size);
  for (let work = 0; work < size; work += 1) {
    for (let place = offsets[work]; place < offsets[work + 1]; place += 1) {
      const slot = next[partners[place]]++;
      neighbours[slot] = work;
      bothWays[slot] = weights[place];
    }
  }
  for (let work = 0; work < size; work += 1) {
    const end = starts[work] + smaller[work];
    for (let place = starts[work]; place < end; place += 1) {
      const slot = next[neighbours[place]]++;
      neighbours[slot] = work;
      bothWays[slot] = bothWays[place];
    }
  }
  return { size, offsets: starts, neighbours, weights: bothWays };
}

/**
 * Reads citations without their direction: the weight of a pair is the number of citations between its two works, 1 or 2.
 * `incoming` is the transposed network. Cost O(works + links).
 */
export function buildUndirectedNetwork(network: DirectedNetwork, incoming: DirectedNetwork): WeightedNetwork {
  const { size } = network;
  const offsets = new Uint32Array(size + 1);
  const neighbours = new Uint32Array(2 * network.targets.length);
  const weights = new Float64Array(2 * network.targets.length);
  let slot = 0;
  for (let work = 0; work < size; work += 1) {
    let out = network.offsets[work];
    let into = incoming.offsets[work];
    const outEnd = network.offsets[work + 1];
    const intoEnd = incoming.offsets[work + 1];
    while (out < outEnd || into < intoEnd) {
      const cited = out < outEnd ? network.targets[out] : size;
      const citing = into < intoEnd ? incoming.targets[into] : size;
      neighbours[slot] = Math.min(cited, citing);
      weights[slot] = cited === citing ? 2 : 1;
      if (cited <= citing) out += 1;
      if (citing <= cited) into += 1;
      slot += 1;
    }
    offsets[work + 1] = slot;
  }
  return { size, offsets, neighbours: neighbours.slice(0, slot), weights: weights.slice(0, slot) };
}
