import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { groupRecords, type GroupInput } from '@/lib/linking/group';

const record = (id: number, fields: Partial<GroupInput>): GroupInput => ({ id, identifiers: [], fingerprint: null, volumePage: null, title: '', fallback: `rec:${id}`, ...fields });
const members = (inputs: GroupInput[], ...decisions: (readonly (readonly [number, number])[])[]) => groupRecords(inputs, ...decisions).map((group) => group.recordIds);

describe('grouping records into works', () => {
  it('merges records that share a DOI', () => {
    expect(members([record(1, { identifiers: ['doi:10.5555/a'], title: 'reed beds in winter' }), record(2, { identifiers: ['doi:10.5555/a'], title: 'reed beds in the winter' })])).toEqual([[1, 2]]);
  });

  it('keeps one DOI on wildly different titles apart and names each work', () => {
    const groups = groupRecords([record(1, { identifiers: ['doi:10.5555/a'], title: 'reed beds in winter' }), record(2, { identifiers: ['doi:10.5555/a'], title: 'numerical weather models' })]);
    expect(groups.map((group) => group.recordIds)).toEqual([[2], [1]]);
    expect(new Set(groups.map((group) => group.key)).size).toBe(2);
  });

  it('merges on an equal fingerprint when at most one DOI is involved', () => {
    expect(members([record(1, { identifiers: ['doi:10.5555/a'], fingerprint: 'fp:x' }), record(2, { fingerprint: 'fp:x' }), record(3, { fingerprint: 'fp:x' })])).toEqual([[1, 2, 3]]);
  });

  it('does not merge two DOIs on a fingerprint, and leaves a record without DOI undecided between them', () => {
    const inputs = [record(1, { identifiers: ['doi:10.5555/a'], fingerprint: 'fp:x' }), record(2, { identifiers: ['doi:10.5555/b'], fingerprint: 'fp:x' }), record(3, { fingerprint: 'fp:x' })];
    expect(members(inputs)).toEqual([[1], [2], [3]]);
  });

  it('does not merge contradicting volumes and pages on a fingerprint', () => {
    expect(members([record(1, { fingerprint: 'fp:x', volumePage: '1|10' }), record(2, { fingerprint: 'fp:x', volumePage: '2|30' }), record(3, { fingerprint: 'fp:x', volumePage: '1|10' })])).toEqual([[1, 3], [2]]);
  });

  it('lets people join and part what rules would not', () => {
    const apart = [record(1, { identifiers: ['doi:10.5555/a'] }), record(2, { identifiers: ['doi:10.5555/b'] })];
    expect(members(apart, [[1, 2]])).toEqual([[1, 2]]);
    const together = [record(1, { fingerprint: 'fp:x' }), record(2, { fingerprint: 'fp:x' })];
    expect(members(together, [], [[1, 2]])).toHaveLength(2);
  });

  it('gives the same works whatever the order of the records, each record in exactly one', () => {
    const anyRecord = fc.record({
      doi: fc.option(fc.integer({ min: 1, max: 5 })),
      fingerprint: fc.option(fc.integer({ min: 1, max: 4 })),
      page: fc.option(fc.integer({ min: 1, max: 2 })),
      title: fc.constantFrom('reed beds in winter', 'reed beds in summer', 'numerical weather models', ''),
    });
    fc.assert(
      fc.property(fc.array(anyRecord, { maxLength: 12 }), fc.infiniteStream(fc.double({ min: 0, max: 1, noNaN: true })), (made, chance) => {
        const inputs = made.map((one, id) =>
          record(id, { identifiers: one.doi === null ? [] : [`doi:10.5555/${one.doi}`], fingerprint: one.fingerprint === null ? null : `fp:${one.fingerprint}`, volumePage: one.page === null ? null : `1|${one.page}`, title: one.title, fallback: `rec:${String(id).padStart(3, '0')}` }),
        );
        const shuffled = inputs.map((input) => ({ input, at: chance.next().value ?? 0 })).sort((a, b) => a.at - b.at).map(({ input }) => input);
        const groups = groupRecords(inputs);
        expect(groupRecords(shuffled)).toEqual(groups);
        expect(groups.flatMap((group) => group.recordIds).sort((a, b) => a - b)).toEqual(inputs.map((input) => input.id));
        expect(new Set(groups.map((group) => group.key)).size).toBe(groups.length);
      }),
      { numRuns: 300 },
    );
  });
});
