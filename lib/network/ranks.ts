/**
 * Competition ranks: 1 + the number of items that are strictly better; 9, 7, 7, 5, 5, 5, 1 gives 1, 2, 2, 4, 4, 4, 7.
 * Items are tied when they lie within 1e-9, relative to the larger amount, of the best item of their group; that keeps rounding
 * from deciding between equals. Higher is better. Cost O(n log n). Empty gives empty. Values must be finite: NaN has no rank and throws.
 */
const relativeTie = 1e-9;

export class Ranker {
  private readonly sorted: Float64Array;
  private readonly rankAt: Uint32Array;

  /** Keeps scratch space for `size` items, so that ranking hundreds of replicates allocates nothing. */
  constructor(private readonly size: number) {
    this.sorted = new Float64Array(size);
    this.rankAt = new Uint32Array(size);
  }

  /** Writes the rank of each value to `ranks[at ..]`. */
  rank(values: Float64Array, ranks: Uint32Array, at = 0): void {
    const { size, sorted, rankAt } = this;
    sorted.set(values);
    sorted.sort();
    // Typed arrays sort NaN to the end.
    if (size > 0 && Number.isNaN(sorted[size - 1])) throw new RangeError('A value that is not a number has no rank.');
    let best = Infinity;
    let rank = 0;
    for (let place = size - 1; place >= 0; place -= 1) {
      const value = sorted[place];
      if (place === size - 1 || best - value > relativeTie * Math.max(Math.abs(best), Math.abs(value))) {
        best = value;
        rank = size - place;
      }
      rankAt[place] = rank;
    }
    for (let item = 0; item < size; item += 1) ranks[at + item] = rankAt[this.placeOf(values[item])];
  }

  private placeOf(value: number): number {
    let low = 0;
    let high = this.size - 1;
    while (low < high) {
      const middle = (low + high) >>> 1;
      if (this.sorted[middle] < value) low = middle + 1;
      else high = middle;
    }
    return low;
  }
}

export function rankDescending(values: ArrayLike<number>): Uint32Array {
  const ranks = new Uint32Array(values.length);
  new Ranker(values.length).rank(Float64Array.from(values), ranks);
  return ranks;
}
