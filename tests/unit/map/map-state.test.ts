import { readFileSync } from 'node:fs';

import { describe, expect, it } from 'vitest';

import { dyeOf, inks, mixed, withOpacity } from '@/components/map/dyes';
import { labelOfCluster } from '@/components/map/label-layer';
import { cameraText, describeWork, filtersOf, findWorks, firstWork, neighboursOf, parseCamera, visibleWorks, walkTo } from '@/components/map/map-state';
import { restrictMap } from '@/components/map/restrict-map';
import { drawStaticMap } from '@/components/map/static-map';
import { knotSide, partThreads } from '@/components/map/threads';
import { type AnalysisMap } from '@/lib/api/types';

/** Five works: 0 in the middle, 1 right, 2 far right and a little up, 3 above, 4 left in no cluster and without a year. */
const map: AnalysisMap = {
  analysisId: '1', basis: 'coupling', ids: ['10', '11', '12', '13', '14'], titles: ['Middle <i>work</i>', 'Émile on reeds', 'Far reeds', null, 'Left'], authors: ['Brae', 'García', 'Quist', 'Tolland', null],
  years: [2000, 2005, 2010, 2015, null], x: [0, 2, 8, 0, -3], y: [0, 0.2, 1, 4, 0], size: [9, 4, 1, 0, 2], pageRank: [3, 2, 1, 0.5, 0.4], rank: [1, 2, 3, 4, 5],
  catalogued: [true, true, true, false, true], retracted: [false, false, true, false, false], cluster: [0, 0, 1, 1, -1], firmness: [1, 0.9, 0.4, 0.8, null],
  clusters: [{ number: 0, letter: 'A', name: 'reed beds', size: 2, firmness: 0.95 }, { number: 1, letter: 'B', name: 'far & away', size: 2, firmness: 0.6 }],
  links: { source: [0, 0, 0, 0, 1], target: [1, 2, 3, 4, 2], weight: [5, 1, 2, 3, 4] }, notDrawn: 7, similarity: 'cosine',
};
const all = Uint8Array.from([1, 1, 1, 1, 1]);
const search = (text: string) => filtersOf(new URLSearchParams(text));

describe('filters of the map', () => {
  it('hide works by year and cluster, undated ones as soon as years are chosen', () => {
    expect([...visibleWorks(map, search(''))]).toEqual([1, 1, 1, 1, 1]);
    expect([...visibleWorks(map, search('yearFrom=2005'))]).toEqual([0, 1, 1, 1, 0]);
    expect([...visibleWorks(map, search('yearFrom=2005&yearTo=2010'))]).toEqual([0, 1, 1, 0, 0]);
    expect([...visibleWorks(map, search('off=B'))]).toEqual([1, 1, 0, 0, 1]);
    expect([...visibleWorks(map, search('off=A,-'))]).toEqual([0, 0, 1, 1, 0]);
  });

  it('ignore what no address should hold', () => {
    expect(search('yearFrom=19&yearTo=abc&off=a,1,<script>')).toEqual({ yearFrom: null, yearTo: null, off: new Set() });
  });
});

describe('walking', () => {
  const neighbours = neighboursOf(map);
  it('goes to the linked work that lies nearest in the direction of the arrow', () => {
    expect(walkTo(map, 0, neighbours[0], all, 'ArrowRight')).toBe(1);
    expect(walkTo(map, 0, neighbours[0], all, 'ArrowUp')).toBe(3);
    expect(walkTo(map, 0, neighbours[0], all, 'ArrowLeft')).toBe(4);
    expect(walkTo(map, 0, neighbours[0], all, 'ArrowDown')).toBeNull();
  });

  it('passes over hidden works and begins at the best rank shown', () => {
    expect(walkTo(map, 0, neighbours[0], Uint8Array.from([1, 0, 1, 1, 1]), 'ArrowRight')).toBe(2);
    expect(firstWork(map, Uint8Array.from([0, 0, 1, 1, 0]))).toBe(2);
    expect(firstWork(map, new Uint8Array(5))).toBeNull();
  });

  it('says where it has come to', () => {
    expect(describeWork(map, 2, neighbours[2])).toBe('Retracted: Far reeds. Quist, 2010. cluster B, far & away, uncertain. rank 3. 1 citations here. 2 links.');
    expect(describeWork(map, 4, neighbours[4])).toContain('in no cluster');
  });
});

