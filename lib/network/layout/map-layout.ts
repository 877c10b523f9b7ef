import { findWeakComponents } from '@/lib/network/components';
import { type LayoutNetwork } from '@/lib/network/layout/forceatlas2';
import { layOutConnected } from '@/lib/network/layout/multilevel';
import { removeOverlap } from '@/lib/network/layout/overlap';
import { packParts, type LaidOutPart } from '@/lib/network/layout/packing';
import { createRandom } from '@/lib/network/random';
import { type WeightedNetwork } from '@/lib/network/types';

/**
 * Positions of a map: each connected part is laid out by itself (ForceAtlas2 from a multilevel start), knots are opened a little, the parts are
 * packed around the largest, and the picture is turned so that its longer axis lies flat, centred on 0 and scaled so that nine tenths of the works
 * stand within 100 of the middle; works far outside are drawn in.
 * Links are weighted by the square root of their weight over the mean, within bounds, as similarities are very uneven; links between
 * clusters pull less, so that clusters stand apart as patches. The map shows nearness, not distance: only neighbourhoods can be read.
 * Cost O(n log n + links) a step. Deterministic for a seed. Works without links get NaN: they are not drawn.
 */
const pullBetweenClusters = 0.25;
const drawnRadius = 100;

export function layOutMap(network: WeightedNetwork, cluster: Int32Array, seed: number, onPart?: (share: number) => void): { x: Float64Array; y: Float64Array } {
  const x = new Float64Array(network.size).fill(NaN);
  const y = new Float64Array(network.size).fill(NaN);
  const layout = weighLinks(network, cluster);
  const parts = splitParts(network);
  let done = 0;
  parts.forEach((part, number) => {
    const laidOut = layOutConnected(takePart(layout, part.nodes), createRandom(seed + number));
    removeOverlap(laidOut.x, laidOut.y, clearanceOf(laidOut.x, laidOut.y));
    part.x = laidOut.x;
    part.y = laidOut.y;
    done += part.nodes.length;
    onPart?.(done / network.size);
  });
  packParts(parts);
  for (const part of parts) {
    part.nodes.forEach((node, place) => {
      x[node] = part.x[place];
      y[node] = part.y[place];
    });
  }
  frame(x, y);
  return { x, y };
}

function weighLinks(network: WeightedNetwork, cluster: Int32Array): LayoutNetwork {
  const { size, offsets, neighbours } = network;
  const mean = network.weights.length === 0 ? 1 : network.weights.reduce((sum, weight) => sum + weight, 0) / network.weights.length;
  const weights = new Float64Array(network.weights.length);
  const masses = new Float64Array(size);
  for (let work = 0; work < size; work += 1) {
    masses[work] = 1 + offsets[work + 1] - offsets[work];
    for (let link = offsets[work]; link < offsets[work + 1]; link += 1) {
      const pull = Math.min(2, Math.max(0.3, Math.sqrt(network.weights[link] / mean)));
      const within = cluster[work] === cluster[neighbours[link]];
      weights[link] = within ? pull : pull * pullBetweenClusters;
    }
  }
  return { size, offsets, neighbours, weights, masses };
}

/** Connected parts with at least one link, the largest first, ties by the smallest work. */
function splitParts({ size, offsets, neighbours }: WeightedNetwork): LaidOutPart[] {
  const { component, sizes, count } = findWeakComponents(size, offsets, neighbours);
  const members: Uint32Array[] = Array.from({ length: count }, (_, number) => new Uint32Array(sizes[number]));
  const filled = new Uint32Array(count);
  for (let work = 0; work < size; work += 1) members[component[work]][filled[component[work]]++] = work;
  const linked = members.filter((nodes) => nodes.length > 1);
  linked.sort((one, other) => other.length - one.length || one[0] - other[0]);
  return linked.map((nodes) => ({ nodes, x: new Float64Array(0), y: new Float64Array(0) }));
}

function takePart(layout: LayoutNetwork, nodes: Uint32Array): LayoutNetwork {
  if (nodes.length === layout.size) return layout;
  const numbers = new Map<number, number>();
  nodes.forEach((node, number) => numbers.set(node, number));
  const offsets = new Uint32Array(nodes.length + 1);
  nodes.forEach((node, number) => {
    offsets[number + 1] = offsets[number] + layout.offsets[node + 1] - layout.offsets[node];
  });
  const neighbours = new Uint32Array(offsets[nodes.length]);
  const weights = new Float64Array(neighbours.length);
  nodes.forEach((node, number) => {
    for (let link = layout.offsets[node], slot = offsets[number]; link < layout.offsets[node + 1]; link += 1, slot += 1) {
      neighbours[slot] = numbers.get(layout.neighbours[link]) as number;
      weights[slot] = layout.weights[link];
    }
  });
  return { size: nodes.length, offsets, neighbours, weights, masses: Float64Array.from(nodes, (node) => layout.masses[node]) };
}

/** A good third of the distance that an even spread over the inner nine tenths of the picture would give. */
function clearanceOf(x: Float64Array, y: Float64Array): number {
  const radii = radiiAround(x, y, average(x), average(y)).sort();
  return 0.4 * radii[Math.floor(0.9 * (radii.length - 1))] * Math.sqrt(Math.PI / x.length);
}

/** Centres, turns the longer axis flat, scales, and draws in what stands far outside. Points that are not drawn (NaN) stay so. */
function frame(x: Float64Array, y: Float64Array): void {
  const drawn: number[] = [];
  for (let work = 0; work < x.length; work += 1) if (!Number.isNaN(x[work])) drawn.push(work);
  if (drawn.length === 0) return;
  const flatX = Float64Array.from(drawn, (work) => x[work]);
  const flatY = Float64Array.from(drawn, (work) => y[work]);
  const middleX = average(flatX);
  const middleY = average(flatY);
  let xx = 0;
  let yy = 0;
  let xy = 0;
  for (let place = 0; place < drawn.length; place += 1) {
    xx += (flatX[place] - middleX) ** 2;
    yy += (flatY[place] - middleY) ** 2;
    xy += (flatX[place] - middleX) * (flatY[place] - middleY);
  }
  const angle = 0.5 * Math.atan2(2 * xy, xx - yy);
  const cos = Math.cos(angle);
  const sin = Math.sin(angle);
  const radii = radiiAround(flatX, flatY, middleX, middleY);
  const inner = radii.slice().sort()[Math.floor(0.9 * (radii.length - 1))] || 1;
  const scale = drawnRadius / inner;
  drawn.forEach((work, place) => {
    const byX = flatX[place] - middleX;
    const byY = flatY[place] - middleY;
    const radius = (radii[place] * scale) / drawnRadius;
    // Beyond 1.3 of the inner radius, distance grows with its logarithm only: one stray part must not shrink all others.
    const drawIn = radius > 1.3 ? (1.3 + Math.log(radius / 1.3)) / radius : 1;
    x[work] = (byX * cos + byY * sin) * scale * drawIn;
    y[work] = (byY * cos - byX * sin) * scale * drawIn;
  });
}

function average(values: Float64Array): number {
  let sum = 0;
  for (const value of values) sum += value;
  return sum / values.length;
}

function radiiAround(x: Float64Array, y: Float64Array, middleX: number, middleY: number): Float64Array {
  return x.map((value, place) => Math.sqrt((value - middleX) ** 2 + (y[place] - middleY) ** 2));
}
