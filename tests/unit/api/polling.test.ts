import { describe, expect, it } from 'vitest';

import { startFromFallback } from '@/lib/api/polling';

const whileReading = (row: { state: string } | undefined) => (row?.state === 'reading' ? 1000 : 0);

describe('the interval of looking again', () => {
  it('starts from what the server knew, as long as there is no answer', () => {
    const interval = startFromFallback(whileReading, { state: 'reading' });
    expect(interval).toBeTypeOf('function');
    expect((interval as typeof whileReading)(undefined)).toBe(1000);
    expect((startFromFallback(whileReading, { state: 'review' }) as typeof whileReading)(undefined)).toBe(0);
    expect((startFromFallback(whileReading, undefined) as typeof whileReading)(undefined)).toBe(0);
  });

  it('follows the answers once there are some', () => {
    const interval = startFromFallback(whileReading, { state: 'reading' }) as typeof whileReading;
    expect(interval({ state: 'review' })).toBe(0);
    expect(interval({ state: 'reading' })).toBe(1000);
  });

  it('leaves a plain number alone', () => {
    expect(startFromFallback(5000, { state: 'review' })).toBe(5000);
    expect(startFromFallback(undefined, { state: 'review' })).toBeUndefined();
  });
});
