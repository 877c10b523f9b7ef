/**
 * Citation percentiles within groups (such as publication years): how far up a work stands among those of its group.
 *   P = 100 (N_less + N_equal / 2) / N,  N_equal counting the work itself
 * High is much cited; ties share the middle of their block; never 0 or 100. Equals (mean rank - 1/2) / N * 100.
 * Source: Hazen (1914), Trans. American Society of Civil Engineers 77:1539; Bornmann, Leydesdorff & Mutz (2013), J. Informetrics 7:158, doi 10.1016/j.joi.2012.10.001.
 * Cost O(n log n). A work without a group (null) has no percentile: NaN.
 */
export function percentilesWithin(values: ArrayLike<number>, groups: readonly (number | null)[]): Float64Array {
  if (values.length !== groups.length) throw new RangeError(`There are ${values.length} values for ${groups.length} groups.`);
  const percentiles = new Float64Array(values.length).fill(NaN);
  const members = new Map<number, number[]>();
  groups.forEach((group, item) => {
    if (group === null) return;
    const list = members.get(group);
    if (list) list.push(item);
    else members.set(group, [item]);
  });
  for (const items of members.values()) {
    items.sort((one, other) => values[one] - values[other]);
    for (let start = 0; start < items.length; ) {
      let end = start + 1;
      while (end < items.length && values[items[end]] === values[items[start]]) end += 1;
      const percentile = (100 * (start + (end - start) / 2)) / items.length;
      for (let place = start; place < end; place += 1) percentiles[items[place]] = percentile;
      start = end;
    }
  }
  return percentiles;
}
