/**
 * Approximate repulsion between all pairs of points, after Barnes & Hut (1986), Nature 324:446, doi 10.1038/324446a0.
 *
 *   force on i = strength * sum over j of m_i m_j / d_ij, away from j
 *
 * Points are sorted along a Z-shaped curve, cells hold runs of that order, and one walk of the tree serves all points of a leaf:
 * a cell whose width is less than `openness` times its distance from the leaf acts through its centre of mass.
 * Cost O(n log n) a call. Typed arrays throughout; nothing is allocated after construction except when the tree outgrows its arrays.
 * Points at the very same place do not push each other. Coordinates must be finite.
 */
const leafSize = 12;
const levels = 15;

export class Repulsion {
  private readonly keys: Int32Array;
  private order: Int32Array;
  private spare: Int32Array;
  private readonly sortedX: Float64Array;
  private readonly sortedY: Float64Array;
  private readonly sortedMass: Float64Array;
  private readonly forceX: Float64Array;
  private readonly forceY: Float64Array;
  private readonly buckets = new Int32Array(1025);
  private readonly stack = new Int32Array(4 * (levels + 2));
  private cells = 0;
  private cellX: Float64Array;
  private cellY: Float64Array;
  private cellMass: Float64Array;
  private cellWidth: Float64Array;
  private cellStart: Int32Array;
  private cellEnd: Int32Array;
  /** Four children per cell, -1 for none; -2 in the first slot marks a leaf. */
  private children: Int32Array;
  private readonly leaves: Int32Array;
  private leafCount = 0;

  constructor(private readonly size: number, private readonly masses: Float64Array) {
    const cells = Math.max(64, size);
    this.keys = new Int32Array(size);
    this.order = new Int32Array(size);
    this.spare = new Int32Array(size);
    this.sortedX = new Float64Array(size);
    this.sortedY = new Float64Array(size);
    this.sortedMass = new Float64Array(size);
    this.forceX = new Float64Array(size);
    this.forceY = new Float64Array(size);
    this.cellX = new Float64Array(cells);
    this.cellY = new Float64Array(cells);
    this.cellMass = new Float64Array(cells);
    this.cellWidth = new Float64Array(cells);
    this.cellStart = new Int32Array(cells);
    this.cellEnd = new Int32Array(cells);
    this.children = new Int32Array(4 * cells);
    this.leaves = new Int32Array(size + 1);
  }

  /** Writes the force on each point to `forceX` and `forceY`. */
  compute(x: Float64Array, y: Float64Array, strength: number, openness: number, forceX: Float64Array, forceY: Float64Array): void {
    this.plant(x, y);
    this.forceX.fill(0);
    this.forceY.fill(0);
    for (let leaf = 0; leaf < this.leafCount; leaf += 1) this.pushLeaf(this.leaves[leaf], strength, 1 / (openness * openness));
    for (let place = 0; place < this.size; place += 1) {
      forceX[this.order[place]] = this.forceX[place];
      forceY[this.order[place]] = this.forceY[place];
    }
  }

  private plant(x: Float64Array, y: Float64Array): void {
    let left = Infinity;
    let right = -Infinity;
    let top = Infinity;
    let bottom = -Infinity;
    for (let point = 0; point < this.size; point += 1) {
      left = Math.min(left, x[point]);
      right = Math.max(right, x[point]);
      top = Math.min(top, y[point]);
      bottom = Math.max(bottom, y[point]);
    }
    const width = Math.max(right - left, bottom - top) * 1.0001 + 1e-9;
    const scale = 32768 / width;
    for (let point = 0; point < this.size; point += 1) this.keys[point] = spread(((x[point] - left) * scale) | 0) | (spread(((y[point] - top) * scale) | 0) << 1);
    this.sortByKey();
    for (let place = 0; place < this.size; place += 1) {
      const point = this.order[place];
      this.sortedX[place] = x[point];
      this.sortedY[place] = y[point];
      this.sortedMass[place] = this.masses[point];
    }
    this.cells = 0;
    this.leafCount = 0;
    if (this.size > 0) this.buildCell(0, this.size, 2 * (levels - 1), width);
  }

  /** Radix sort in three passes of ten bits: stable, so equal keys keep the order of the points. */
  private sortByKey(): void {
    const { size, keys, buckets } = this;
    for (let point = 0; point < size; point += 1) this.order[point] = point;
    for (let shift = 0; shift < 30; shift += 10) {
      buckets.fill(0);
      for (let point = 0; point < size; point += 1) buckets[((keys[point] >>> shift) & 1023) + 1] += 1;
      for (let bucket = 0; bucket < 1024; bucket += 1) buckets[bucket + 1] += buckets[bucket];
      for (let place = 0; place < size; place += 1) {
        const point = this.order[place];
        this.spare[buckets[(keys[point] >>> shift) & 1023]++] = point;
      }
      [this.order, this.spare] = [this.spare, this.order];
    }
  }