describe('finding', () => {
  it('takes every word, without case and marks, best rank first', () => {
    expect(findWorks(map, all, 'REEDS', 10)).toEqual([1, 2]);
    expect(findWorks(map, all, 'emile garcia 2005', 10)).toEqual([1]);
    expect(findWorks(map, all, '   ', 10)).toEqual([]);
    expect(findWorks(map, Uint8Array.from([1, 0, 1, 1, 1]), 'reeds', 10)).toEqual([2]);
    expect(findWorks(map, all, 'reeds', 1)).toEqual([1]);
  });
});

describe('the camera in the address', () => {
  it('comes back as it was written, and anything else is nothing', () => {
    expect(parseCamera(cameraText({ x: 0.51234, y: 0.25, ratio: 0.8 }))).toEqual({ x: 0.5123, y: 0.25, ratio: 0.8 });
    for (const text of [null, '', '1,2', '1,2,x', '1,2,0', '1,2,-1', '99,0,1', 'NaN,0,1']) expect(parseCamera(text)).toBeNull();
  });
});

describe('threads and knots', () => {
  it('are parted into those within a cluster and those between, the strongest kept', () => {
    expect(partThreads(map, 10, 10)).toEqual({ within: [0], between: [4, 3, 2, 1] });
    expect(partThreads(map, 10, 2).between).toEqual([4, 3]);
  });

  it('knots grow in area with citations', () => {
    const [none, quarter, most] = [0, 25, 100].map((citations) => knotSide(citations, 100, 300));
    expect(none).toBeGreaterThan(0);
    expect(quarter - none).toBeCloseTo((most - none) / 2, 10);
    expect(knotSide(0, 0, 0)).toBeGreaterThan(0);
  });

  it('a part of a map keeps places, clusters and the links among what is left', () => {
    const part = restrictMap(map, new Set(['11', '12', '13']));
    expect(part.ids).toEqual(['11', '12', '13']);
    expect(part.links).toEqual({ source: [0], target: [1], weight: [4] });
    expect(part.x).toEqual([2, 8, 0]);
    expect(part.clusters).toEqual(map.clusters);
    expect(restrictMap(map, null)).toBe(map);
  });
});

describe('colours', () => {
  it('are those of the stylesheet, in both schemes', () => {
    const [light, dark] = readFileSync('app/globals.css', 'utf8').split('[data-scheme="dark"]');
    for (const [scheme, css] of [['light', light], ['dark', dark]] as const) {
      const token = (name: string) => new RegExp(`--${name}: (#[0-9a-f]{6})`).exec(css)?.[1];
      for (let cluster = 0; cluster < 10; cluster += 1) expect(dyeOf(cluster, scheme)).toBe(token(`dye-${cluster + 1}`));
      expect(dyeOf(10, scheme)).toBe(token('dye-none'));
      expect(dyeOf(-1, scheme)).toBe(token('dye-none'));
      const { ground, ink, inkSoft, thread, selected, retracted } = inks[scheme];
      expect([ground, ink, inkSoft, thread, selected, retracted]).toEqual(['paper', 'ink', 'ink-soft', 'thread-strong', 'weld', 'madder'].map(token));
    }
  });

  it('mix and thin out', () => {
    expect(mixed('#000000', '#ffffff', 0.5)).toBe('#808080');
    expect(withOpacity('#0a0b0c', 0.5)).toBe('rgba(10,11,12,0.5)');
  });
});

describe('the still picture', () => {
  const svg = drawStaticMap(map, { scheme: 'light', title: 'Reeds & <peat>', caution: 'Use, not quality.', provenance: 'Heddle · analysis 1' });

  it('escapes every text', () => {
    expect(svg).toContain('Reeds &amp; &lt;peat&gt;');
    expect(svg).toContain('Middle &lt;i&gt;work&lt;/i&gt;');
    expect(svg).not.toContain('<i>');
  });

  it('has a knot for each work, hollow where uncertain, crossed out where retracted', () => {
    expect(svg.match(/<rect [^>]*rx="1" fill="[^"]+" stroke=/g)).toHaveLength(5);
    expect(svg.match(new RegExp(`rx="1" fill="${inks.light.ground}" stroke="${dyeOf(1, 'light')}"`, 'g'))).toHaveLength(1);
    expect(svg.match(new RegExp(`stroke="${inks.light.retracted}"`, 'g'))).toHaveLength(1);
    expect(svg).toContain('Retracted: Far reeds');
  });

  it('names its clusters, its caution and where it comes from', () => {
    for (const words of ['A · Reed beds', 'B · Far &amp; away', 'shared references', 'Use, not quality.', 'Heddle · analysis 1', '7 works without a link are not drawn']) expect(svg).toContain(words);
    expect(labelOfCluster({ letter: 'A', name: 'a very long name of a cluster' }, 12)).toBe('A · A very long…');
  });
});
