import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { type Actor } from '@/lib/access/permissions';
import { closeDatabase } from '@/lib/db/connection';
import { select } from '@/lib/db/bulk';
import { createSeededRandom } from '@/tests/integration/seeded-random';
import { type Import } from '@/models/import';
import { createPortfolio, createUser } from '@/tests/integration/factories';
import { accept, dumpCatalogue, emptyCatalogue, undo, upload } from '@/tests/integration/pipeline';

let actor: Actor;
let portfolioId: number;

beforeAll(async () => {
  const user = await createUser('librarian');
  actor = { userId: user.id, name: user.name, email: user.email, role: 'librarian', via: 'session' };
  portfolioId = (await createPortfolio({ createdById: user.id })).id;
});
beforeEach(emptyCatalogue);
afterAll(closeDatabase);

interface MadeWork {
  title: string;
  family: string;
  year: number;
  volume: number;
  page: number;
  doi: string | null;
  cites: number[];
}

/** A small field of works that cite each other, so that files share works, references and keys in every way that linking knows. */
function makeWorks(random: () => number, size: number): MadeWork[] {
  const families = ['Aldervik', 'Brae', 'Castellano', 'van der Meer', 'Okonkwo'];
  return Array.from({ length: size }, (_, index) => ({
    title: `A study number ${index % 5 === 0 ? 'zero' : index} of reed beds`,
    family: families[Math.floor(random() * families.length)],
    year: 2000 + Math.floor(random() * 3),
    volume: 1 + Math.floor(random() * 2),
    page: 10 + index,
    doi: random() < 0.6 ? `10.5555/w${index}` : null,
    cites: Array.from({ length: 4 }, () => Math.floor(random() * size)),
  }));
}

function citedLine(work: MadeWork, random: () => number): string {
  const parts = [`${work.family.toUpperCase().replace(/[^A-Z]/g, '')} A`, String(work.year), 'J REED', `V${work.volume}`, `P${work.page}`];
  if (random() < 0.3) parts.splice(3, 1);
  if (work.doi && random() < 0.6) parts.push(`DOI ${work.doi}`);
  return parts.join(', ');
}

/** A tagged export of some of the works, each with its references; identifiers and pages are missing now and then. */
function writeFile(works: MadeWork[], chosen: number[], random: () => number): string {
  const records = chosen.map((index) => {
    const work = works[index];
    const lines = [`PT J`, `AU ${work.family}, A`, `TI ${work.title}`, 'SO Journal of Reed'];
    work.cites.forEach((cited, place) => lines.push(`${place === 0 ? 'CR' : '  '} ${citedLine(works[cited], random)}`));
    lines.push(`PY ${work.year}`);
    if (random() < 0.8) lines.push(`VL ${work.volume}`, `BP ${work.page}`);
    if (work.doi && random() < 0.8) lines.push(`DI ${work.doi}`);
    return `${lines.join('\n')}\nER\n`;
  });
  return `FN Export\nVR 1.0\n${records.join('\n')}\nEF\n`;
}

describe('undoing an import', () => {
  it('leaves works, citations, members and links as in a database that never saw it', async () => {
    const random = createSeededRandom(7);
    const works = makeWorks(random, 30);
    const files = [0, 1, 2].map((part) => writeFile(works, works.map((_, index) => index).filter((index) => (index + part) % 2 === 0 || index % 7 === part), random));
    await accept(actor, await upload(actor, portfolioId, 'a.txt', files[0]));
    await accept(actor, await upload(actor, portfolioId, 'c.txt', files[2]));
    const never = await dumpCatalogue();
    expect(never.works.length).toBeGreaterThan(10);
    expect(never.citations.length).toBeGreaterThan(10);

    const between = await accept(actor, await upload(actor, portfolioId, 'b.txt', files[1]));
    expect(between.state).toBe('accepted');
    expect(await dumpCatalogue()).not.toEqual(never);
    expect((await undo(actor, between)).state).toBe('undone');
    expect(await dumpCatalogue()).toEqual(never);

    // And once more: an undone import can be accepted again, with the same outcome as at first.
    await accept(actor, between);
    const again = await dumpCatalogue();
    await undo(actor, between);
    await accept(actor, between);
    expect(await dumpCatalogue()).toEqual(again);
  });

  it.each([1, 2, 3, 4, 5, 6])('depends on the set of accepted imports alone, not on the way to it (seed %i)', async (seed) => {
    const random = createSeededRandom(seed);
    const works = makeWorks(random, 16);
    const files = [0, 1, 2, 3].map(() => writeFile(works, works.map((_, index) => index).filter(() => random() < 0.45), random));
    const imports: Import[] = [];
    for (const [index, file] of files.entries()) imports.push(await upload(actor, portfolioId, `${index}.txt`, file));
    const standing = new Set<number>();
    for (let step = 0; step < 10; step += 1) {
      const index = Math.floor(random() * files.length);
      if (standing.delete(index)) await undo(actor, imports[index]);
      else {
        standing.add(index);
        await accept(actor, imports[index]);
      }
    }
    const wandered = await dumpCatalogue();
    await emptyCatalogue();
    for (const index of [...standing].sort()) await accept(actor, await upload(actor, portfolioId, `${index}.txt`, files[index]));
    expect(wandered).toEqual(await dumpCatalogue());
  });

  it('empties the catalogue when the only import is undone', async () => {
    const random = createSeededRandom(11);
    const works = makeWorks(random, 12);
    const row = await accept(actor, await upload(actor, portfolioId, 'a.txt', writeFile(works, works.map((_, index) => index), random)));
    expect(row.counts?.records).toBe(12);
    await undo(actor, row);
    const dump = await dumpCatalogue();
    expect(Object.values(dump).every((rows) => rows.length === 0)).toBe(true);
    // The records themselves are kept: the import can still be looked at.
    const [{ kept }] = await select<{ kept: number }>(null, 'SELECT COUNT(*) AS kept FROM import_records WHERE importId = ?', [row.id]);
    expect(kept).toBe(12);
  });
});
