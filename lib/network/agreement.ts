/**
 * How far two partitions of the same items agree, from the table n_ab of items in group a of the one and group b of the other.
 *   adjusted Rand index  (sum C(n_ab,2) - E) / ((sum C(n_a,2) + sum C(n_b,2)) / 2 - E),  E = sum C(n_a,2) * sum C(n_b,2) / C(n,2)
 *   normalised mutual information  2 I / (H(X) + H(Y)), arithmetic mean, natural logarithm
 *   variation of information  H(X) + H(Y) - 2 I, in nats, 0 .. ln n
 * Sources: Hubert & Arabie (1985), doi 10.1007/BF01908075; Danon et al. (2005), doi 10.1088/1742-5468/2005/09/P09008; Meila (2007), doi 10.1016/j.jmva.2006.11.013.
 * Cost O(items + groups). Group numbers are 0 or greater. Where a denominator is 0 (no items, both all in one, both all apart), index and NMI are 1.
 * NMI rises with the number of groups; the adjusted Rand index is corrected for chance and the one to rely on.
 */
export interface Agreement {
  adjustedRand: number;
  normalisedMutualInformation: number;
  variationOfInformation: number;
}

const choose2 = (count: number): number => (count * (count - 1)) / 2;
const entropyTerm = (count: number, total: number): number => (count === 0 ? 0 : -(count / total) * Math.log(count / total));

export function comparePartitions(one: Int32Array, other: Int32Array): Agreement {
  if (one.length !== other.length) throw new RangeError(`The partitions have ${one.length} and ${other.length} items.`);
  const total = one.length;
  let pairsTogether = 0;
  let jointEntropy = 0;
  visitTable(one, other, (count) => {
    pairsTogether += choose2(count);
    jointEntropy += entropyTerm(count, total);
  });
  const [pairsOne, entropyOne] = summarise(one);
  const [pairsOther, entropyOther] = summarise(other);
  const expected = total < 2 ? 0 : (pairsOne * pairsOther) / choose2(total);
  const spread = (pairsOne + pairsOther) / 2 - expected;
  const information = entropyOne + entropyOther - jointEntropy;
  const entropies = entropyOne + entropyOther;
  return {
    adjustedRand: spread === 0 ? 1 : (pairsTogether - expected) / spread,
    normalisedMutualInformation: entropies === 0 ? 1 : (2 * information) / entropies,
    variationOfInformation: Math.max(0, entropies - 2 * information),
  };
}

/** Calls `visit` with every count of the table that is not 0, groups of the first partition in turn. */
export function visitTable(one: Int32Array, other: Int32Array, visit: (count: number, groupOfOne: number, groupOfOther: number) => void): void {
  const groups = countGroups(one);
  const starts = new Uint32Array(groups + 1);
  for (let item = 0; item < one.length; item += 1) starts[one[item] + 1] += 1;
  for (let group = 0; group < groups; group += 1) starts[group + 1] += starts[group];
  const partners = new Int32Array(one.length);
  const next = starts.slice();
  for (let item = 0; item < one.length; item += 1) partners[next[one[item]]++] = other[item];
  const counters = new Uint32Array(countGroups(other));
  for (let group = 0; group < groups; group += 1) {
    for (let place = starts[group]; place < starts[group + 1]; place += 1) counters[partners[place]] += 1;
    for (let place = starts[group]; place < starts[group + 1]; place += 1) {
      const partner = partners[place];
      if (counters[partner] === 0) continue;
      visit(counters[partner], group, partner);
      counters[partner] = 0;
    }
  }
}

/** One more than the highest group number; 0 for no items. */
export function countGroups(groups: Int32Array): number {
  let highest = -1;
  for (let item = 0; item < groups.length; item += 1) highest = Math.max(highest, groups[item]);
  return highest + 1;
}

/** Pairs of items in the same group, and the entropy of the group sizes in nats. */
function summarise(groups: Int32Array): [number, number] {
  const sizes = new Uint32Array(countGroups(groups));
  for (let item = 0; item < groups.length; item += 1) sizes[groups[item]] += 1;
  let pairs = 0;
  let entropy = 0;
  for (const size of sizes) {
    pairs += choose2(size);
    entropy += entropyTerm(size, groups.length);
  }
  return [pairs, entropy];
}
