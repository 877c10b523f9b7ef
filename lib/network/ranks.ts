/**
 * Competition ranks: 1 + the number of items that are strictly better; 9, 7, 7, 5, 5, 5, 1 gives 1, 2, 2, 4, 4, 4, 7.
 * Items are tied when they lie within 1e-9, relative to the larger amount, of the best item of their group; that keeps rounding
 * from deciding between equals. Higher is better. Empty gives empty. NaN and infinities have no rank and throw a RangeError.
 * Sorts by radix over the bits of the numbers, 11 at a time, leaving out digits that all share: O(n), which hundreds of replicates need.
 * Reads the halves of a number as on little-endian machines, which are all that Node runs on but one.
 */
const relativeTie = 1e-9;
const digitBits = 11;
const digitSize = 1 << digitBits;
const digits = 6;

export class Ranker {
  private readonly reals: Float64Array;
  private readonly words: Uint32Array;
  private readonly counts = new Uint32Array(digits * digitSize);
  private order: Uint32Array;
  private spare: Uint32Array;

  /** Keeps scratch space for `size` items, so that ranking hundreds of replicates allocates nothing. */
  constructor(private readonly size: number) {
    this.reals = new Float64Array(size);
    this.words = new Uint32Array(this.reals.buffer);
    this.order = new Uint32Array(size);
    this.spare = new Uint32Array(size);
  }

  /** Writes the rank of each value to `ranks[at ..]`. */
  rank(values: ArrayLike<number>, ranks: Uint32Array, at = 0): void {
    const { size } = this;
    this.sort(values);
    let best = 0;
    let rank = 0;
    for (let place = size - 1; place >= 0; place -= 1) {
      const item = this.order[place];
      const value = values[item];
      if (place === size - 1 || best - value > relativeTie * Math.max(Math.abs(best), Math.abs(value))) {
        best = value;
        rank = size - place;
      }
      ranks[at + item] = rank;
    }
  }

  /** Leaves the items in `order`, ascending by value. */
  private sort(values: ArrayLike<number>): void {
    const { size, reals, counts } = this;
    counts.fill(0);
    for (let item = 0; item < size; item += 1) {
      const value = values[item];
      if (!Number.isFinite(value)) throw new RangeError(`A value of ${value} has no rank.`);
      // Adding 0 makes minus zero zero: they are equal, but their bits are not.
      reals[item] = value + 0;
    }
    this.makeSortable();
    for (let item = 0; item < size; item += 1) for (let digit = 0; digit < digits; digit += 1) counts[digit * digitSize + this.digitOf(item, digit)] += 1;
    for (let item = 0; item < size; item += 1) this.order[item] = item;
    for (let digit = 0; digit < digits; digit += 1) this.sortByDigit(digit);
  }

  /** Turns the bits of each number so that unsigned comparison orders them: negative numbers wholly, others in their sign. */
  private makeSortable(): void {
    const { words, size } = this;
    for (let item = 0; item < size; item += 1) {
      const high = words[2 * item + 1];
      const mask = high >>> 31 === 1 ? 0xffffffff : 0;
      words[2 * item] ^= mask;
      words[2 * item + 1] = high ^ (mask | 0x80000000);
    }
  }

  private digitOf(item: number, digit: number): number {
    const shift = digit * digitBits;
    const low = this.words[2 * item];
    const high = this.words[2 * item + 1];
    // The third digit spans both words.
    if (shift + digitBits <= 32) return (low >>> shift) & (digitSize - 1);
    if (shift < 32) return ((low >>> shift) | (high << (32 - shift))) & (digitSize - 1);
    return (high >>> (shift - 32)) & (digitSize - 1);
  }

  private sortByDigit(digit: number): void {
    const { counts, size } = this;
    const base = digit * digitSize;
    let start = 0;
    for (let value = base; value < base + digitSize; value += 1) {
      const count = counts[value];
      if (count === size) return;
      counts[value] = start;
      start += count;
    }
    for (let place = 0; place < size; place += 1) {
      const item = this.order[place];
      this.spare[counts[base + this.digitOf(item, digit)]++] = item;
    }
    [this.order, this.spare] = [this.spare, this.order];
  }
}

export function rankDescending(values: ArrayLike<number>): Uint32Array {
  const ranks = new Uint32Array(values.length);
  new Ranker(values.length).rank(values, ranks);
  return ranks;
}
