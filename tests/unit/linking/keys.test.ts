import { describe, expect, it } from 'vitest';

import { recordKeys } from '@/lib/linking/keys';
import { type RecordFields } from '@/lib/bibliography/record';

const fields = (more: Partial<RecordFields>): RecordFields => ({ type: 'article', authors: [], identifiers: {}, references: [], ...more });

describe('the fingerprint of a record', () => {
  it('is made of title, year and first author where the title tells enough', () => {
    expect(recordKeys(fields({ title: 'Reed beds in winter storms', year: 2001, authors: [{ family: 'Brae' }] })).fingerprint).toBe('fp:reed beds in winter storms|2001|brae');
  });

  it('takes volume and first page along for a short title', () => {
    expect(recordKeys(fields({ title: 'Introduction', year: 2001, authors: [{ family: 'Brae' }], volume: '7', firstPage: '12' })).fingerprint).toBe('fp:introduction|2001|brae|7|12');
  });

  it('is all that is told where year or author is missing, and that tells something', () => {
    expect(recordKeys(fields({ title: 'Proceedings of the fourth meeting on reed' })).fingerprint).toMatch(/^ct:proceedings of the fourth meeting on reed/);
    expect(recordKeys(fields({ title: 'Preface', volume: '3', firstPage: '1' })).fingerprint).toMatch(/^ct:preface/);
    expect(recordKeys(fields({ url: 'https://reed.example/report' })).fingerprint).toMatch(/^ct:/);
  });

  it('is missing where equal words say nothing of being one work', () => {
    expect(recordKeys(fields({ title: 'Introduction' })).fingerprint).toBeNull();
    expect(recordKeys(fields({ title: 'Never closed', authors: [{ family: 'Brae' }] })).fingerprint).toBeNull();
    expect(recordKeys(fields({ year: 2001, venue: 'Journal of Reed' })).fingerprint).toBeNull();
    expect(recordKeys(fields({})).fingerprint).toBeNull();
  });
});
