import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { findWeakComponents } from '@/lib/network/components';
import { Repulsion } from '@/lib/network/layout/barnes-hut';
import { layOutMap } from '@/lib/network/layout/map-layout';
import { removeOverlap } from '@/lib/network/layout/overlap';
import { packParts, type LaidOutPart } from '@/lib/network/layout/packing';
import { chooseMapLinks, networkOfLinks } from '@/lib/network/map-links';
import { createRandom } from '@/lib/network/random';
import { weightedNetworks, weightedOf } from '@/tests/unit/network/made-networks';

describe('links of the map', () => {
  it('hold the strongest of each work, hang together as the network does, and stay few', () => {
    fc.assert(
      fc.property(weightedNetworks, fc.integer({ min: 1, max: 3 }), (network, strongest) => {
        const links = chooseMapLinks(network, strongest);
        const drawn = networkOfLinks(network.size, links);
        expect(findWeakComponents(drawn.size, drawn.offsets, drawn.neighbours).component).toEqual(findWeakComponents(network.size, network.offsets, network.neighbours).component);
        expect(links.source.length).toBeLessThanOrEqual((strongest + 1) * network.size);
        for (let work = 0; work < network.size; work += 1) {
          const own = [...network.weights.subarray(network.offsets[work], network.offsets[work + 1])].sort((a, b) => b - a).slice(0, strongest);
          const shown = [...drawn.weights.subarray(drawn.offsets[work], drawn.offsets[work + 1])].sort((a, b) => b - a).slice(0, own.length);
          expect(shown).toEqual(own);
        }
        for (let link = 0; link < links.source.length; link += 1) {
          expect(links.source[link]).toBeLessThan(links.target[link]);
          if (link > 0) expect([links.source[link - 1], links.target[link - 1]] < [links.source[link], links.target[link]] || links.source[link - 1] < links.source[link] || links.target[link - 1] < links.target[link]).toBe(true);
        }
      }),
    );
  });

  it('hold a maximum spanning forest, as Kruskal builds it', () => {
    fc.assert(
      fc.property(weightedNetworks, (network) => {
        const edges: [number, number, number][] = [];
        for (let work = 0; work < network.size; work += 1) for (let link = network.offsets[work]; link < network.offsets[work + 1]; link += 1) if (network.neighbours[link] > work) edges.push([work, network.neighbours[link], network.weights[link]]);
        edges.sort((one, other) => other[2] - one[2] || one[0] - other[0] || one[1] - other[1]);
        const group = Array.from({ length: network.size }, (_, work) => work);
        const links = chooseMapLinks(network, 1);
        const drawn = new Set(Array.from(links.source, (source, link) => `${source} ${links.target[link]}`));
        for (const [one, other] of edges) {
          if (group[one] === group[other]) continue;
          const [from, to] = [group[one], group[other]];
          group.forEach((value, work) => {
            if (value === from) group[work] = to;
          });
          expect(drawn.has(`${one} ${other}`)).toBe(true);
        }
      }),
    );
  });

  it('can be chosen by something other than their weight', () => {
    const network = weightedOf(3, [[0, 1, 9], [0, 2, 1], [1, 2, 5]]);
    const preferences = network.weights.map((weight) => 10 - weight);
    const links = chooseMapLinks(network, 1, preferences);
    expect([...links.source].map((source, link) => [source, links.target[link], links.weight[link], links.preference[link]])).toEqual([[0, 2, 1, 9], [1, 2, 5, 5]]);
  });
});

describe('repulsion', () => {
  it('comes close to the sum over all pairs', () => {
    const size = 400;
    const random = createRandom(2);
    const x = Float64Array.from({ length: size }, () => 100 * random.unit());
    const y = Float64Array.from({ length: size }, () => 100 * random.unit());
    const masses = Float64Array.from({ length: size }, () => 1 + random.below(5));
    const forceX = new Float64Array(size);
    const forceY = new Float64Array(size);
    new Repulsion(size, masses).compute(x, y, 10, 0.5, forceX, forceY);
    for (let point = 0; point < size; point += 1) {
      let [sumX, sumY, amount] = [0, 0, 0];
      for (let other = 0; other < size; other += 1) {
        if (other === point) continue;
        const square = (x[point] - x[other]) ** 2 + (y[point] - y[other]) ** 2;
        sumX += (10 * masses[point] * masses[other] * (x[point] - x[other])) / square;
        sumY += (10 * masses[point] * masses[other] * (y[point] - y[other])) / square;
        amount += (10 * masses[point] * masses[other]) / Math.sqrt(square);
      }
      expect(Math.hypot(forceX[point] - sumX, forceY[point] - sumY)).toBeLessThan(0.01 * amount);
    }
  });

  it('takes any number of points at one place', () => {
    const forces = [new Float64Array(50), new Float64Array(50)];
    new Repulsion(50, new Float64Array(50).fill(1)).compute(new Float64Array(50), new Float64Array(50), 1, 1, forces[0], forces[1]);
    expect(forces[0].every((force) => force === 0)).toBe(true);
  });
});

