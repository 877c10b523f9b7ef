/**
 * Pushes points apart that stand closer than `clearance`, each pair by halves, a few rounds over a grid of cells of that width.
 * Modest on purpose: it opens knots without changing the picture. Cost O(n) a round for an even spread. Deterministic; points at the very same
 * place part along a direction taken from their numbers. `x` and `y` are moved in place.
 */
export function removeOverlap(x: Float64Array, y: Float64Array, clearance: number, rounds = 8): void {
  const size = x.length;
  if (!(clearance > 0) || size < 2) return;
  for (let round = 0; round < rounds; round += 1) {
    const grid = new PointGrid(x, y, clearance);
    let moved = false;
    for (let point = 0; point < size; point += 1) {
      grid.visitNear(point, (other) => {
        if (other <= point) return;
        let byX = x[other] - x[point];
        let byY = y[other] - y[point];
        let apart = Math.sqrt(byX * byX + byY * byY);
        if (apart >= clearance) return;
        if (apart < 1e-9 * clearance) {
          const angle = ((point * 7 + other * 13) % 64) * (Math.PI / 32);
          byX = Math.cos(angle);
          byY = Math.sin(angle);
          apart = 1;
        }
        const push = (clearance - Math.min(apart, clearance)) / 2 / apart;
        x[point] -= byX * push;
        y[point] -= byY * push;
        x[other] += byX * push;
        y[other] += byY * push;
        moved = true;
      });
    }
    if (!moved) return;
  }
}

/** Points by the cell that they stood in when the grid was made. */
class PointGrid {
  private readonly columns: number;
  private readonly starts: Uint32Array;
  private readonly points: Uint32Array;
  private readonly cellOf: Uint32Array;

  constructor(x: Float64Array, y: Float64Array, width: number) {
    let left = Infinity;
    let right = -Infinity;
    let top = Infinity;
    let bottom = -Infinity;
    for (let point = 0; point < x.length; point += 1) {
      left = Math.min(left, x[point]);
      right = Math.max(right, x[point]);
      top = Math.min(top, y[point]);
      bottom = Math.max(bottom, y[point]);
    }
    // Wider cells for a thin spread: the grid must not outgrow the points by far.
    const cell = Math.max(width, Math.sqrt(((right - left) * (bottom - top)) / (4 * x.length)), (right - left) / 4096, (bottom - top) / 4096);
    this.columns = Math.floor((right - left) / cell) + 3;
    const rows = Math.floor((bottom - top) / cell) + 3;
    this.starts = new Uint32Array(this.columns * rows + 1);
    this.cellOf = new Uint32Array(x.length);
    for (let point = 0; point < x.length; point += 1) {
      // A margin of one cell all round saves the checks at the edges.
      this.cellOf[point] = (Math.floor((y[point] - top) / cell) + 1) * this.columns + Math.floor((x[point] - left) / cell) + 1;
      this.starts[this.cellOf[point] + 1] += 1;
    }
    for (let place = 1; place < this.starts.length; place += 1) this.starts[place] += this.starts[place - 1];
    this.points = new Uint32Array(x.length);
    const next = this.starts.slice();
    for (let point = 0; point < x.length; point += 1) this.points[next[this.cellOf[point]]++] = point;
  }

  visitNear(point: number, visit: (other: number) => void): void {
    for (let row = -1; row <= 1; row += 1) {
      const middle = this.cellOf[point] + row * this.columns;
      for (let place = this.starts[middle - 1]; place < this.starts[middle + 2]; place += 1) visit(this.points[place]);
    }
  }
}
