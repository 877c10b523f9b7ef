import { describe, expect, it } from 'vitest';

import { formatMeasurements, wantsDatabase } from '@/scripts/bench/table';
import { readTestPlan } from '@/scripts/test/arguments.mjs';
import { addTallies, summaryLine, tallyVitest } from '@/scripts/test/tally.mjs';

const ended = { code: 0, signal: null };
const failed = { code: 1, signal: null };
const file = (status: string, ...statuses: string[]) => ({ name: 'a.test.ts', status, assertionResults: statuses.map((each, index) => ({ status: each, fullName: `test ${index}` })) });
const counts = ({ passed, failed }: { passed: number; failed: number }) => ({ passed, failed });

describe('parameters of npm test', () => {
  it('runs everything when no part is named', () => {
    expect(readTestPlan([])).toEqual({ parts: ['lint', 'typecheck', 'pure', 'integration', 'e2e'], filters: [] });
  });

  it('runs one part, narrowed to files, and knows unit as pure', () => {
    expect(readTestPlan(['unit', 'tests/unit/scripts'])).toEqual({ parts: ['pure'], filters: ['tests/unit/scripts'] });
    expect(readTestPlan(['e2e'])).toEqual({ parts: ['e2e'], filters: [] });
  });

  it('refuses a part that does not exist instead of running nothing', () => {
    expect(() => readTestPlan(['end-to-end'])).toThrow(/no part of the tests/);
    expect(() => readTestPlan(['lint', 'app'])).toThrow(/no file names/);
  });
});

describe('counting', () => {
  it('counts passes and failures of all files', () => {
    const report = { testResults: [file('passed', 'passed', 'passed'), file('failed', 'passed', 'failed')] };
    expect(tallyVitest('pure', report, failed)).toEqual({ passed: 3, failed: 1, notes: [] });
  });

  it('counts a killed run without a report as a failure', () => {
    const tally = tallyVitest('pure', null, { code: null, signal: 'SIGKILL' });
    expect(counts(tally)).toEqual({ passed: 0, failed: 1 });
    expect(tally.notes[0]).toContain('SIGKILL');
  });

  it('counts a project without tests as a failure', () => {
    expect(counts(tallyVitest('e2e', { testResults: [] }, ended))).toEqual({ passed: 0, failed: 1 });
  });

  it('counts a file that could not be loaded', () => {
    expect(counts(tallyVitest('pure', { testResults: [file('failed'), file('passed', 'passed')] }, failed))).toEqual({ passed: 1, failed: 1 });
  });

  it('counts a skipped test as a failure and names it', () => {
    const tally = tallyVitest('pure', { testResults: [file('passed', 'passed', 'skipped', 'todo')] }, ended);
    expect(counts(tally)).toEqual({ passed: 1, failed: 2 });
    expect(tally.notes[0]).toContain('"test 1" in a.test.ts');
  });

  it('lets tests be skipped that were not asked for by title', () => {
    expect(counts(tallyVitest('pure', { testResults: [file('passed', 'passed', 'skipped')] }, ended, { filteredByName: true }))).toEqual({ passed: 1, failed: 0 });
  });

  it('counts an error outside the tests', () => {
    expect(counts(tallyVitest('pure', { testResults: [file('passed', 'passed')] }, failed))).toEqual({ passed: 1, failed: 1 });
  });

  it('ends with one line over all parts', () => {
    expect(summaryLine(addTallies([{ passed: 1, failed: 0, notes: [] }, { passed: 40, failed: 2, notes: ['why'] }]))).toBe('41 passed, 2 failed');
  });
});

describe('benchmarks', () => {
  it('starts a database only for suites that say so', () => {
    expect(wantsDatabase('import x from "y";\nexport const needsDatabase = true;\n')).toBe(true);
    expect(wantsDatabase('export const needsDatabase = false;')).toBe(false);
    expect(wantsDatabase('// export const needsDatabase = true')).toBe(false);
  });

  it('aligns figures and compares each with the first of its unit', () => {
    const lines = formatMeasurements([
      { name: 'plain', value: 100, unit: 'ms' },
      { name: 'typed arrays', value: 25, unit: 'ms', note: 'same result' },
      { name: 'rows', value: 1_000_000, unit: 'rows/s' },
      { name: 'lost', value: null, unit: 'ms' },
    ]).split('\n');
    expect(lines).toEqual([
      'measured          value  unit     ratio  note',
      'plain               100  ms      1.00 x',
      'typed arrays         25  ms      0.25 x  same result',
      'rows          1,000,000  rows/s',
      'lost                  -  ms',
    ]);
  });
});