describe('overlap', () => {
  it('is opened to the clearance, even for points at one place', () => {
    const x = Float64Array.of(0, 0, 0.1, 50);
    const y = Float64Array.of(0, 0, 0.1, 50);
    removeOverlap(x, y, 1, 50);
    for (let one = 0; one < 4; one += 1) for (let other = one + 1; other < 4; other += 1) expect(Math.hypot(x[one] - x[other], y[one] - y[other])).toBeGreaterThan(0.95);
    expect([x[3], y[3]]).toEqual([50, 50]);
  });
});

describe('packing', () => {
  it('keeps the parts of a map clear of each other', () => {
    const random = createRandom(5);
    const parts: LaidOutPart[] = Array.from({ length: 30 }, (_, number) => {
      const size = number === 0 ? 300 : 2 + (number % 9);
      return { nodes: Uint32Array.from({ length: size }, (_unused, node) => node), x: Float64Array.from({ length: size }, () => 10 * Math.sqrt(size) * random.unit()), y: Float64Array.from({ length: size }, () => 10 * Math.sqrt(size) * random.unit()) };
    });
    packParts(parts);
    for (let one = 1; one < parts.length; one += 1) {
      for (let other = one + 1; other < parts.length; other += 1) {
        const apart = (a: Float64Array, b: Float64Array): boolean => Math.max(...a) < Math.min(...b) || Math.max(...b) < Math.min(...a);
        expect(apart(parts[one].x, parts[other].x) || apart(parts[one].y, parts[other].y)).toBe(true);
      }
      for (let node = 0; node < parts[0].x.length; node += 1) {
        for (let place = 0; place < parts[one].x.length; place += 1) expect(Math.hypot(parts[0].x[node] - parts[one].x[place], parts[0].y[node] - parts[one].y[place])).toBeGreaterThan(1);
      }
    }
  });
});

describe('layout', () => {
  const cliques = (count: number, size: number): { links: [number, number, number][]; cluster: Int32Array } => {
    const links: [number, number, number][] = [];
    for (let clique = 0; clique < count; clique += 1) {
      for (let one = 0; one < size; one += 1) for (let other = one + 1; other < size; other += 1) links.push([clique * size + one, clique * size + other, 1]);
      if (clique > 0) links.push([clique * size, (clique - 1) * size, 1]);
    }
    return { links, cluster: Int32Array.from({ length: count * size }, (_, work) => Math.floor(work / size)) };
  };

  it('draws every work with a link, and no other', () => {
    fc.assert(
      fc.property(weightedNetworks, (network) => {
        const { x, y } = layOutMap(network, new Int32Array(network.size), 1);
        for (let work = 0; work < network.size; work += 1) {
          const linked = network.offsets[work + 1] > network.offsets[work];
          expect([Number.isFinite(x[work]), Number.isFinite(y[work])]).toEqual([linked, linked]);
        }
      }),
      { numRuns: 40 },
    );
  });

  it('sets clusters apart, centres and scales the picture, and repeats for a seed', () => {
    const { links, cluster } = cliques(6, 40);
    const network = weightedOf(240, links);
    const { x, y } = layOutMap(network, cluster, 1);
    expect(layOutMap(network, cluster, 1)).toEqual({ x, y });
    const meanDistance = (wanted: boolean): number => {
      let [sum, pairs] = [0, 0];
      for (let one = 0; one < 240; one += 1) {
        for (let other = one + 1; other < 240; other += 1) {
          if ((cluster[one] === cluster[other]) !== wanted) continue;
          sum += Math.hypot(x[one] - x[other], y[one] - y[other]);
          pairs += 1;
        }
      }
      return sum / pairs;
    };
    expect(meanDistance(true) * 3).toBeLessThan(meanDistance(false));
    expect(Math.abs(x.reduce((sum, value) => sum + value, 0) / 240)).toBeLessThan(15);
    const radii = Array.from(x, (value, work) => Math.hypot(value, y[work])).sort((a, b) => a - b);
    expect(radii[Math.floor(0.9 * 239)]).toBeCloseTo(100, 0);
  });

  it('copes with hundreds of parts and with a star', () => {
    const pairs = weightedOf(1_000, Array.from({ length: 500 }, (_, pair) => [2 * pair, 2 * pair + 1, 1] as const));
    const star = weightedOf(600, Array.from({ length: 599 }, (_, leaf) => [0, leaf + 1, 1] as const));
    for (const network of [pairs, star]) {
      const { x, y } = layOutMap(network, new Int32Array(network.size), 1);
      expect(x.every(Number.isFinite) && y.every(Number.isFinite)).toBe(true);
      expect(new Set(Array.from(x, (value, work) => `${value.toFixed(3)} ${y[work].toFixed(3)}`)).size).toBe(network.size);
    }
  });
});
