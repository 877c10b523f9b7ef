import { createRandom, deriveSeed, type Random } from '@/lib/network/random';

/** Draws of the kinds that the demonstration needs, all from one seeded source. */
export class Chance {
  private readonly random: Random;

  constructor(seed: number, ...strand: number[]) {
    this.random = createRandom(deriveSeed(seed, ...strand));
  }

  /** Uniform in [0, 1). */
  unit(): number {
    return this.random.unit();
  }

  /** Whole number in 0 .. bound - 1. */
  below(bound: number): number {
    return this.random.below(bound);
  }

  /** Whole number from low to high, both included. */
  between(low: number, high: number): number {
    return low + this.random.below(high - low + 1);
  }

  happens(probability: number): boolean {
    return this.random.unit() < probability;
  }

  pick<Item>(items: readonly Item[]): Item {
    return items[this.random.below(items.length)];
  }

  /** Place in a list, with the early places likelier: density falls as place^(1/power - 1). */
  skewed(length: number, power: number): number {
    return Math.min(length - 1, Math.floor(length * this.random.unit() ** power));
  }

  /** Place in a list of weights; the weights need not sum to one. */
  weighted(weights: readonly number[]): number {
    let left = this.random.unit() * weights.reduce((sum, weight) => sum + weight, 0);
    for (let place = 0; place < weights.length; place += 1) {
      left -= weights[place];
      if (left < 0) return place;
    }
    return weights.length - 1;
  }

  /** Sum of twelve uniforms less six: near enough to a normal draw, and the same on every machine. */
  normal(): number {
    let sum = -6;
    for (let draw = 0; draw < 12; draw += 1) sum += this.random.unit();
    return sum;
  }

  /** Log-normal with the given mean; `spread` is the standard deviation of the logarithm. */
  logNormal(mean: number, spread: number): number {
    return mean * Math.exp(spread * this.normal() - (spread * spread) / 2);
  }

  /** A shuffled copy. */
  shuffled<Item>(items: readonly Item[]): Item[] {
    const copy = [...items];
    for (let last = copy.length - 1; last > 0; last -= 1) {
      const other = this.random.below(last + 1);
      [copy[last], copy[other]] = [copy[other], copy[last]];
    }
    return copy;
  }
}
