import { describe, expect, it } from 'vitest';

import { createReader, readText } from '@/lib/bibliography/readers';
import { type Entry, type ReadRecord } from '@/lib/bibliography/record';
import { generateScale, type ScaleRequest } from '@/lib/demonstration';
import { topics } from '@/lib/demonstration/topics';

const request = { works: 400, references: 9000, seed: 3 };
const formats: ScaleRequest['format'][] = ['tagged', 'bibtex', 'registry-json'];

describe('large files of the same kind', () => {
  it.each(formats)('reads back every work and every reference that was asked for (%s)', (format) => {
    const entries: Entry[] = [];
    const problems: string[] = [];
    const reader = createReader(format, { onEntry: (entry) => entries.push(entry), onProblem: (problem) => problems.push(problem.code) });
    let longest = 0;
    for (const piece of generateScale({ ...request, format })) {
      longest = Math.max(longest, piece.length);
      reader.write(piece);
    }
    reader.end();
    expect(problems).toEqual([]);
    expect(entries.flatMap((entry) => entry.problems)).toEqual([]);
    expect(entries).toHaveLength(request.works);
    const fields = entries.filter((entry): entry is ReadRecord => entry.kind === 'record').map((entry) => entry.fields);
    expect(fields.reduce((sum, one) => sum + one.references.length, 0)).toBe(request.references);
    expect(new Set(fields.map((one) => one.title)).size).toBe(request.works);
    // Pieces are records: what is held at one time does not grow with the file.
    expect(longest).toBeLessThan(200_000);
  });

  it('cites works of the file itself and gives the same bytes for the same seed', () => {
    const text = [...generateScale({ ...request, format: 'tagged' })].join('');
    expect([...generateScale({ ...request, format: 'tagged' })].join('')).toBe(text);
    expect([...generateScale({ ...request, seed: 4, format: 'tagged' })].join('')).not.toBe(text);
    const { entries } = readText('tagged', text);
    const fields = entries.filter((entry): entry is ReadRecord => entry.kind === 'record').map((entry) => entry.fields);
    const own = new Set(fields.map((one) => one.identifiers.doi).filter((doi) => doi !== undefined));
    const inside = fields.flatMap((one) => one.references).filter((reference) => reference.doi && own.has(reference.doi)).length;
    expect(inside).toBeGreaterThan(500);
  });
});

describe('the vocabulary of topics', () => {
  it('names only topics that exist as neighbours, and enough phrases of each kind', () => {
    const keys = new Set(topics.map((topic) => topic.key));
    for (const topic of topics) {
      expect(topic.neighbours.filter((key) => !keys.has(key) || key === topic.key)).toEqual([]);
      for (const list of [topic.subjects, topic.processes, topic.drivers, topic.settings, topic.methods]) {
        expect(list.length).toBeGreaterThanOrEqual(6);
        expect(new Set(list).size).toBe(list.length);
      }
    }
  });

  it('shares few subjects between topics, so that terms set clusters apart', () => {
    const subjects = topics.flatMap((topic) => topic.subjects);
    expect(new Set(subjects).size).toBe(subjects.length);
  });
});
