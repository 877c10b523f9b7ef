import { describe, expect, it } from 'vitest';

import { areaOf, contourLoops, roundLoop } from '@/components/map/contours';
import { extentOf } from '@/components/map/extent';
import { clusterPatches, frameOf } from '@/components/map/patches';

/** Whether a point lies within loops, by the even-odd rule. */
function inside(loops: readonly (readonly [number, number][])[], x: number, y: number): boolean {
  let crossings = 0;
  for (const loop of loops) {
    for (const [index, [ax, ay]] of loop.entries()) {
      const [bx, by] = loop[(index + 1) % loop.length];
      if (ay > y !== by > y && x < ax + ((y - ay) / (by - ay)) * (bx - ax)) crossings += 1;
    }
  }
  return crossings % 2 === 1;
}

/** A disc of works on a sunflower spiral. */
function disc(centreX: number, centreY: number, radius: number, works: number): { x: number[]; y: number[] } {
  const points = Array.from({ length: works }, (_, index) => [radius * Math.sqrt((index + 0.5) / works), index * 2.399963] as const);
  return { x: points.map(([distance, angle]) => centreX + distance * Math.cos(angle)), y: points.map(([distance, angle]) => centreY + distance * Math.sin(angle)) };
}

function mapOf(parts: { x: number[]; y: number[]; cluster: number }[]) {
  return {
    x: parts.flatMap((part) => part.x),
    y: parts.flatMap((part) => part.y),
    cluster: parts.flatMap((part) => part.x.map(() => part.cluster)),
    clusters: [...new Set(parts.map((part) => part.cluster))].filter((number) => number >= 0).map((number) => ({ number, letter: String.fromCharCode(65 + number), name: '', size: 0, firmness: 1 })),
  };
}

describe('contour loops', () => {
  it('close around a hill, with the area that interpolation gives', () => {
    // One value of 1 in a 3 x 3 grid of 0: the line at 0.5 is a square on its corner, half a step from the middle.
    const loops = contourLoops(Float64Array.from([0, 0, 0, 0, 1, 0, 0, 0, 0]), 3, 3, 0.5);
    expect(loops).toHaveLength(1);
    expect(loops[0]).toHaveLength(4);
    expect(Math.abs(areaOf(loops[0]))).toBeCloseTo(0.5, 12);
  });

  it('close where the hill reaches the edge of the grid, and keep holes apart', () => {
    expect(contourLoops(Float64Array.from([1, 1, 1, 1]), 2, 2, 0.5)).toHaveLength(1);
    const ring = Float64Array.from({ length: 25 }, (_, index) => (index === 12 ? 0 : 1));
    const loops = contourLoops(ring, 5, 5, 0.5);
    expect(loops).toHaveLength(2);
    // Loops run one way around land and the other way around holes.
    expect(Math.sign(areaOf(loops[0]))).toBe(-Math.sign(areaOf(loops[1])));
  });

  it('part two hills that touch at a corner', () => {
    expect(contourLoops(Float64Array.from([1, 0, 0, 1]), 2, 2, 0.6).length).toBe(2);
  });

  it('are rounded without leaving their outline', () => {
    const square: [number, number][] = [[0, 0], [4, 0], [4, 4], [0, 4]];
    const round = roundLoop(square, 2);
    expect(round).toHaveLength(16);
    expect(round.every(([x, y]) => x >= 0 && x <= 4 && y >= 0 && y <= 4)).toBe(true);
    expect(Math.abs(areaOf(round))).toBeLessThan(16);
  });
});

describe('the frame of a map', () => {
  it('is not blown up by a far outlier', () => {
    const { x, y } = disc(0, 0, 10, 400);
    const extent = extentOf([...x, 5_000], [...y, 5_000]);
    expect(extent.x[1]).toBeLessThan(15);
    expect(extentOf([], [])).toEqual({ x: [-1, 1], y: [-1, 1] });
    expect(extentOf([3, 3], [4, 4]).x[0]).toBeLessThan(3);
  });
});

describe('patches', () => {
  const parted = mapOf([{ ...disc(0, 0, 10, 120), cluster: 0 }, { ...disc(40, 5, 8, 60), cluster: 1 }]);

  it('hold nearly all members of their cluster and none of another', () => {
    const patches = clusterPatches(parted);
    expect(patches.map((patch) => patch.cluster)).toEqual([0, 1]);
    for (const patch of patches) {
      const held = parted.x.map((x, work) => inside(patch.loops, x, parted.y[work]));
      const own = parted.cluster.map((cluster) => cluster === patch.cluster);
      expect(held.filter((one, work) => one && own[work]).length / own.filter(Boolean).length).toBeGreaterThan(0.95);
      expect(held.filter((one, work) => one && !own[work])).toHaveLength(0);
    }
  });

  it('never overlap, even where clusters lie in one another', () => {
    const mixed = mapOf([{ ...disc(0, 0, 10, 150), cluster: 0 }, { ...disc(7, 0, 10, 150), cluster: 1 }]);
    const [one, other] = clusterPatches(mixed);
    for (let x = -12; x <= 20; x += 0.5) for (let y = -12; y <= 12; y += 0.5) expect(inside(one.loops, x, y) && inside(other.loops, x, y)).toBe(false);
  });

  it('are not stretched by a far member', () => {
    const { x, y } = disc(0, 0, 10, 200);
    const far = mapOf([{ x: [...x, 60], y: [...y, 60], cluster: 0 }, { ...disc(70, 0, 8, 100), cluster: 1 }]);
    const [patch] = clusterPatches(far);
    expect(inside(patch.loops, 60, 60)).toBe(false);
    expect(Math.max(...patch.loops.flat().map(([px]) => px))).toBeLessThan(25);
  });

  it('stand on at least three members, leave works without a cluster bare, and are the same every time', () => {
    const scraps = mapOf([{ ...disc(0, 0, 5, 30), cluster: 0 }, { x: [30, 31], y: [0, 0], cluster: 1 }, { x: [50, 51, 52], y: [0, 1, 0], cluster: -1 }]);
    expect(clusterPatches(scraps).map((patch) => patch.cluster)).toEqual([0]);
    expect(clusterPatches(mapOf([]))).toEqual([]);
    expect(clusterPatches(parted)).toEqual(clusterPatches(parted));
  });

  it('lie within the frame of the map, also where they are few', () => {
    const few = mapOf([{ x: [0, 1, 0.4], y: [0, 0.2, 1], cluster: 0 }]);
    const patches = clusterPatches(few);
    const frame = frameOf(few, patches);
    for (const [x, y] of patches.flatMap((patch) => patch.loops.flat())) expect(x >= frame.x[0] && x <= frame.x[1] && y >= frame.y[0] && y <= frame.y[1]).toBe(true);
    expect(patches).toHaveLength(1);
  });

  it('know their top and bottom for labels', () => {
    const [patch] = clusterPatches(parted);
    expect(patch.top[1]).toBeGreaterThan(8);
    expect(patch.bottom[1]).toBeLessThan(-8);
    expect(Math.abs(patch.top[0])).toBeLessThan(2);
  });
});
