import { Readable } from 'node:stream';

import { generateScale } from '@/lib/demonstration';
import { requestAnalysis } from '@/lib/analyses/run';
import { acceptImport, undoImport } from '@/lib/imports/decide';
import { receiveUpload } from '@/lib/imports/uploads';
import { defaultParameters } from '@/lib/network/types';
import { Analysis } from '@/models/analysis';
import { Portfolio } from '@/models/portfolio';
import { User } from '@/models/user';
import { type Measurement } from '@/scripts/bench/table';
import { workOff } from '@/tests/integration/pipeline';

export const needsDatabase = true;

const works = 10_000;
const references = 300_000;

/** 10,000 works with 300,000 references: from the uploaded file to an accepted import, its analysis, and undoing it. */
export async function run(): Promise<Measurement[]> {
  const user = await User.create({ email: `bench-${Date.now()}@bench.example`, name: 'Bench', role: 'librarian' });
  const actor = { userId: user.id, name: user.name, email: user.email, role: 'librarian' as const, via: 'session' as const };
  const portfolio = await Portfolio.create({ name: 'Bench', createdById: user.id });
  const measurements: Measurement[] = [];
  const timed = async (name: string, work: () => Promise<void>, note?: string): Promise<number> => {
    const started = performance.now();
    await work();
    const elapsed = performance.now() - started;
    measurements.push({ name, value: Math.round(elapsed), unit: 'ms', note });
    return elapsed;
  };
  const content = Readable.from(generateScale({ works, references, seed: 1, format: 'tagged' }), { objectMode: false });
  const { row } = await receiveUpload(actor, portfolio.id, { name: 'scale.txt', content });
  const read = await timed('read and check', workOff, `${works} works, ${references} references, tagged text`);
  await acceptImport(actor, await row.reload());
  const accepted = await timed('link and catalogue', workOff);
  await row.reload();
  if (row.state !== 'accepted') throw new Error(`The import ended as ${row.state}: ${row.error ?? ''}`);
  const analysis = await requestAnalysis(actor, portfolio.id, defaultParameters);
  await timed('analysis, stored', workOff, 'default parameters');
  await analysis.reload();
  if (analysis.state !== 'finished') throw new Error(`The analysis ended as ${analysis.state}: ${analysis.error ?? ''}`);
  await undoImport(actor, await row.reload());
  await timed('undo', workOff);
  const seconds = (read + accepted) / 1000;
  measurements.push({ name: 'references read, linked and stored', value: Math.round(references / seconds), unit: 'per second', note: `${row.counts?.linked} linked to catalogued works` });
  measurements.push({ name: 'peak memory of the process', value: process.resourceUsage().maxRSS / 1024, unit: 'MiB', note: `${await Analysis.count()} analysis stored` });
  return measurements;
}
