import fc from 'fast-check';
import { describe, expect, it } from 'vitest';

import { localPath } from '@/lib/access/local-path';

describe('the way back after signing in', () => {
  it('keeps paths of this service with query and fragment', () => {
    for (const path of ['/', '/portfolios', '/portfolios/7/works?sort=-year&q=peat%20moss#row-3', '/account?next=https://elsewhere.example/']) expect(localPath(path)).toBe(path);
  });

  it('refuses whatever leaves the service', () => {
    const hostile = ['https://elsewhere.example', '//elsewhere.example', '/\\elsewhere.example', '\\\\elsewhere.example', '/\t/elsewhere.example', '/\n/elsewhere.example', 'javascript:alert(1)', '/.//elsewhere.example', '/a/..//elsewhere.example', '/%0a/..//elsewhere.example', 'portfolios', '', ' /portfolios', null, undefined, 7, ['/portfolios'], `/${'a'.repeat(3000)}`];
    for (const value of hostile) expect(localPath(value)).toBe('/portfolios');
  });

  it('never gives a path that a browser resolves to another host', () => {
    const pieces = fc.array(fc.constantFrom('/', '\\', '.', '..', '//', '\t', '%2f', '@', ':', 'elsewhere.example', 'a', '?', '#'), { maxLength: 12 });
    fc.assert(
      fc.property(pieces, (parts) => {
        const path = localPath(parts.join(''));
        expect(new URL(path, 'https://heddle.example').host).toBe('heddle.example');
      }),
      { numRuns: 3000 },
    );
  });
});
