import { type Rows } from '@/lib/network/compressed-rows';

/** Reference lists that take part when pairs are counted, and how many were too long to. */
export interface CappedLists {
  /** One row per work; empty where the work's list was left out. */
  lists: Rows;
  skipped: number;
}

/**
 * Leaves out the lists of works that cite more than `maximumReferences` works: the pairs of a list grow with the square of its length,
 * and a list of a thousand (a bibliography, a volume of abstracts) says little about any one of its pairs. Cost O(references).
 * Throws a RangeError unless the cap is at least 1.
 */
export function capReferenceLists(references: Rows, maximumReferences: number): CappedLists {
  if (!(maximumReferences >= 1)) throw new RangeError(`The greatest number of references must be at least 1; it is ${maximumReferences}.`);
  const offsets = new Uint32Array(references.offsets.length);
  const members = new Uint32Array(references.members.length);
  let length = 0;
  let skipped = 0;
  for (let work = 0; work + 1 < offsets.length; work += 1) {
    const start = references.offsets[work];
    const end = references.offsets[work + 1];
    if (end - start > maximumReferences) skipped += 1;
    else {
      members.set(references.members.subarray(start, end), length);
      length += end - start;
    }
    offsets[work + 1] = length;
  }
  return { lists: { offsets, members: members.slice(0, length) }, skipped };
}

/** The lists with only the members that have a new number (`numbers[member] >= 0`), renumbered; rows stay ascending if the numbers keep the order. */
export function renumberMembers(lists: Rows, numbers: Int32Array): Rows {
  const offsets = new Uint32Array(lists.offsets.length);
  const members = new Uint32Array(lists.members.length);
  let length = 0;
  for (let row = 0; row + 1 < lists.offsets.length; row += 1) {
    for (let place = lists.offsets[row]; place < lists.offsets[row + 1]; place += 1) {
      const number = numbers[lists.members[place]];
      if (number >= 0) members[length++] = number;
    }
    offsets[row + 1] = length;
  }
  return { offsets, members: members.slice(0, length) };
}
