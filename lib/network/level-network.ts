import { type WeightedNetwork } from '@/lib/network/types';

/**
 * One level of a multi-level clustering: a weighted network whose nodes are works or, higher up, groups of works.
 * Strengths keep the weight inside contracted nodes (counted twice), so modularity gains are the same on every level; the loops
 * themselves never matter to a move and are not stored.
 */
export interface LevelNetwork {
  size: number;
  offsets: Uint32Array;
  neighbours: Uint32Array;
  weights: Float64Array;
  strengths: Float64Array;
  /** Sum of all strengths: 2M. */
  totalStrength: number;
}

export function startLevel(network: WeightedNetwork): LevelNetwork {
  const strengths = new Float64Array(network.size);
  let totalStrength = 0;
  for (let work = 0; work < network.size; work += 1) {
    let strength = 0;
    for (let place = network.offsets[work]; place < network.offsets[work + 1]; place += 1) strength += network.weights[place];
    strengths[work] = strength;
    totalStrength += strength;
  }
  return { size: network.size, offsets: network.offsets, neighbours: network.neighbours, weights: network.weights, strengths, totalStrength };
}

/**
 * Working arrays that a clustering uses over and over. Each name belongs to one function and is free again when that function returns; arrays
 * that outlive a call are never taken from here. Without it, most of the time would go into clearing fresh memory.
 */
export class Scratch {
  private readonly kept = new Map<string, Float64Array | Int32Array | Uint8Array>();

  /** Zeros. */
  reals(name: string, size: number): Float64Array {
    return this.take(name, size, (length) => new Float64Array(length)).fill(0);
  }

  wholes(name: string, size: number): Int32Array {
    return this.take(name, size, (length) => new Int32Array(length)).fill(0);
  }

  flags(name: string, size: number): Uint8Array {
    return this.take(name, size, (length) => new Uint8Array(length)).fill(0);
  }

  /** Whatever was there before: for arrays that are written before they are read. */
  uncleared(name: string, size: number): Float64Array {
    return this.take(name, size, (length) => new Float64Array(length));
  }

  unclearedWholes(name: string, size: number): Int32Array {
    return this.take(name, size, (length) => new Int32Array(length));
  }

  private take<T extends Float64Array | Int32Array | Uint8Array>(name: string, size: number, make: (length: number) => T): T {
    let array = this.kept.get(name) as T | undefined;
    if (array === undefined || array.length < size) {
      array = make(size);
      this.kept.set(name, array);
    }
    return array.subarray(0, size) as T;
  }
}

/** Contracts each group to one node; links between groups are summed. `groups` is numbered 0 .. count - 1. Cost O(nodes + links). */
export function contractLevel(level: LevelNetwork, groups: Int32Array, count: number, scratch: Scratch): LevelNetwork {
  const { size, offsets, neighbours, weights } = level;
  const starts = scratch.wholes('contract.starts', count + 1);
  for (let node = 0; node < size; node += 1) starts[groups[node] + 1] += 1;
  for (let group = 0; group < count; group += 1) starts[group + 1] += starts[group];
  const members = scratch.unclearedWholes('contract.members', size);
  const next = scratch.unclearedWholes('contract.next', count + 1);
  next.set(starts);
  for (let node = 0; node < size; node += 1) members[next[groups[node]]++] = node;

  const strengths = new Float64Array(count);
  const newOffsets = new Uint32Array(count + 1);
  const newNeighbours = scratch.unclearedWholes('contract.neighbours', neighbours.length);
  const newWeights = scratch.uncleared('contract.weights', neighbours.length);
  const sums = scratch.reals('contract.sums', count);
  const met = scratch.unclearedWholes('contract.met', count + 1);
  let length = 0;
  for (let group = 0; group < count; group += 1) {
    let found = 0;
    let strength = 0;
    for (let place = starts[group], last = starts[group + 1]; place < last; place += 1) {
      const node = members[place];
      strength += level.strengths[node];
      for (let link = offsets[node], end = offsets[node + 1]; link < end; link += 1) {
        const other = groups[neighbours[link]];
        const sum = sums[other];
        met[found] = other;
        found += sum === 0 ? 1 : 0;
        sums[other] = sum + weights[link];
      }
    }
    strengths[group] = strength;
    for (let place = 0; place < found; place += 1) {
      const other = met[place];
      if (other !== group) {
        newNeighbours[length] = other;
        newWeights[length] = sums[other];
        length += 1;
      }
      sums[other] = 0;
    }
    newOffsets[group + 1] = length;
  }
  return { size: count, offsets: newOffsets, neighbours: new Uint32Array(newNeighbours.subarray(0, length)), weights: newWeights.slice(0, length), strengths, totalStrength: level.totalStrength };
}

/** Renumbers groups 0, 1, ... in order of their first node, in place; returns their number. */
export function renumberGroups(groups: Int32Array): number {
  let highest = -1;
  for (let node = 0; node < groups.length; node += 1) highest = Math.max(highest, groups[node]);
  const numbers = new Int32Array(highest + 1).fill(-1);
  let count = 0;
  for (let node = 0; node < groups.length; node += 1) {
    const group = groups[node];
    if (numbers[group] < 0) numbers[group] = count++;
    groups[node] = numbers[group];
  }
  return count;
}

/** Group of each work, given the group of each node of the top level and, level by level, the node that each node was contracted to. */
export function flattenGroups(top: Int32Array, lifts: Int32Array[]): Int32Array {
  let groups = top;
  for (let step = lifts.length - 1; step >= 0; step -= 1) {
    const above = groups;
    groups = lifts[step].map((node) => above[node]);
  }
  return groups;
}
