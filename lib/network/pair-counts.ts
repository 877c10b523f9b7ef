import { type Rows } from '@/lib/network/compressed-rows';

/**
 * Counts, for every pair of items, the groups that hold both: the kernel of co-citation (groups: citing works, items: cited works)
 * and of bibliographic coupling (groups: cited references, items: citing works).
 *
 *   c_ij = number of groups with i and j,   i < j.
 *
 * Item by item, the other members of its groups are counted into one array of counters; groups are ascending, so a cursor per group
 * gives the members greater than the item at once. No dense matrix: memory is that of the pairs kept plus O(items + groups).
 * Cost O(sum over groups of size * (size - 1) / 2).
 * Assumes rows ascending and without duplicates (as `compressed-rows.ts` makes them). Items in no group, and groups of one, give no pair.
 */
export interface PairCounts {
  /** Number of items. */
  size: number;
  /** Pairs kept: row i holds partners greater than i, in the order in which they were met, which depends on the rows alone. */
  offsets: Uint32Array;
  partners: Uint32Array;
  counts: Uint32Array;
  /** Groups that hold the item: N_i. */
  occurrences: Uint32Array;
  /** Sum of c_ij over all j, before any pair is left out: s_i. */
  strengths: Float64Array;
  /** Distinct pairs before any was left out. */
  pairsMet: number;
}

export interface PairRule {
  /** Pairs with at least this count are kept. */
  minimumCount: number;
  /** Pairs with a smaller count are kept too if both items occur at least this often; Infinity for none. */
  minimumOccurrences: number;
}

/** METHODS: association strength explodes for rare items, so a pair needs two common groups, or two items that are not rare. */
export const defaultPairRule: PairRule = { minimumCount: 2, minimumOccurrences: 5 };
export const everyPair: PairRule = { minimumCount: 1, minimumOccurrences: Infinity };

export function countPairs(groups: Rows, items: Rows, rule: PairRule): PairCounts {
  const size = items.offsets.length - 1;
  const occurrences = new Uint32Array(size);
  const strengths = new Float64Array(size);
  for (let item = 0; item < size; item += 1) {
    occurrences[item] = items.offsets[item + 1] - items.offsets[item];
    let strength = 0;
    for (let place = items.offsets[item]; place < items.offsets[item + 1]; place += 1) {
      const group = items.members[place];
      strength += groups.offsets[group + 1] - groups.offsets[group] - 1;
    }
    strengths[item] = strength;
  }
  const sink = new PairSink(size);
  const counters = new Uint32Array(size);
  const met = new Uint32Array(size + 1);
  const cursors = groups.offsets.slice();
  let pairsMet = 0;
  for (let item = 0; item < size; item += 1) {
    const found = countPartners(item, groups, items, cursors, counters, met);
    pairsMet += found;
    sink.keep(item, found, met, counters, occurrences, rule);
  }
  return { size, offsets: sink.offsets, ...sink.pairs(), occurrences, strengths, pairsMet };
}

function countPartners(item: number, groups: Rows, items: Rows, cursors: Uint32Array, counters: Uint32Array, met: Uint32Array): number {
  const { offsets, members } = groups;
  let found = 0;
  for (let place = items.offsets[item], last = items.offsets[item + 1]; place < last; place += 1) {
    const group = items.members[place];
    // Items come in ascending order and so do the members of a group: the cursor stands at this very item.
    const start = (cursors[group] += 1);
    for (let member = start, end = offsets[group + 1]; member < end; member += 1) {
      const partner = members[member];
      const count = counters[partner];
      met[found] = partner;
      // Branch-free: the list grows by one only when the counter was 0.
      found += (count - 1) >>> 31;
      counters[partner] = count + 1;
    }
  }
  return found;
}

/** Grows as pairs come in; a first guess and doubling keep the copies few. */
class PairSink {
  readonly offsets: Uint32Array;
  private partners: Uint32Array;
  private counts: Uint32Array;
  private length = 0;

  constructor(size: number) {
    this.offsets = new Uint32Array(size + 1);
    this.partners = new Uint32Array(Math.max(1024, size * 64));
    this.counts = new Uint32Array(this.partners.length);
  }

  /** Stores the pairs of `item` that the rule keeps and sets the counters that were met back to 0. */
  keep(item: number, found: number, met: Uint32Array, counters: Uint32Array, occurrences: Uint32Array, rule: PairRule): void {
    this.reserve(found);
    const { partners, counts } = this;
    const common = occurrences[item] >= rule.minimumOccurrences;
    let length = this.length;
    for (let place = 0; place < found; place += 1) {
      const partner = met[place];
      const count = counters[partner];
      counters[partner] = 0;
      if (count >= rule.minimumCount || (common && occurrences[partner] >= rule.minimumOccurrences)) {
        partners[length] = partner;
        counts[length] = count;
        length += 1;
      }
    }
    this.length = length;
    this.offsets[item + 1] = length;
  }

  pairs(): { partners: Uint32Array; counts: Uint32Array } {
    return { partners: this.partners.subarray(0, this.length), counts: this.counts.subarray(0, this.length) };
  }

  private reserve(extra: number): void {
    const needed = this.length + extra;
    if (needed <= this.partners.length) return;
    const capacity = Math.max(needed, 2 * this.partners.length);
    this.partners = grown(this.partners, capacity);
    this.counts = grown(this.counts, capacity);
  }
}

function grown(array: Uint32Array, capacity: number): Uint32Array {
  const larger = new Uint32Array(capacity);
  larger.set(array);
  return larger;
}