  private buildCell(start: number, end: number, shift: number, width: number): number {
    if (this.cells === this.cellX.length) this.grow();
    const cell = this.cells++;
    this.cellStart[cell] = start;
    this.cellEnd[cell] = end;
    this.cellWidth[cell] = width;
    this.children.fill(-1, 4 * cell, 4 * cell + 4);
    let mass = 0;
    let sumX = 0;
    let sumY = 0;
    if (end - start <= leafSize || shift < 0) {
      for (let place = start; place < end; place += 1) {
        mass += this.sortedMass[place];
        sumX += this.sortedMass[place] * this.sortedX[place];
        sumY += this.sortedMass[place] * this.sortedY[place];
      }
      this.children[4 * cell] = -2;
      this.leaves[this.leafCount++] = cell;
    } else {
      let from = start;
      for (let quarter = 0; quarter < 4; quarter += 1) {
        const to = this.endOfQuarter(from, end, shift, quarter);
        if (to === from) continue;
        const child = this.buildCell(from, to, shift - 2, width / 2);
        this.children[4 * cell + quarter] = child;
        mass += this.cellMass[child];
        sumX += this.cellMass[child] * this.cellX[child];
        sumY += this.cellMass[child] * this.cellY[child];
        from = to;
      }
    }
    this.cellMass[cell] = mass;
    this.cellX[cell] = sumX / mass;
    this.cellY[cell] = sumY / mass;
    return cell;
  }

  private endOfQuarter(from: number, end: number, shift: number, quarter: number): number {
    let low = from;
    let high = end;
    while (low < high) {
      const middle = (low + high) >>> 1;
      if (((this.keys[this.order[middle]] >>> shift) & 3) <= quarter) low = middle + 1;
      else high = middle;
    }
    return low;
  }

  private pushLeaf(leaf: number, strength: number, perOpenness: number): void {
    const { cellX, cellY, cellMass, cellWidth, children, sortedX, sortedY, sortedMass, forceX, forceY, stack } = this;
    const start = this.cellStart[leaf];
    const end = this.cellEnd[leaf];
    let middleX = 0;
    let middleY = 0;
    for (let place = start; place < end; place += 1) {
      middleX += sortedX[place];
      middleY += sortedY[place];
    }
    middleX /= end - start;
    middleY /= end - start;
    let radius = 0;
    for (let place = start; place < end; place += 1) radius = Math.max(radius, (sortedX[place] - middleX) ** 2 + (sortedY[place] - middleY) ** 2);
    radius = Math.sqrt(radius);
    let top = 0;
    stack[top++] = 0;
    while (top > 0) {
      const cell = stack[--top];
      const centreX = cellX[cell];
      const centreY = cellY[cell];
      const distance = Math.sqrt((centreX - middleX) ** 2 + (centreY - middleY) ** 2) - radius;
      if (distance > 0 && cellWidth[cell] * cellWidth[cell] * perOpenness < distance * distance) {
        const push = cellMass[cell] * strength;
        for (let place = start; place < end; place += 1) {
          const byX = sortedX[place] - centreX;
          const byY = sortedY[place] - centreY;
          const force = (push * sortedMass[place]) / (byX * byX + byY * byY);
          forceX[place] += byX * force;
          forceY[place] += byY * force;
        }
      } else if (children[4 * cell] === -2) this.pushPairs(start, end, cell, strength);
      else for (let quarter = 0; quarter < 4; quarter += 1) if (children[4 * cell + quarter] >= 0) stack[top++] = children[4 * cell + quarter];
    }
  }

  private pushPairs(start: number, end: number, cell: number, strength: number): void {
    const { sortedX, sortedY, sortedMass, forceX, forceY } = this;
    const otherStart = this.cellStart[cell];
    const otherEnd = this.cellEnd[cell];
    for (let place = start; place < end; place += 1) {
      const x = sortedX[place];
      const y = sortedY[place];
      const push = sortedMass[place] * strength;
      let sumX = 0;
      let sumY = 0;
      for (let other = otherStart; other < otherEnd; other += 1) {
        const byX = x - sortedX[other];
        const byY = y - sortedY[other];
        const square = byX * byX + byY * byY;
        if (square > 0) {
          const force = (push * sortedMass[other]) / square;
          sumX += byX * force;
          sumY += byY * force;
        }
      }
      forceX[place] += sumX;
      forceY[place] += sumY;
    }
  }

  private grow(): void {
    const capacity = 2 * this.cellX.length;
    const larger = (array: Float64Array): Float64Array => {
      const copy = new Float64Array(capacity);
      copy.set(array);
      return copy;
    };
    const largerIndex = (array: Int32Array, length: number): Int32Array => {
      const copy = new Int32Array(length);
      copy.set(array);
      return copy;
    };
    this.cellX = larger(this.cellX);
    this.cellY = larger(this.cellY);
    this.cellMass = larger(this.cellMass);
    this.cellWidth = larger(this.cellWidth);
    this.cellStart = largerIndex(this.cellStart, capacity);
    this.cellEnd = largerIndex(this.cellEnd, capacity);
    this.children = largerIndex(this.children, 4 * capacity);
  }
}

/** Puts a zero bit between each two of the lowest 15 bits. */
function spread(value: number): number {
  let bits = (value | (value << 8)) & 0x00ff00ff;
  bits = (bits | (bits << 4)) & 0x0f0f0f0f;
  bits = (bits | (bits << 2)) & 0x33333333;
  return (bits | (bits << 1)) & 0x55555555;
}
