import { describe, expect, it } from 'vitest';

import { detectFormat } from '@/lib/bibliography/detect';
import { normaliseIssn, normaliseOrcid } from '@/lib/bibliography/identifiers';
import { readText } from '@/lib/bibliography/readers';
import { type Entry, type ReadRecord } from '@/lib/bibliography/record';
import { demonstrationPeople, generateDemonstration } from '@/lib/demonstration';
import { groupRecords } from '@/lib/linking/group';
import { recordKeys } from '@/lib/linking/keys';

const demonstration = generateDemonstration(1);
const files = demonstration.portfolios.flatMap((portfolio) => portfolio.files);
const entries = new Map<string, Entry[]>(files.map((file) => [file.name, readText(file.format, file.content).entries]));
const isRecord = (entry: Entry): entry is ReadRecord => entry.kind === 'record';
const records = [...entries.values()].flat().filter(isRecord);

/** FNV-1a over UTF-16 units: enough to see that not a character moved. */
function checksum(text: string): number {
  let hash = 0x811c9dc5;
  for (let at = 0; at < text.length; at += 1) hash = Math.imul(hash ^ text.charCodeAt(at), 0x01000193) >>> 0;
  return hash;
}

describe('the demonstration bibliography', () => {
  it('gives the same bytes for the same seed and others for another', () => {
    const sums = (list: typeof files) => list.map((file) => `${file.name} ${file.content.length} ${checksum(file.content)}`);
    const again = generateDemonstration(1);
    expect(sums(again.portfolios.flatMap((portfolio) => portfolio.files))).toEqual(sums(files));
    expect(again.statistics).toEqual(demonstration.statistics);
    const other = sums(generateDemonstration(2).portfolios.flatMap((portfolio) => portfolio.files));
    expect(other.filter((line, place) => line === sums(files)[place])).toEqual([]);
  });

  it('has the size and the shape that was asked for', () => {
    const { statistics, truth } = demonstration;
    expect(statistics.works).toBe(3000);
    expect(truth.works).toHaveLength(3000);
    expect(statistics.citations.inside + statistics.citations.outside).toBeGreaterThan(55_000);
    expect(statistics.citations.inside + statistics.citations.outside).toBeLessThan(66_000);
    expect(statistics.worksWithoutDoi / statistics.works).toBeGreaterThan(0.12);
    expect(statistics.worksWithoutDoi / statistics.works).toBeLessThan(0.18);
    expect(statistics.mostCited.every((count) => count > 100 && count < 600)).toBe(true);
    expect(files.length).toBeGreaterThanOrEqual(12);
    expect(new Set(files.map((file) => file.format)).size).toBe(5);
    expect(truth.works.filter((work) => work.retracted)).toHaveLength(5);
    const years = truth.works.map((work) => work.year);
    expect([Math.min(...years), Math.max(...years)]).toEqual([1985, 2025]);
    expect(years.filter((year) => year === 2024).length).toBeGreaterThan(3 * years.filter((year) => year === 1986).length);
  });

  it('names units before their children and a unit for every portfolio', () => {
    const known = new Set<string>();
    for (const unit of demonstration.units) {
      expect(unit.parentKey === null || known.has(unit.parentKey)).toBe(true);
      known.add(unit.key);
    }
    expect(demonstration.portfolios.map((portfolio) => known.has(portfolio.unitKey))).toEqual([true, true, true, true]);
  });

  it('writes files that are recognised and read entry by entry and reference by reference', () => {
    for (const file of files) {
      const expected = demonstration.statistics.files.find((one) => one.name === file.name);
      const read = entries.get(file.name) as Entry[];
      const found = {
        name: file.name,
        format: detectFormat(file.content)?.format,
        entries: read.length,
        rejected: read.filter((entry) => entry.kind === 'rejected').length,
        references: read.filter(isRecord).reduce((sum, record) => sum + record.fields.references.length, 0),
        characters: file.content.length,
      };
      expect(found).toEqual(expected);
    }
  });

  it('tells of a problem for every broken entry', () => {
    const { broken } = demonstration.statistics;
    const codes = files.flatMap((file) => {
      const { entries: read, summary } = readText(file.format, file.content);
      return [...read.flatMap((entry) => [...new Set(entry.problems.map((problem) => problem.code))]), ...summary.problems.map((problem) => problem.code)];
    });
    for (const [kind, count] of Object.entries(broken.kinds)) expect([kind, codes.filter((code) => code === kind).length]).toEqual([kind, count]);
  });

  it('never gives one title to two works', () => {
    const titles = demonstration.truth.works.map((work) => work.title.toLowerCase());
    expect(new Set(titles).size).toBe(titles.length);
  });

  it('uses the reserved DOI prefix, right check characters, and no ORCID iD of the block that is given out', () => {
    const dois = records.flatMap((record) => [record.fields.identifiers.doi, ...record.fields.references.map((reference) => reference.doi)]).filter((doi) => doi !== undefined);
    expect(dois.length).toBeGreaterThan(30_000);
    expect(dois.filter((doi) => !doi.startsWith('10.5555/'))).toEqual([]);
    const written = files.flatMap((file) => file.content.match(/\d{4}-\d{4}-\d{4}-\d{3}[\dX]/g) ?? []);
    expect(written.length).toBeGreaterThan(500);
    expect(written.filter((orcid) => normaliseOrcid(orcid) !== orcid || !orcid.startsWith('0000-0000-5'))).toEqual([]);
    const serials = records.flatMap((record) => record.fields.identifiers.issn ?? []);
    expect(serials.length).toBeGreaterThan(2000);
    expect(serials.filter((issn) => normaliseIssn(issn) !== issn)).toEqual([]);
    expect(records.flatMap((record) => record.problems).filter((problem) => problem.code === 'invalid-serial-number')).toEqual([]);
  });

  it('lets further records of a work merge by themselves, but for the doubtful ones', () => {
    const groups = groupRecords(
      records.map(({ fields }, id) => {
        const keys = recordKeys(fields);
        return { id, identifiers: keys.identifiers, fingerprint: keys.fingerprint, volumePage: keys.volumePage, title: keys.title, fallback: String(id).padStart(6, '0') };
      }),
    );
    const { works, duplicates } = demonstration.statistics;
    const surplus = groups.length - works;
    expect(surplus).toBeGreaterThanOrEqual(duplicates.doubtful);
    // Two readers may part a particle from a family name differently; that costs a handful of first authors.
    expect(surplus).toBeLessThanOrEqual(duplicates.doubtful + 8);
  });

  it('gives the demonstration author ten to twenty works under her own name', () => {
    const author = demonstrationPeople.find((person) => person.role === 'author');
    expect(author).toEqual({ role: 'author', name: 'Ilse Marwick', email: 'author@tarnholm.example' });
    const hers = new Set(records.filter(({ fields }) => fields.authors.some((name) => name.family === 'Marwick')).map(({ fields }) => fields.title?.toLowerCase().replace(/[^a-z]+/g, '')));
    expect(hers.size).toBeGreaterThanOrEqual(10);
    expect(hers.size).toBeLessThanOrEqual(22);
  });

  it('keeps citations mostly within topics and backwards in time, with a few works cited in press', () => {
    const { works, citing, cited } = demonstration.truth;
    let sameTopic = 0;
    let later = 0;
    const pairs = new Set<number>();
    for (let at = 0; at < citing.length; at += 1) {
      if (works[citing[at]].topic === works[cited[at]].topic) sameTopic += 1;
      if (cited[at] > citing[at]) later += 1;
      expect(citing[at]).not.toBe(cited[at]);
      pairs.add(citing[at] * works.length + cited[at]);
    }
    expect(pairs.size).toBe(citing.length);
    expect(sameTopic / citing.length).toBeGreaterThan(0.55);
    expect(later).toBeGreaterThan(0);
    expect(later / citing.length).toBeLessThan(0.01);
  });

  it('hands out pages that do not overlap within a volume', () => {
    const places = new Map<string, string>();
    for (const { fields } of records) {
      if (fields.type !== 'article' || !fields.identifiers.issn || !fields.firstPage || fields.year === undefined || !fields.identifiers.doi) continue;
      const place = `${fields.identifiers.issn[0]}|${fields.volume}|${fields.firstPage}`;
      expect(places.get(place) ?? fields.identifiers.doi).toBe(fields.identifiers.doi);
      places.set(place, fields.identifiers.doi);
    }
    expect(places.size).toBeGreaterThan(1200);
  });
});
