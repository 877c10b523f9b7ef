import { type DirectedNetwork } from '@/lib/network/types';

/**
 * Weak and strong components.
 * Weak: works joined when the direction of citations is ignored (union-find with path halving, cost close to O(works + links)).
 * Strong: works each of which can be reached from every other by following citations (Tarjan 1972, SIAM J. Computing 1:146,
 * doi 10.1137/0201010; O(works + links); iterative, because chains of citations are deeper than the call stack).
 * A work without links is a component of its own; an empty network has no components.
 */
export interface Components {
  /** Component number of each work. */
  component: Int32Array;
  /** Works in each component. */
  sizes: Uint32Array;
  count: number;
}

/** Weak components, numbered in order of their smallest work. */
export function findWeakComponents(size: number, offsets: Uint32Array, targets: Uint32Array): Components {
  const parent = new Int32Array(size);
  for (let work = 0; work < size; work += 1) parent[work] = work;
  const root = (start: number): number => {
    let work = start;
    while (parent[work] !== work) {
      parent[work] = parent[parent[work]];
      work = parent[work];
    }
    return work;
  };
  for (let work = 0; work < size; work += 1) {
    for (let place = offsets[work]; place < offsets[work + 1]; place += 1) {
      const one = root(work);
      const other = root(targets[place]);
      // The smaller number becomes the root, so that a root is always its component's smallest work.
      if (one < other) parent[other] = one;
      else parent[one] = other;
    }
  }
  const component = new Int32Array(size);
  let count = 0;
  for (let work = 0; work < size; work += 1) component[work] = parent[work] === work ? count++ : component[root(work)];
  return { component, sizes: countSizes(component, count), count };
}

/** Strong components, numbered so that a component only cites into components with smaller numbers (cited side first). */
export function findStrongComponents({ size, offsets, targets }: DirectedNetwork): Components {
  const component = new Int32Array(size).fill(-1);
  const visited = new Int32Array(size);
  const lowest = new Int32Array(size);
  const open = new Int32Array(size);
  const path = new Int32Array(size);
  const cursor = new Uint32Array(size);
  let openCount = 0;
  let clock = 0;
  let count = 0;
  for (let start = 0; start < size; start += 1) {
    if (visited[start] !== 0) continue;
    let depth = 0;
    const enter = (work: number): void => {
      visited[work] = lowest[work] = ++clock;
      open[openCount++] = work;
      cursor[work] = offsets[work];
      path[depth] = work;
    };
    enter(start);
    while (depth >= 0) {
      const work = path[depth];
      if (cursor[work] < offsets[work + 1]) {
        const target = targets[cursor[work]++];
        if (visited[target] === 0) {
          depth += 1;
          enter(target);
        } else if (component[target] < 0 && visited[target] < lowest[work]) lowest[work] = visited[target];
        continue;
      }
      if (lowest[work] === visited[work]) {
        let member: number;
        do {
          member = open[--openCount];
          component[member] = count;
        } while (member !== work);
        count += 1;
      }
      depth -= 1;
      if (depth >= 0 && lowest[work] < lowest[path[depth]]) lowest[path[depth]] = lowest[work];
    }
  }
  return { component, sizes: countSizes(component, count), count };
}

function countSizes(component: Int32Array, count: number): Uint32Array {
  const sizes = new Uint32Array(count);
  for (let work = 0; work < component.length; work += 1) sizes[component[work]] += 1;
  return sizes;
}
