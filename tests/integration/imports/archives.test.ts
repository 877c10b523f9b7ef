import { readdir } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { Readable } from 'node:stream';
import { gzipSync } from 'node:zlib';

import { afterAll, beforeAll, beforeEach, describe, expect, it } from 'vitest';

import { closeDatabase } from '@/lib/db/connection';
import { nameWithin, receiveFile } from '@/lib/imports/archives';
import { Import } from '@/models/import';
import { createPortfolio, createUser } from '@/tests/integration/factories';
import { zipFile, type ZipPart } from '@/tests/integration/imports/zip-file';
import { workOff } from '@/tests/integration/pipeline';

let actor: { userId: number };
let portfolioId: number;
beforeAll(async () => {
  actor = { userId: (await createUser('librarian')).id };
});
beforeEach(async () => {
  portfolioId = (await createPortfolio({ createdById: actor.userId })).id;
});
afterAll(closeDatabase);

const bibtex = (title: string) => `@article{a, title = {${title}}, author = {Brae, A.}, year = {2001}}\n`;
const ris = (title: string) => `TY  - JOUR\nTI  - ${title}\nAU  - Brae, A.\nPY  - 2001\nER  - \n`;
const take = (name: string, content: Buffer, pieces = 64 * 1024) =>
  receiveFile(actor, portfolioId, { name, content: Readable.from(Array.from({ length: Math.ceil(content.length / pieces) }, (_, at) => content.subarray(at * pieces, (at + 1) * pieces))) });
const zip = (...parts: ZipPart[]) => take('lists.zip', zipFile(parts));
const imports = () => Import.findAll({ where: { portfolioId }, order: [['fileName', 'ASC']] });

describe('an archive', () => {
  it('gives an import for every list in it, named by its path, and nothing for what systems add', async () => {
    const received = await zip(
      { name: 'ecology/2019/rivers.bib', content: bibtex('Rivers that rise in the hills') },
      { name: 'ecology/lakes.ris', content: ris('Lakes that lie in the plains') },
      { name: 'ecology/', content: '' },
      { name: '__MACOSX/ecology/._lakes.ris', content: 'attributes' },
      { name: 'empty.bib', content: '' },
      { name: 'Größe.bib.gz', content: gzipSync(bibtex('Size of the catchment of moor streams')) },
    );
    expect(received).toHaveLength(3);
    await workOff();
    expect((await imports()).map((row) => [row.fileName, row.format, row.state, row.counts?.records])).toEqual([
      ['ecology › 2019 › rivers.bib', 'bibtex', 'review', 1],
      ['ecology › lakes.ris', 'ris', 'review', 1],
      ['Größe.bib', 'bibtex', 'review', 1],
    ]);
  });

  it('is told by what it holds, however it is named and however it arrives', async () => {
    const content = zipFile([{ name: 'a.bib', content: bibtex('Rivers that rise in the hills') }]);
    const [one] = await take('export.txt', content, 1);
    expect(one.row.fileName).toBe('a.bib');
    const again = await take('export.zip', content);
    expect(again.map((received) => received.alreadyThere)).toEqual([true]);
  });

  it.each<[string, ZipPart[], RegExp]>([
    ['a path that leads out', [{ name: '../../etc/evil.bib', content: bibtex('x') }], /relative path/],
    ['an absolute path', [{ name: '/etc/evil.bib', content: bibtex('x') }], /absolute path/],
    ['something encrypted', [{ name: 'a.bib', content: bibtex('x') }, { name: 'b.bib', content: 'secret', encrypted: true }], /b\.bib in it is encrypted/],
    ['a bomb', [{ name: 'a.bib', content: Buffer.alloc(40 * 1024 ** 2) }], /grows more than 200 times/],
    ['a workbook', [{ name: '[Content_Types].xml', content: '<Types/>' }, { name: 'xl/workbook.xml', content: '<workbook/>' }], /document or workbook/],
    ['too many files', Array.from({ length: 1001 }, (_, at) => ({ name: `${at}.bib`, content: 'x' })), /more than 1000 files/],
    ['nothing', [{ name: 'folder/', content: '' }], /no file with anything in it/],
  ])('with %s is refused whole, and nothing of it is kept', async (_what, parts, why) => {
    await expect(zip(...parts)).rejects.toMatchObject({ status: 422, message: expect.stringMatching(why) });
    expect(await imports()).toEqual([]);
  });

  it('that lies about a size keeps what came before and names the file', async () => {
    const lie = zip({ name: 'a.bib', content: bibtex('Rivers that rise in the hills') }, { name: 'b.bib', content: bibtex('Lakes that lie in the plains'), claimedSize: 10 });
    await expect(lie).rejects.toMatchObject({ status: 422, message: expect.stringMatching(/b\.bib could not be taken out: .*The one file before it was kept/) });
    expect((await imports()).map((row) => row.fileName)).toEqual(['a.bib']);
  });

  it('within an archive is refused by name', async () => {
    await expect(zip({ name: 'inner.zip', content: zipFile([{ name: 'a.bib', content: bibtex('x') }]) })).rejects.toMatchObject({ status: 422, message: expect.stringMatching(/inner\.zip could not be taken out: it is an archive within an archive/) });
    expect(await imports()).toEqual([]);
  });

  it('that is cut off or broken is refused, and leaves no folder behind', async () => {
    const whole = zipFile([{ name: 'a.bib', content: bibtex('Rivers that rise in the hills') }]);
    await expect(take('cut.zip', whole.subarray(0, 60))).rejects.toMatchObject({ status: 422, message: expect.stringMatching(/cut\.zip is no zip archive that can be read/) });
    expect((await readdir(tmpdir())).filter((name) => name.startsWith('heddle-archive-'))).toEqual([]);
  });
});

describe('a compressed list', () => {
  it('is unpacked as it comes', async () => {
    const [received] = await take('rivers.bib.gz', gzipSync(bibtex('Rivers that rise in the hills')), 7);
    expect(received.row.fileName).toBe('rivers.bib');
    await workOff();
    expect((await received.row.reload()).counts).toMatchObject({ records: 1, new: 1 });
  });

  it.each([
    ['cut off', gzipSync(bibtex('Rivers that rise in the hills')).subarray(0, 30), /could not be unpacked/],
    ['a bomb', gzipSync(Buffer.alloc(64 * 1024 ** 2)), /grows more than 200 times/],
  ])('that is %s is refused, and nothing of it is kept', async (_what, content, why) => {
    await expect(take('list.gz', content)).rejects.toMatchObject({ status: 422, message: expect.stringMatching(why) });
    expect(await imports()).toEqual([]);
  });
});

describe('the name of a file within an archive', () => {
  it('shows the path without being one', () => {
    expect(nameWithin('a/b\\c.bib')).toBe('a › b › c.bib');
    expect(nameWithin('../../x/./y.bib')).toBe('x › y.bib');
    expect(nameWithin('a\u0000\u202e.bib')).toBe('a.bib');
  });
});
