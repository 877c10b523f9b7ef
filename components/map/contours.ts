/**
 * Lines of equal value through a grid (marching squares).
 *
 * Each square of four neighbouring values is crossed by at most two straight pieces, placed by linear interpolation; pieces share their
 * ends exactly, so that they join to closed loops. The grid is taken to be below the level outside.
 * Source: Lorensen & Cline (1987), Marching cubes, Computer Graphics 21:163-169, doi 10.1145/37402.37422, in two dimensions.
 *
 * @param values row-major, columns x rows
 * @returns closed loops of [x, y] in grid units (0,0 is the first value), the first point not repeated
 */
export function contourLoops(values: Float64Array, columns: number, rows: number, level: number): [number, number][][] {
  const at = (x: number, y: number) => (x < 0 || y < 0 || x >= columns || y >= rows ? Math.min(level - 1e-6, 0) : values[y * columns + x]);
  const next = new Map<string, [number, number][]>();
  const keyOf = ([x, y]: [number, number]) => `${x.toFixed(6)},${y.toFixed(6)}`;
  const between = (low: number, high: number) => (level - low) / (high - low);
  for (let y = -1; y < rows; y += 1) {
    for (let x = -1; x < columns; x += 1) {
      const [a, b, c, d] = [at(x, y), at(x + 1, y), at(x + 1, y + 1), at(x, y + 1)];
      const inside = (a >= level ? 1 : 0) | (b >= level ? 2 : 0) | (c >= level ? 4 : 0) | (d >= level ? 8 : 0);
      if (inside === 0 || inside === 15) continue;
      const top = (): [number, number] => [x + between(a, b), y];
      const right = (): [number, number] => [x + 1, y + between(b, c)];
      const bottom = (): [number, number] => [x + between(d, c), y + 1];
      const left = (): [number, number] => [x, y + between(a, d)];
      // Pieces run with the inside on their right, so that each end meets one beginning.
      const pieces: Record<number, (() => [number, number])[][]> = {
        1: [[left, top]], 2: [[top, right]], 3: [[left, right]], 4: [[right, bottom]], 5: [[left, top], [right, bottom]], 6: [[top, bottom]], 7: [[left, bottom]],
        8: [[bottom, left]], 9: [[bottom, top]], 10: [[top, right], [bottom, left]], 11: [[bottom, right]], 12: [[right, left]], 13: [[right, top]], 14: [[top, left]],
      };
      for (const [from, to] of pieces[inside]) {
        const key = keyOf(from());
        next.set(key, [...(next.get(key) ?? []), to()]);
      }
    }
  }
  return joinPieces(next, keyOf);
}

function joinPieces(next: Map<string, [number, number][]>, keyOf: (point: [number, number]) => string): [number, number][][] {
  const loops: [number, number][][] = [];
  for (const start of next.keys()) {
    const loop: [number, number][] = [];
    let key = start;
    for (;;) {
      const ends = next.get(key);
      const end = ends?.pop();
      if (!end) break;
      if (ends?.length === 0) next.delete(key);
      loop.push(end);
      key = keyOf(end);
    }
    if (loop.length >= 3) loops.push(loop);
  }
  return loops;
}

/** Rounds the corners of a closed loop: each pass cuts them at a quarter (Chaikin 1974, doi 10.1016/0146-664X(74)90028-8). */
export function roundLoop(loop: [number, number][], passes: number): [number, number][] {
  let points = loop;
  for (let pass = 0; pass < passes; pass += 1) {
    points = points.flatMap(([x, y], index) => {
      const [nextX, nextY] = points[(index + 1) % points.length];
      return [[0.75 * x + 0.25 * nextX, 0.75 * y + 0.25 * nextY], [0.25 * x + 0.75 * nextX, 0.25 * y + 0.75 * nextY]] as [number, number][];
    });
  }
  return points;
}

/** Signed area of a closed loop. */
export function areaOf(loop: readonly [number, number][]): number {
  let twice = 0;
  for (const [index, [x, y]] of loop.entries()) {
    const [nextX, nextY] = loop[(index + 1) % loop.length];
    twice += x * nextY - nextX * y;
  }
  return twice / 2;
}
