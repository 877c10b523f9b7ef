import { describe, expect, it } from 'vitest';

import { resolveVariants, type CataloguedTarget, type VariantInput } from '@/lib/linking/resolve';

const variant = (id: string, fields: Partial<VariantInput>): VariantInput => ({ id, doi: null, identifierKey: null, fieldKey: null, titleKey: null, ownKey: `own:${id}`, ...fields });
const work = (workId: number, doi: string | null = null): CataloguedTarget => ({ workId, key: `key-${workId}`, doi });
const lookup = (works: Record<string, CataloguedTarget[]>) => (key: string) => works[key] ?? [];

describe('resolving cited references', () => {
  it('links by DOI before all else', () => {
    const found = resolveVariants([variant('a', { doi: 'd', identifierKey: 'doi:d', fieldKey: 'f' })], lookup({ 'doi:d': [work(1, 'd')], f: [work(2)] }));
    expect(found.get('a')).toEqual({ workId: 1, how: 'doi' });
  });

  it('links by author, year, volume and page when exactly one catalogued work has them', () => {
    expect(resolveVariants([variant('a', { fieldKey: 'f' })], lookup({ f: [work(2)] })).get('a')).toEqual({ workId: 2, how: 'fields' });
    expect(resolveVariants([variant('a', { fieldKey: 'f' })], lookup({ f: [work(2), work(3)] })).get('a')).toEqual({ citedOnlyKey: 'f', how: 'drawn' });
  });

  it('does not link by fields against a contradicting DOI', () => {
    const found = resolveVariants([variant('a', { doi: 'd', identifierKey: 'doi:d', fieldKey: 'f' })], lookup({ f: [work(2, 'other')] }));
    expect(found.get('a')).toEqual({ citedOnlyKey: 'doi:d', how: 'drawn' });
  });

  it('draws a reference without DOI to the only DOI that occurs with its fields', () => {
    const variants = [variant('a', { doi: 'd', identifierKey: 'doi:d', fieldKey: 'f' }), variant('b', { fieldKey: 'f' })];
    expect(resolveVariants(variants, lookup({})).get('b')).toEqual({ citedOnlyKey: 'doi:d', how: 'drawn' });
    const conflicting = [...variants, variant('c', { doi: 'e', identifierKey: 'doi:e', fieldKey: 'f' })];
    expect(resolveVariants(conflicting, lookup({})).get('b')).toEqual({ citedOnlyKey: 'f', how: 'drawn' });
  });

  it('keeps all variants of one DOI on one work, also when only one of them tells the title', () => {
    const variants = [variant('a', { doi: 'd', identifierKey: 'doi:d', titleKey: 't' }), variant('b', { doi: 'd', identifierKey: 'doi:d' })];
    const found = resolveVariants(variants, lookup({ t: [work(4)] }));
    expect(found.get('a')).toEqual({ workId: 4, how: 'title' });
    expect(found.get('b')).toEqual({ workId: 4, how: 'title' });
  });

  it('draws together what has nothing but an equal text', () => {
    const found = resolveVariants([variant('a', { ownKey: 'own' }), variant('b', { ownKey: 'own' })], lookup({}));
    expect(found.get('a')).toEqual(found.get('b'));
  });
});
