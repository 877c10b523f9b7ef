import { describe, expect, it } from 'vitest';

import { parseDate, parseMonth, parsePages } from '@/lib/bibliography/dates';

describe('dates', () => {
  it.each([
    ['2001', { year: 2001 }], ['2001-05', { year: 2001, month: 5 }], ['2001-05-03', { year: 2001, month: 5, day: 3 }], ['2001/05/03/Spring', { year: 2001, month: 5, day: 3 }], ['2001///', { year: 2001 }], ['2001/2003', { year: 2001 }], ['2001 May 3', { year: 2001, month: 5, day: 3 }],
    ['3 May 2001', { year: 2001, month: 5, day: 3 }], ['May 2001', { year: 2001, month: 5 }], ['2001 Spring', { year: 2001 }], ['circa 1850?', { year: 1850 }], ['2001-13-40', { year: 2001 }], ['2018 Apr', { year: 2018, month: 4 }], ['c2019', { year: 2019 }], ['in press', {}], ['', {}],
  ])('%s', (text, date) => expect(parseDate(text)).toEqual(date));

  it.each([['3', 3], ['03', 3], ['13', undefined], ['sep', 9], ['September', 9], ['Sept.', 9], ['JUN 15', 6], ['31 aug', 8], ['Marxism', undefined], ['', undefined]])('month %s', (text, month) => expect(parseMonth(text)).toBe(month));
});

describe('pages', () => {
  it.each([
    ['1--10', { firstPage: '1', lastPage: '10' }], ['1–10', { firstPage: '1', lastPage: '10' }], ['123-9', { firstPage: '123', lastPage: '129' }], ['1098-105', { firstPage: '1098', lastPage: '1105' }], ['e123', { firstPage: 'e123' }], ['S5-S9', { firstPage: 'S5', lastPage: 'S9' }],
    ['pp. 12 - 15', { firstPage: '12', lastPage: '15' }], ['12, 15-17', { firstPage: '12' }], ['73+', { firstPage: '73' }], ['xxi + 554', {}], ['129-3', { firstPage: '129', lastPage: '3' }], ['ix-xi', { firstPage: 'ix', lastPage: 'xi' }], ['e101-9', { firstPage: 'e101', lastPage: 'e109' }], ['', {}],
  ])('%s', (text, pages) => expect(parsePages(text)).toEqual(pages));
});
