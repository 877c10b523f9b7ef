import { describe, expect, it } from 'vitest';

import { fillYears } from '@/components/charts/year-bars';
import { placeOnTrack } from '@/components/charts/interval-bar';
import { initialsOf } from '@/components/frame/account-menu';
import { currentSection } from '@/components/frame/section-row';
import { nextSort, sortDirection } from '@/components/tables/columns';
import { clusterDye, clusterLetter } from '@/components/ui/cluster-swatch';
import { formatAgo, formatDate } from '@/components/ui/date-text';
import { pagesToShow } from '@/components/ui/pagination';
import { changedQuery } from '@/components/ui/use-address';

describe('the order of a table', () => {
  it('begins with the column\'s own order and turns round at the second press', () => {
    expect(nextSort('', 'pageRank', true)).toBe('-pageRank');
    expect(nextSort('-pageRank', 'pageRank', true)).toBe('pageRank');
    expect(nextSort('pageRank', 'pageRank', true)).toBe('-pageRank');
    expect(nextSort('-pageRank', 'title', false)).toBe('title');
  });

  it('is said for the sorted column only', () => {
    expect(sortDirection('-pageRank', 'pageRank')).toBe('descending');
    expect(sortDirection('pageRank', 'pageRank')).toBe('ascending');
    expect(sortDirection('-pageRank', 'rank')).toBeUndefined();
    expect(sortDirection('', undefined)).toBeUndefined();
  });
});

describe('pages of a list', () => {
  it('offers the first, the last and the neighbours', () => {
    expect(pagesToShow(1, 1)).toEqual([1]);
    expect(pagesToShow(1, 97)).toEqual([1, 2, null, 97]);
    expect(pagesToShow(50, 97)).toEqual([1, null, 49, 50, 51, null, 97]);
  });

  it('never leaves out a single page', () => {
    expect(pagesToShow(4, 6)).toEqual([1, 2, 3, 4, 5, 6]);
  });

  it('offers the last page to those who are beyond it', () => {
    expect(pagesToShow(12, 3)).toEqual([1, 2, 3]);
  });
});

describe('the address', () => {
  it('takes fields away that are empty and keeps the others', () => {
    expect(changedQuery(new URLSearchParams('q=peat&page=3'), { page: null, sort: '-year' })).toBe('?q=peat&sort=-year');
    expect(changedQuery(new URLSearchParams('q=peat'), { q: '' })).toBe('');
  });
});

describe('the row of sections', () => {
  const items = [{ href: '/portfolios/1', label: 'Overview' }, { href: '/portfolios/1/map', label: 'Map' }];

  it('marks the section with the longest address that the path begins with', () => {
    expect(currentSection('/portfolios/1', items)).toBe('/portfolios/1');
    expect(currentSection('/portfolios/1/map/clusters', items)).toBe('/portfolios/1/map');
  });

  it('marks nothing on a path that only shares letters', () => {
    expect(currentSection('/portfolios/12', items)).toBeNull();
  });
});

describe('clusters', () => {
  it('are lettered past Z', () => {
    expect([0, 25, 26, 51, 52].map(clusterLetter)).toEqual(['A', 'Z', 'AA', 'AZ', 'BA']);
  });

  it('are neutral from the eleventh on', () => {
    expect([clusterDye(9), clusterDye(10), clusterDye(null)]).toEqual(['var(--dye-10)', 'var(--dye-none)', 'var(--dye-none)']);
  });
});

describe('times', () => {
  it('are written in the viewer\'s zone, the month in letters', () => {
    expect(formatDate('2026-05-13T23:30:00Z', 'Europe/Berlin', true)).toBe('14 May 2026, 01:30');
    expect(formatDate('2026-05-13T23:30:00Z', 'UTC')).toBe('13 May 2026');
  });

  it('are said as a distance up to a week', () => {
    const now = Date.parse('2026-05-14T12:00:00Z');
    expect(formatAgo('2026-05-14T11:59:40Z', now)).toBe('just now');
    expect(formatAgo('2026-05-14T11:59:00Z', now)).toBe('1 minute ago');
    expect(formatAgo('2026-05-14T09:30:00Z', now)).toBe('2 hours ago');
    expect(formatAgo('2026-05-08T11:00:00Z', now)).toBe('6 days ago');
    expect(formatAgo('2026-05-07T12:00:00Z', now)).toBeNull();
  });
});

describe('names', () => {
  it('give the initials of the first and the last word', () => {
    expect(['Maren Oduya', 'Anna Maria  Ruuska', 'Öztürk', ' '].map(initialsOf)).toEqual(['MO', 'AR', 'Ö', '']);
  });
});

describe('charts', () => {
  it('keep a place for years without works', () => {
    expect(fillYears([{ year: 2014, count: 2 }, { year: 2012, count: 1 }])).toEqual([{ year: 2012, count: 1 }, { year: 2013, count: 0 }, { year: 2014, count: 2 }]);
    expect(fillYears([])).toEqual([]);
  });

  it('place values on a track by their logarithm and keep them within it', () => {
    expect(placeOnTrack(10, 1, 100, 'log')).toBeCloseTo(0.5, 12);
    expect(placeOnTrack(500, 1, 100, 'linear')).toBe(1);
    expect(placeOnTrack(1, 1, 1, 'linear')).toBe(0);
  });
});
