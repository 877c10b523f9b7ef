import { type LevelNetwork } from '@/lib/network/level-network';
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
export function refineGroups(level: LevelNetwork, groups: Int32Array, count: number, resolution: number, random: Random): Int32Array {
  const { size, offsets, neighbours, weights, strengths, totalStrength } = level;
  const pull = resolution / totalStrength;
  const scale = neighbours.length / (totalStrength * randomness);
  const groupStrengths = new Float64Array(count);
  for (let node = 0; node < size; node += 1) groupStrengths[groups[node]] += strengths[node];
  const parts = new Int32Array(size);
  const partStrengths = strengths.slice();
  /** Weight between a part and the rest of its group. */
  const outward = new Float64Array(size);
  const alone = new Uint8Array(size).fill(1);
  const order = new Int32Array(size);
  for (let node = 0; node < size; node += 1) {
    parts[node] = node;
    order[node] = node;
    const group = groups[node];
    let sum = 0;
    for (let link = offsets[node], end = offsets[node + 1]; link < end; link += 1) if (groups[neighbours[link]] === group) sum += weights[link];
    outward[node] = sum;
  }
  shuffle(order, random);
  const sums = new Float64Array(size);
  const met = new Int32Array(size + 1);
  const gains = new Float64Array(size + 1);
  for (let turn = 0; turn < size; turn += 1) {
    const node = order[turn];
    const group = groups[node];
    const strength = strengths[node];
    const rest = groupStrengths[group];
    if (alone[node] === 0 || outward[node] === 0 || outward[node] < pull * strength * (rest - strength)) continue;
    let found = 0;
    for (let link = offsets[node], end = offsets[node + 1]; link < end; link += 1) {
      const neighbour = neighbours[link];
      if (groups[neighbour] !== group) continue;
      const part = parts[neighbour];
      if (sums[part] === 0) met[found++] = part;
      sums[part] += weights[link];
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

/** Index drawn with probability ~ exp(gain * scale); -1 for staying alone, a gain of 0. Gains are overwritten. */
function drawGain(gains: Float64Array, count: number, best: number, scale: number, random: Random): number {
  const stay = Math.exp(-best * scale);
  let total = stay;
  for (let place = 0; place < count; place += 1) {
    total += Math.exp((gains[place] - best) * scale);
    gains[place] = total;
  }
  const drawn = random.unit() * total;
  if (drawn < stay) return -1;
  let place = 0;
  while (place < count - 1 && gains[place] <= drawn) place += 1;
  return place;
}
