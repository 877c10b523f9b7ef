/**
 * Seeded random numbers: the only source of chance in the pure libraries.
 *
 * Generator: sfc32 ("small fast counting", 128 bits of state, 32 bits a step) of Chris Doty-Humphrey's PractRand collection;
 * it has no DOI. State: (seed, 0x9e3779b9, 0x243f6a88, counter 1), the first 20 outputs are thrown away so that neighbouring
 * seeds part. Only 32-bit integer arithmetic, so the same seed gives the same sequence on every machine.
 * Cost: O(1) a number. Period: at least 2^32, about 2^127 on average. Not for secrets.
 */
export interface Random {
  /** Next 32-bit unsigned integer. */
  next(): number;
  /** Uniform in [0, 1), in steps of 2^-32. */
  unit(): number;
  /** Uniform whole number in 0 .. bound - 1, for 1 <= bound <= 2^32; bias below bound / 2^32. */
  below(bound: number): number;
}

export function createRandom(seed: number): Random {
  let a = seed >>> 0;
  let b = 0x9e3779b9;
  let c = 0x243f6a88;
  let counter = 1;
  const next = (): number => {
    const sum = (a + b + counter) | 0;
    counter = (counter + 1) | 0;
    a = b ^ (b >>> 9);
    b = (c + (c << 3)) | 0;
    c = (c << 21) | (c >>> 11);
    c = (c + sum) | 0;
    return sum >>> 0;
  };
  for (let warmUp = 0; warmUp < 20; warmUp += 1) next();
  const unit = (): number => next() / 4294967296;
  return { next, unit, below: (bound) => Math.floor(unit() * bound) };
}

/**
 * A seed for one strand of a computation (one basis, one repeat, ...), so that strands stay independent of each other's length.
 * The 32-bit finaliser of MurmurHash3 (Austin Appleby, public domain) over the seed and then each number of the strand.
 */
export function deriveSeed(seed: number, ...strand: number[]): number {
  let hash = finalise(seed ^ 0x9e3779b9);
  // The multiplication between the rounds keeps (1, 2) and (2, 1) apart.
  for (const part of strand) hash = finalise((Math.imul(hash, 0x01000193) + part + 1) | 0);
  return hash >>> 0;
}

function finalise(value: number): number {
  let hash = value;
  hash = Math.imul(hash ^ (hash >>> 16), 0x85ebca6b);
  hash = Math.imul(hash ^ (hash >>> 13), 0xc2b2ae35);
  return hash ^ (hash >>> 16);
}

/** Fisher-Yates shuffle in place. */
export function shuffle(items: Int32Array | Uint32Array, random: Random): void {
  for (let last = items.length - 1; last > 0; last -= 1) {
    const other = random.below(last + 1);
    const kept = items[last];
    items[last] = items[other];
    items[other] = kept;
  }
}
