import { afterAll, beforeAll, beforeEach, expect, it } from 'vitest';

import { type Actor } from '@/lib/access/permissions';
import { closeDatabase } from '@/lib/db/connection';
import { readImportAgain } from '@/lib/imports/decide';
import { describeColumns } from '@/lib/imports/table-columns';
import { ImportRecord } from '@/models/import-record';
import { createPortfolio, createUser } from '@/tests/integration/factories';
import { upload, workOff } from '@/tests/integration/pipeline';

let actor: Actor;
let portfolioId: number;
beforeAll(async () => {
  const user = await createUser('librarian');
  actor = { userId: user.id, name: user.name, email: user.email, role: 'librarian', via: 'session' };
});
beforeEach(async () => {
  portfolioId = (await createPortfolio({ createdById: actor.userId })).id;
});
afterAll(closeDatabase);

let made = 0;
/** The same head each time, never the same file. */
const table = (head: string) => `${head}\nReed beds in winter storms,Brae A.,2001,Note ${(made += 1)}\n`;
const authorsOf = async (importId: number) => {
  const record = await ImportRecord.findOne({ where: { importId } });
  return (JSON.parse(record?.fields ?? '{}') as { authors?: { family?: string }[] }).authors?.map((name) => name.family) ?? [];
};

it('shows heads, guesses and first rows', async () => {
  const row = await upload(actor, portfolioId, 'a.csv', table('Title,Who wrote it,Year,Shelf'));
  expect(row.format).toBe('delimited');
  expect(await describeColumns(row)).toMatchObject({ delimiter: ',', heads: ['Title', 'Who wrote it', 'Year', 'Shelf'], columns: ['title', null, 'year', null], chosen: null, rows: [['Reed beds in winter storms', 'Brae A.', '2001', `Note ${made}`]] });
});

it('reads again with the columns that a person names, and the next table of theirs with that head as well', async () => {
  const head = 'Title,Writer of it,Year,Shelf mark';
  const row = await upload(actor, portfolioId, 'a.csv', table(head));
  expect(await authorsOf(row.id)).toEqual([]);
  await readImportAgain(actor, row, { format: 'delimited', columns: ['title', 'authors', 'year', null] });
  await workOff();
  expect(await authorsOf(row.id)).toEqual(['Brae']);
  expect((await describeColumns(await row.reload())).chosen).toEqual(['title', 'authors', 'year', null]);

  const next = await upload(actor, portfolioId, 'b.csv', table(head.toUpperCase()));
  expect(await authorsOf(next.id)).toEqual(['Brae']);
  const stranger = await createUser('librarian');
  const theirs = await upload({ ...actor, userId: stranger.id }, (await createPortfolio({ createdById: stranger.id })).id, 'c.csv', table(head));
  expect(await authorsOf(theirs.id)).toEqual([]);
});

it('reads a table whose heads say nothing once somebody has said what they mean', async () => {
  const row = await upload(actor, portfolioId, 'a.csv', 'A;B;C\nReed beds in winter storms;Brae A.;2001\n', { format: 'delimited' });
  expect(row.counts).toMatchObject({ records: 1, rejected: 1 });
  await readImportAgain(actor, row, { format: 'delimited', columns: ['title', 'authors', 'year'] });
  await workOff();
  expect((await row.reload()).counts).toMatchObject({ records: 1, new: 1, rejected: 0 });
});

it('refuses columns that do not fit the table, and leaves the import as it was', async () => {
  const row = await upload(actor, portfolioId, 'a.csv', table('Title,Who,Year,Shelf'));
  await expect(readImportAgain(actor, row, { columns: ['title', 'year'] })).rejects.toMatchObject({ status: 422, message: expect.stringContaining('4 columns, and 2 were named') });
  await expect(readImportAgain(actor, row, { columns: ['authors', null, 'year', null] })).rejects.toMatchObject({ status: 422, message: expect.stringContaining('title, or the DOI') });
  expect((await row.reload()).state).toBe('review');
  const list = await upload(actor, portfolioId, 'a.bib', '@article{a, title={Reed beds in winter storms}}');
  await expect(describeColumns(list)).rejects.toMatchObject({ status: 422 });
});
