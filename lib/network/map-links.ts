import { type WeightedNetwork } from '@/lib/network/types';

/**
 * The links that a map draws: of each work its `strongest` heaviest, seen from either end, and a maximum spanning forest, so that
 * nothing that hangs together in the network falls apart on the map.
 * Order of links: heavier first, equal weights by the smaller, then the greater work; it is total, so the choice is unique.
 * Spanning forest: Boruvka's rounds (1926), each component takes its best link outwards; see Kruskal (1956), doi 10.1090/S0002-9939-1956-0078686-7.
 * Cost O(links * (strongest + log works)). At most (strongest + 1) links a work. Works without links have none.
 */
export interface MapLinks {
  /** source < target, in order of source, then target. */
  source: Uint32Array;
  target: Uint32Array;
  /** Weight in the network. */
  weight: Float64Array;
  /** What the link was chosen by. */
  preference: Float64Array;
}

/** @param preferences what links are chosen by, in the order of `network.neighbours`; their weights by default */
export function chooseMapLinks(network: WeightedNetwork, strongest: number, preferences: Float64Array = network.weights): MapLinks {
  const { size, offsets, neighbours, weights } = network;
  const kept = new Uint8Array(neighbours.length);
  const preferred = { ...network, weights: preferences };
  markStrongest(preferred, strongest, kept);
  markSpanningForest(preferred, kept);
  const source: number[] = [];
  const target: number[] = [];
  const places: number[] = [];
  const cursors = offsets.slice(0, size);
  for (let work = 0; work < size; work += 1) {
    for (let link = offsets[work]; link < offsets[work + 1]; link += 1) {
      const neighbour = neighbours[link];
      if (neighbour <= work) continue;
      // Rows are ascending, so the neighbour's links back are met in turn.
      while (neighbours[cursors[neighbour]] !== work) cursors[neighbour] += 1;
      if (kept[link] === 0 && kept[cursors[neighbour]] === 0) continue;
      source.push(work);
      target.push(neighbour);
      places.push(link);
    }
  }
  return { source: Uint32Array.from(source), target: Uint32Array.from(target), weight: Float64Array.from(places, (link) => weights[link]), preference: Float64Array.from(places, (link) => preferences[link]) };
}

function markStrongest({ size, offsets, neighbours, weights }: WeightedNetwork, strongest: number, kept: Uint8Array): void {
  const best = new Uint32Array(strongest);
  for (let work = 0; work < size; work += 1) {
    let filled = 0;
    for (let link = offsets[work]; link < offsets[work + 1]; link += 1) {
      if (filled === strongest && !comesBefore(work, link, best[filled - 1], neighbours, weights)) continue;
      let place = filled < strongest ? filled++ : filled - 1;
      for (; place > 0 && comesBefore(work, link, best[place - 1], neighbours, weights); place -= 1) best[place] = best[place - 1];
      best[place] = link;
    }
    for (let place = 0; place < filled; place += 1) kept[best[place]] = 1;
  }
}

/** Whether one link of a work stands before another of the same work in the total order. */
function comesBefore(work: number, link: number, other: number, neighbours: Uint32Array, weights: Float64Array): boolean {
  if (weights[link] !== weights[other]) return weights[link] > weights[other];
  const [one, two] = [neighbours[link], neighbours[other]];
  const least = Math.min(work, one) - Math.min(work, two);
  return least !== 0 ? least < 0 : Math.max(work, one) < Math.max(work, two);
}

function markSpanningForest({ size, offsets, neighbours, weights }: WeightedNetwork, kept: Uint8Array): void {
  const component = Int32Array.from({ length: size }, (_, work) => work);
  const root = (start: number): number => {
    let work = start;
    while (component[work] !== work) {
      component[work] = component[component[work]];
      work = component[work];
    }
    return work;
  };
  const bestLink = new Int32Array(size);
  const bestFrom = new Int32Array(size);
  for (let joined = true; joined; ) {
    joined = false;
    bestLink.fill(-1);
    for (let work = 0; work < size; work += 1) component[work] = root(work);
    for (let work = 0; work < size; work += 1) {
      const own = component[work];
      for (let link = offsets[work]; link < offsets[work + 1]; link += 1) {
        if (component[neighbours[link]] === own) continue;
        if (bestLink[own] < 0 || isHeavier(work, link, bestFrom[own], bestLink[own], neighbours, weights)) {
          bestLink[own] = link;
          bestFrom[own] = work;
        }
      }
    }
    for (let own = 0; own < size; own += 1) {
      if (bestLink[own] < 0) continue;
      const one = root(own);
      const other = root(component[neighbours[bestLink[own]]]);
      if (one === other) continue;
      component[Math.max(one, other)] = Math.min(one, other);
      kept[bestLink[own]] = 1;
      joined = true;
    }
  }
}

/** The same total order for links of different works. */
function isHeavier(from: number, link: number, otherFrom: number, other: number, neighbours: Uint32Array, weights: Float64Array): boolean {
  if (weights[link] !== weights[other]) return weights[link] > weights[other];
  const least = Math.min(from, neighbours[link]) - Math.min(otherFrom, neighbours[other]);
  return least !== 0 ? least < 0 : Math.max(from, neighbours[link]) < Math.max(otherFrom, neighbours[other]);
}

/** Drawn links as a network weighted by preference, each stored from both ends, rows ascending. */
export function networkOfLinks(size: number, { source, target, preference }: MapLinks): WeightedNetwork {
  const offsets = new Uint32Array(size + 1);
  for (let link = 0; link < source.length; link += 1) {
    offsets[source[link] + 1] += 1;
    offsets[target[link] + 1] += 1;
  }
  for (let work = 0; work < size; work += 1) offsets[work + 1] += offsets[work];
  const next = offsets.slice(0, size);
  const neighbours = new Uint32Array(2 * source.length);
  const weights = new Float64Array(2 * source.length);
  // Links come in order of source, then target: for every work, those to smaller works are met before those to greater ones.
  for (let link = 0; link < source.length; link += 1) {
    const from = next[source[link]]++;
    const to = next[target[link]]++;
    neighbours[from] = target[link];
    neighbours[to] = source[link];
    weights[from] = weights[to] = preference[link];
  }
  return { size, offsets, neighbours, weights };
}
