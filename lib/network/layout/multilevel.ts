import { runForces, type LayoutNetwork } from '@/lib/network/layout/forceatlas2';
import { shuffle, type Random } from '@/lib/network/random';

/**
 * Lays out one connected network from coarse to fine: nodes are merged along their heaviest links until few are left, these are laid out
 * from a random start, and each finer level starts where its merged nodes stand. The start decides far more than the number of steps: twenty-odd
 * steps a level then give a picture that a thousand steps from a random start do not reach.
 * Source: Walshaw (2003), A multilevel algorithm for force-directed graph drawing, J. Graph Algorithms and Applications 7:253, doi 10.7155/jgaa.00070.
 * Cost O(n log n + links) a step. Deterministic for a seed.
 */
const coarsestSize = 120;
const largestMerge = 6;
/** Up to this size every arrangement is a ring; there can be thousands of such parts. */
const smallestSize = 4;
/** Distance at which two works joined by a mean link stand still under the default forces. */
const linkLength = 6;
const steps = { coarsest: 300, between: 30, finest: 40 };

interface Level {
  network: LayoutNetwork;
  /** Node of the next coarser level that each node was merged into; null on the coarsest. */
  merged: Int32Array | null;
}

export function layOutConnected(network: LayoutNetwork, random: Random): { x: Float64Array; y: Float64Array } {
  if (network.size <= smallestSize) return layOutRing(network.size);
  const levels = coarsen(network, random);
  let x = new Float64Array(0);
  let y = new Float64Array(0);
  for (let depth = levels.length - 1; depth >= 0; depth -= 1) {
    const { network: level, merged } = levels[depth];
    const startX = new Float64Array(level.size);
    const startY = new Float64Array(level.size);
    for (let node = 0; node < level.size; node += 1) {
      const spread = merged === null ? 200 : 4;
      startX[node] = (merged === null ? 0 : x[merged[node]]) + spread * (random.unit() - 0.5);
      startY[node] = (merged === null ? 0 : y[merged[node]]) + spread * (random.unit() - 0.5);
    }
    runForces(level, startX, startY, depth === levels.length - 1 ? steps.coarsest : depth === 0 ? steps.finest : steps.between);
    x = startX;
    y = startY;
  }
  return { x, y };
}

function layOutRing(size: number): { x: Float64Array; y: Float64Array } {
  const radius = size < 2 ? 0 : linkLength / 2 / Math.sin(Math.PI / size);
  const places = Float64Array.from({ length: size }, (_, node) => (2 * Math.PI * node) / size);
  return { x: places.map((angle) => radius * Math.cos(angle)), y: places.map((angle) => radius * Math.sin(angle)) };
}

function coarsen(network: LayoutNetwork, random: Random): Level[] {
  const levels: Level[] = [{ network, merged: null }];
  for (;;) {
    const last = levels[levels.length - 1];
    if (last.network.size <= coarsestSize) return levels;
    const { merged, count } = mergeAlongHeaviest(last.network, random);
    // A star hardly shrinks by pairs; going on would only add levels.
    if (count > 0.85 * last.network.size) return levels;
    last.merged = merged;
    levels.push({ network: contract(last.network, merged, count), merged: null });
  }
}

/** Each node joins the neighbour, or the small merge of a neighbour, with the heaviest link in proportion to the neighbour's mass. */
function mergeAlongHeaviest({ size, offsets, neighbours, weights, masses }: LayoutNetwork, random: Random): { merged: Int32Array; count: number } {
  const merged = new Int32Array(size).fill(-1);
  const sizes = new Uint8Array(size);
  const order = Int32Array.from({ length: size }, (_, node) => node);
  shuffle(order, random);
  let count = 0;
  for (const node of order) {
    if (merged[node] >= 0) continue;
    let best = -1;
    let bestPull = 0;
    for (let link = offsets[node]; link < offsets[node + 1]; link += 1) {
      const neighbour = neighbours[link];
      const pull = weights[link] / Math.sqrt(masses[neighbour]);
      if (pull > bestPull && (merged[neighbour] < 0 || sizes[merged[neighbour]] < largestMerge)) {
        bestPull = pull;
        best = neighbour;
      }
    }
    if (best < 0) {
      sizes[count] = 1;
      merged[node] = count++;
    } else if (merged[best] < 0) {
      sizes[count] = 2;
      merged[node] = merged[best] = count++;
    } else {
      merged[node] = merged[best];
      sizes[merged[best]] += 1;
    }
  }
  return { merged, count };
}

function contract({ size, offsets, neighbours, weights, masses }: LayoutNetwork, merged: Int32Array, count: number): LayoutNetwork {
  const newMasses = new Float64Array(count);
  const starts = new Uint32Array(count + 1);
  for (let node = 0; node < size; node += 1) {
    newMasses[merged[node]] += masses[node];
    starts[merged[node] + 1] += 1;
  }
  for (let node = 0; node < count; node += 1) starts[node + 1] += starts[node];
  const members = new Uint32Array(size);
  const next = starts.slice();
  for (let node = 0; node < size; node += 1) members[next[merged[node]]++] = node;
  const newOffsets = new Uint32Array(count + 1);
  const newNeighbours = new Uint32Array(neighbours.length);
  const newWeights = new Float64Array(neighbours.length);
  const slots = new Int32Array(count).fill(-1);
  let length = 0;
  for (let node = 0; node < count; node += 1) {
    const first = length;
    for (let place = starts[node]; place < starts[node + 1]; place += 1) {
      const member = members[place];
      for (let link = offsets[member]; link < offsets[member + 1]; link += 1) {
        const other = merged[neighbours[link]];
        if (other === node) continue;
        if (slots[other] < first) {
          slots[other] = length;
          newNeighbours[length++] = other;
        }
        newWeights[slots[other]] += weights[link];
      }
    }
    newOffsets[node + 1] = length;
  }
  return { size: count, offsets: newOffsets, neighbours: newNeighbours.slice(0, length), weights: newWeights.slice(0, length), masses: newMasses };
}
