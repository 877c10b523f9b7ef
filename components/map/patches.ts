import { areaOf, contourLoops, roundLoop } from '@/components/map/contours';
import { extentOf, type Extent } from '@/components/map/extent';
import { type AnalysisMap } from '@/lib/api/types';

/** The cloth under a cluster. */
export interface Patch {
  cluster: number;
  /** Closed loops in the coordinates of the map; holes are loops of their own (even-odd rule). */
  loops: [number, number][][];
  /** Middle of the top edge of its largest loop (greatest y), where its label stands. */
  top: [number, number];
  bottom: [number, number];
}

const gridCells = 112;
/** At most so many patches; beyond them a map is a quilt of scraps. */
const mostPatches = 24;
const leastMembers = 3;
/** Share of a cluster's highest density that still counts as cloth: far members stay outside. */
const leastDensity = 0.1;
/** Loops smaller than this share of the cluster's largest one are scraps. */
const leastLoop = 0.06;

interface Grid {
  columns: number;
  rows: number;
  cell: number;
  left: number;
  low: number;
}

/** Wider than the map by the reach of the brush, so that cloth is never cut off straight. */
function gridOf({ x, y }: Extent, deviation: number): Grid {
  const cell = Math.max(x[1] - x[0], y[1] - y[0]) / gridCells;
  const margin = Math.ceil(deviation * 2.5);
  return { columns: Math.ceil((x[1] - x[0]) / cell) + 1 + 2 * margin, rows: Math.ceil((y[1] - y[0]) / cell) + 1 + 2 * margin, cell, left: x[0] - margin * cell, low: y[0] - margin * cell };
}

function blur(values: Float64Array, columns: number, rows: number, deviation: number): Float64Array {
  const reach = Math.ceil(deviation * 3);
  const kernel = Array.from({ length: 2 * reach + 1 }, (_, index) => Math.exp(-((index - reach) ** 2) / (2 * deviation * deviation)));
  const pass = (from: Float64Array, length: number, lines: number, step: number, stride: number) => {
    const to = new Float64Array(from.length);
    for (let line = 0; line < lines; line += 1) {
      for (let place = 0; place < length; place += 1) {
        const value = from[line * stride + place * step];
        if (value === 0) continue;
        for (let offset = Math.max(-reach, -place); offset <= Math.min(reach, length - 1 - place); offset += 1) to[line * stride + (place + offset) * step] += value * kernel[offset + reach];
      }
    }
    return to;
  };
  return pass(pass(values, columns, rows, 1, columns), rows, columns, columns, 1);
}

/** Density of each cluster's members over the grid, scaled so that its highest value is 1. */
function densities(map: Pick<AnalysisMap, 'x' | 'y' | 'cluster'>, clusters: readonly number[], grid: Grid, deviation: number): Float64Array[] {
  const { columns, rows } = grid;
  const place = new Map(clusters.map((cluster, index) => [cluster, index]));
  const fields = clusters.map(() => new Float64Array(columns * rows));
  for (let work = 0; work < map.x.length; work += 1) {
    const index = place.get(map.cluster[work]);
    if (index === undefined) continue;
    const column = Math.round((map.x[work] - grid.left) / grid.cell);
    const row = Math.round((map.y[work] - grid.low) / grid.cell);
    if (column >= 0 && row >= 0 && column < columns && row < rows) fields[index][row * columns + column] += 1;
  }
  return fields.map((field) => {
    const smooth = blur(field, columns, rows, deviation);
    const highest = smooth.reduce((most, value) => Math.max(most, value), 0);
    return highest > 0 ? smooth.map((value) => value / highest) : smooth;
  });
}

function patchOf(cluster: number, field: Float64Array, grid: Grid): Patch | null {
  const found = contourLoops(field, grid.columns, grid.rows, 0).map((loop) => ({ loop, area: Math.abs(areaOf(loop)) }));
  const largest = found.reduce((most, one) => (one.area > most.area ? one : most), { loop: [] as [number, number][], area: 0 });
  if (largest.area < 1) return null;
  const place = ([x, y]: [number, number]): [number, number] => [grid.left + x * grid.cell, grid.low + y * grid.cell];
  const loops = found.filter(({ area }) => area >= leastLoop * largest.area).map(({ loop }) => roundLoop(loop, 2).map(place));
  const body = roundLoop(largest.loop, 2).map(place);
  const middle = body.reduce((sum, [x]) => sum + x, 0) / body.length;
  const edge = (better: (a: number, b: number) => boolean): [number, number] => {
    const y = body.reduce((best, point) => (better(point[1], best) ? point[1] : best), body[0][1]);
    return [middle, y];
  };
  return { cluster, loops, top: edge((a, b) => a > b), bottom: edge((a, b) => a < b) };
}

/**
 * The patchwork under a map: every place belongs to the cluster that is densest there, each measured against its own densest place, and to
 * none where all are thin. Patches never overlap, and far members do not stretch them, as hulls would.
 * Deterministic; works are counted, not weighed.
 */
export function clusterPatches(map: Pick<AnalysisMap, 'x' | 'y' | 'cluster' | 'clusters'>): Patch[] {
  const members = new Map<number, number>();
  for (const cluster of map.cluster) if (cluster >= 0) members.set(cluster, (members.get(cluster) ?? 0) + 1);
  const clusters = [...members].filter(([, size]) => size >= leastMembers).map(([cluster]) => cluster).sort((a, b) => a - b).slice(0, mostPatches);
  if (clusters.length === 0) return [];
  // Few works need a wider brush, or each of them would lie on a patch of its own.
  const deviation = Math.min(8, Math.max(2.6, (gridCells * 0.75) / Math.sqrt(map.x.length)));
  const grid = gridOf(extentOf(map.x, map.y), deviation);
  const fields = densities(map, clusters, grid, deviation);
  return clusters.flatMap((cluster, index) => {
    const own = fields[index];
    // The seam between two patches: a little more than their line of equal density.
    const ahead = own.map((value, cell) => fields.reduce((least, other, place) => (place === index ? least : Math.min(least, value - 1.06 * other[cell] - 0.01)), value - leastDensity));
    return patchOf(cluster, ahead, grid) ?? [];
  });
}

/** The frame in which a map is first shown: its works but for far outliers, and all of its cloth. */
export function frameOf(map: Pick<AnalysisMap, 'x' | 'y'>, patches: readonly Patch[]): Extent {
  const frame = extentOf(map.x, map.y);
  for (const [x, y] of patches.flatMap((patch) => patch.loops.flat())) {
    frame.x = [Math.min(frame.x[0], x), Math.max(frame.x[1], x)];
    frame.y = [Math.min(frame.y[0], y), Math.max(frame.y[1], y)];
  }
  return frame;
}
