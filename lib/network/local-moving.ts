import { type LevelNetwork, type Scratch } from '@/lib/network/level-network';
import { shuffle, type Random } from '@/lib/network/random';

/**
 * Local moving: each node is moved to the neighbouring group where modularity gains most, until no visited node can gain.
 *   gain of node v joining group C  ~  w(v, C) - resolution * s_v * K_C / 2M      (in units of weight; K_C without v)
 * Nodes wait in a queue, in seeded random order at first; a move puts the neighbours that are not in the new group back into the queue.
 * A node leaves for an empty group when every gain is negative. Equal gains (within 1e-12 of the mean strength) keep the node where it is,
 * else the lowest group number wins.
 * Source: Traag, Waltman & Van Eck (2019), doi 10.1038/s41598-019-41695-z (fast local moving), after Blondel et al. (2008), doi 10.1088/1742-5468/2008/10/P10008.
 * Cost O(links) a visit of all nodes; a few visits are usual. Assumes positive weights and groups numbered 0 .. size - 1.
 *
 * @returns number of moves; `groups` is changed in place
 */
export function moveNodes(level: LevelNetwork, groups: Int32Array, resolution: number, random: Random, scratch: Scratch): number {
  const { size, offsets, neighbours, weights, strengths, totalStrength } = level;
  if (totalStrength === 0) return 0;
  const pull = resolution / totalStrength;
  const tie = (1e-12 * totalStrength) / size;
  const groupStrengths = scratch.reals('move.groupStrengths', size);
  const groupSizes = scratch.wholes('move.groupSizes', size);
  for (let node = 0; node < size; node += 1) {
    groupStrengths[groups[node]] += strengths[node];
    groupSizes[groups[node]] += 1;
  }
  const empty = new EmptyGroups(groupSizes, scratch.unclearedWholes('move.empty', size));
  const queue = scratch.unclearedWholes('move.queue', size);
  for (let node = 0; node < size; node += 1) queue[node] = node;
  shuffle(queue, random);
  const waiting = scratch.flags('move.waiting', size).fill(1);
  const sums = scratch.reals('move.sums', size);
  const met = scratch.unclearedWholes('move.met', size + 1);
  let head = 0;
  let length = size;
  let moves = 0;
  while (length > 0) {
    const node = queue[head];
    head = head + 1 === size ? 0 : head + 1;
    length -= 1;
    waiting[node] = 0;
    const home = groups[node];
    const strength = strengths[node];
    const start = offsets[node];
    const end = offsets[node + 1];
    let found = 0;
    for (let link = start; link < end; link += 1) {
      const group = groups[neighbours[link]];
      const sum = sums[group];
      met[found] = group;
      found += sum === 0 ? 1 : 0;
      sums[group] = sum + weights[link];
    }
    groupStrengths[home] -= strength;
    const stay = sums[home] - pull * strength * groupStrengths[home];
    let best = home;
    let bestGain = stay;
    for (let place = 0; place < found; place += 1) {
      const group = met[place];
      const gain = sums[group] - pull * strength * groupStrengths[group];
      sums[group] = 0;
      if (gain > bestGain + tie || (best !== home && gain > bestGain - tie && group < best && gain > stay + tie)) {
        bestGain = Math.max(gain, bestGain);
        best = group;
      }
    }
    if (bestGain < -tie && groupSizes[home] > 1) best = empty.take();
    groupStrengths[best] += strength;
    if (best === home) continue;
    moves += 1;
    groups[node] = best;
    groupSizes[best] += 1;
    groupSizes[home] -= 1;
    if (groupSizes[home] === 0) empty.add(home);
    for (let link = start; link < end; link += 1) {
      const neighbour = neighbours[link];
      if (waiting[neighbour] === 1 || groups[neighbour] === best) continue;
      waiting[neighbour] = 1;
      const place = head + length;
      queue[place >= size ? place - size : place] = neighbour;
      length += 1;
    }
  }
  return moves;
}

/** Numbers of groups without nodes. A node only ever moves to a neighbour's group or to a number taken from here, so a number in here stays empty. */
class EmptyGroups {
  private length = 0;

  constructor(sizes: Int32Array, private readonly numbers: Int32Array) {
    for (let group = sizes.length - 1; group >= 0; group -= 1) if (sizes[group] === 0) this.add(group);
  }

  add(group: number): void {
    this.numbers[this.length++] = group;
  }

  take(): number {
    return this.numbers[--this.length];
  }
}
