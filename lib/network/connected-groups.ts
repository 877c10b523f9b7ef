import { type WeightedNetwork } from '@/lib/network/types';

/**
 * Splits every group that falls apart: two works of a group stay together only if a path inside the group joins them.
 * Splitting never lowers modularity (no inside weight is lost, the squared strengths shrink). Breadth-first search, O(works + links).
 * Groups come out numbered in order of their smallest work.
 */
export function splitDisconnectedGroups(network: WeightedNetwork, groups: Int32Array): { groups: Int32Array; count: number; split: number } {
  const { size, offsets, neighbours } = network;
  const parts = new Int32Array(size).fill(-1);
  const queue = new Int32Array(size);
  const seen = new Set<number>();
  let count = 0;
  for (let start = 0; start < size; start += 1) {
    if (parts[start] >= 0) continue;
    parts[start] = count;
    seen.add(groups[start]);
    queue[0] = start;
    for (let head = 0, tail = 1; head < tail; head += 1) {
      const work = queue[head];
      for (let link = offsets[work]; link < offsets[work + 1]; link += 1) {
        const neighbour = neighbours[link];
        if (parts[neighbour] >= 0 || groups[neighbour] !== groups[work]) continue;
        parts[neighbour] = count;
        queue[tail++] = neighbour;
      }
    }
    count += 1;
  }
  return { groups: parts, count, split: count - seen.size };
}

/**
 * Numbers groups by size, the largest first, ties by the smallest work; groups smaller than `minimumSize` become -1.
 * Expects groups numbered in order of their smallest work.
 */
export function numberBySize(groups: Int32Array, count: number, minimumSize: number): { groups: Int32Array; sizes: number[] } {
  const sizes = new Uint32Array(count);
  for (const group of groups) sizes[group] += 1;
  const order = Array.from(sizes.keys()).filter((group) => sizes[group] >= minimumSize);
  order.sort((one, other) => sizes[other] - sizes[one] || one - other);
  const numbers = new Int32Array(count).fill(-1);
  order.forEach((group, number) => {
    numbers[group] = number;
  });
  return { groups: groups.map((group) => numbers[group]), sizes: order.map((group) => sizes[group]) };
}
