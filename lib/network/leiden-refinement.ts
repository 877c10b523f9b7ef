import { type LevelNetwork, type Scratch } from '@/lib/network/level-network';
import { shuffle, type Random } from '@/lib/network/random';

/** Randomness of a merge. Small: nearly always the best of the merges that gain. */
const randomness = 0.01;

/**
 * Refinement of the Leiden method: inside each group, starting from nodes on their own, a lone node may join a part T of its group C
 * if both it and T are well connected to the rest of C:
 *   w(T, C - T) >= resolution * K_T (K_C - K_T) / 2M
 * Among the joins that do not lose, one is drawn with probability proportional to exp(gain / 0.01), staying alone being a gain of 0.
 * Gains are counted in mean link weights, so that scaling all weights changes nothing; for unweighted networks that is the authors' own scale.
 * A node joins only where it has a link, so every part is connected. Source: Traag, Waltman & Van Eck (2019), doi 10.1038/s41598-019-41695-z.
 * Cost O(links).
 *
 * @returns the part of each node, numbered by one of its nodes
 */
export function refineGroups(level: LevelNetwork, groups: Int32Array, count: number, resolution: number, random: Random, scratch: Scratch): Int32Array {
  const { size, offsets, neighbours, weights, strengths, totalStrength } = level;
  const pull = resolution / totalStrength;
  const scale = neighbours.length / (totalStrength * randomness);
  const groupStrengths = scratch.reals('refine.groupStrengths', count);
  for (let node = 0; node < size; node += 1) groupStrengths[groups[node]] += strengths[node];
  const parts = new Int32Array(size);
  const partStrengths = scratch.uncleared('refine.partStrengths', size);
  partStrengths.set(strengths);
  /** Weight between a part and the rest of its group. */
  const outward = scratch.uncleared('refine.outward', size);
  const alone = scratch.flags('refine.alone', size).fill(1);
  const order = scratch.unclearedWholes('refine.order', size);
  const inner = scratch.unclearedWholes('refine.inner', neighbours.length);
  const innerWeights = scratch.uncleared('refine.innerWeights', neighbours.length);
  const innerEnds = scratch.unclearedWholes('refine.innerEnds', size);
  for (let node = 0; node < size; node += 1) {
    parts[node] = node;
    order[node] = node;
    const group = groups[node];
    let sum = 0;
    let place = offsets[node];
    // Only links inside groups matter from here on: they are gathered once, without a branch to mispredict.
    for (let link = place, end = offsets[node + 1]; link < end; link += 1) {
      const neighbour = neighbours[link];
      const within = groups[neighbour] === group ? 1 : 0;
      inner[place] = neighbour;
      innerWeights[place] = weights[link];
      sum += within * weights[link];
      place += within;
    }
    innerEnds[node] = place;
    outward[node] = sum;
  }
  shuffle(order, random);
  const sums = scratch.reals('refine.sums', size);
  const met = scratch.unclearedWholes('refine.met', size + 1);
  const gains = scratch.uncleared('refine.gains', size + 1);
  for (let turn = 0; turn < size; turn += 1) {
    const node = order[turn];
    const group = groups[node];
    const strength = strengths[node];
    const rest = groupStrengths[group];
    if (alone[node] === 0 || outward[node] === 0 || outward[node] < pull * strength * (rest - strength)) continue;
    let found = 0;
    for (let link = offsets[node], end = innerEnds[node]; link < end; link += 1) {
      const part = parts[inner[link]];
      const sum = sums[part];
      met[found] = part;
      found += sum === 0 ? 1 : 0;
      sums[part] = sum + innerWeights[link];
    }
    let candidates = 0;
    let bestGain = 0;
    for (let place = 0; place < found; place += 1) {
      const part = met[place];
      const gain = sums[part] - pull * strength * partStrengths[part];
      if (gain < 0 || outward[part] < pull * partStrengths[part] * (rest - partStrengths[part])) {
        sums[part] = 0;
        continue;
      }
      met[candidates] = part;
      gains[candidates] = gain;
      candidates += 1;
      bestGain = Math.max(bestGain, gain);
    }
    const chosen = candidates === 0 ? -1 : drawGain(gains, candidates, bestGain, scale, random);
    if (chosen >= 0) {
      const part = met[chosen];
      parts[node] = part;
      partStrengths[part] += strength;
      outward[part] += outward[node] - 2 * sums[part];
      alone[node] = 0;
      alone[part] = 0;
    }
    for (let place = 0; place < candidates; place += 1) sums[met[place]] = 0;
  }
  return parts;
}

/** e^-40 of the whole is below the rounding of the sum. */
const negligible = -40;

/** Index drawn with probability ~ exp(gain * scale); -1 for staying alone, a gain of 0. Gains are overwritten. */
function drawGain(gains: Float64Array, count: number, best: number, scale: number, random: Random): number {
  const stay = Math.exp(-best * scale);
  let total = stay;
  for (let place = 0; place < count; place += 1) {
    const exponent = (gains[place] - best) * scale;
    if (exponent > negligible) total += Math.exp(exponent);
    gains[place] = total;
  }
  const drawn = random.unit() * total;
  if (drawn < stay) return -1;
  let place = 0;
  while (place < count - 1 && gains[place] <= drawn) place += 1;
  return place;
}
