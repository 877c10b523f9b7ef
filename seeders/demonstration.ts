import { Readable } from 'node:stream';
import { setTimeout as sleep } from 'node:timers/promises';

import { createDemonstrationAccounts } from '@/lib/access/seeding';
import { setGrant } from '@/lib/access/grants';
import { type Role } from '@/lib/access/permissions';
import { generateDemonstration, type Demonstration } from '@/lib/demonstration';
import { requestAnalysis } from '@/lib/analyses/run';
import { receiveUpload } from '@/lib/imports/uploads';
import { claim } from '@/lib/jobs/queue';
import { runJob } from '@/lib/jobs/run-job';
import { defaultParameters } from '@/lib/network/types';
import { Analysis } from '@/models/analysis';
import { Import } from '@/models/import';
import { Portfolio } from '@/models/portfolio';
import { Setting } from '@/models/setting';
import { Unit } from '@/models/unit';

type Say = (line: string) => void;

/** Set once all of it stands; from then on people's own changes to the demonstration are left as they are. */
const readySetting = 'demonstration.ready';

/** Runs queued jobs in this process until none is left: seeding needs no worker, and waits for one that already runs. */
async function workOff(unfinished: () => Promise<number>): Promise<void> {
  while ((await unfinished()) > 0) {
    const job = await claim();
    if (job) await runJob(job);
    else await sleep(200);
  }
}

async function seedUnits(demonstration: Demonstration): Promise<Map<string, number>> {
  const ids = new Map<string, number>();
  for (const unit of demonstration.units) {
    const parentId = unit.parentKey === null ? null : (ids.get(unit.parentKey) ?? null);
    const [row] = await Unit.findOrCreate({ where: { seedKey: unit.key }, defaults: { name: unit.name, kind: unit.kind, parentId, seedKey: unit.key } });
    ids.set(unit.key, row.id);
  }
  return ids;
}

async function seedPortfolio(portfolio: Demonstration['portfolios'][number], unitId: number | null, people: Record<Role, number>, say: Say): Promise<Portfolio> {
  const librarian = { userId: people.librarian };
  const [row] = await Portfolio.findOrCreate({
    where: { seedKey: portfolio.key },
    defaults: { name: portfolio.name, description: portfolio.description, unitId, periodFrom: portfolio.periodFrom, periodTo: portfolio.periodTo, createdById: people.librarian, demonstration: true, seedKey: portfolio.key },
  });
  for (const [role, level] of [['librarian', 'manage'], ['evaluator', 'contribute'], ['author', 'view'], ['reader', 'view']] as const) {
    // A reader is given one portfolio only, as in life.
    if (role !== 'reader' || portfolio.key.includes('faculty')) await setGrant(librarian, row.id, people[role], level);
  }
  for (const file of portfolio.files) {
    const { row: imported } = await receiveUpload(librarian, row.id, { name: file.name, content: Readable.from([Buffer.from(file.content, 'utf8')]) }, { autoAccept: true });
    await workOff(() => Import.count({ where: { id: imported.id, state: ['uploaded', 'reading', 'checking', 'accepting'] } }));
    await imported.reload();
    if (imported.state !== 'accepted') throw new Error(`The demonstration file ${file.name} ended as ${imported.state}: ${imported.error ?? 'no reason given'}`);
    const { counts } = imported;
    say(`  ${file.name}: ${counts?.records} records, ${counts?.new} new, ${counts?.known} known, ${counts?.review} to review, ${counts?.rejected} rejected, ${counts?.references} references`);
  }
  return row;
}

/**
 * Seeds Tarnholm University: accounts, units, portfolios, imports through the very same pipeline that people use, an analysis each.
 * Idempotent by fixed keys: killed in the middle, it goes on where it was. Adds nothing to a service that holds people of its own.
 *
 * @returns whether the demonstration's accounts exist
 */
export async function seedDemonstration(say: Say): Promise<boolean> {
  const people = await createDemonstrationAccounts();
  if (!people) {
    say('This database has people of its own; no demonstration is added to it.');
    return false;
  }
  if (await Setting.findByPk(readySetting)) {
    say('The demonstration is there.');
    return true;
  }
  const demonstration = generateDemonstration(1);
  const units = await seedUnits(demonstration);
  const started = Date.now();
  for (const portfolio of demonstration.portfolios) {
    say(`Portfolio ${portfolio.name}`);
    const row = await seedPortfolio(portfolio, units.get(portfolio.unitKey) ?? null, people, say);
    if ((await Analysis.count({ where: { portfolioId: row.id } })) > 0) continue;
    const analysis = await requestAnalysis({ userId: people.evaluator }, row.id, defaultParameters);
    await workOff(() => Analysis.count({ where: { id: analysis.id, state: ['queued', 'running'] } }));
    await analysis.reload();
    if (analysis.state !== 'finished') throw new Error(`The demonstration's analysis of ${portfolio.name} ended as ${analysis.state}: ${analysis.error ?? 'no reason given'}`);
    say(`  analysis: ${analysis.summary?.works} works, ${analysis.summary?.citations} citations, ${analysis.summary?.bases.map((basis) => `${basis.clusters} clusters (${basis.basis})`).join(', ')}`);
  }
  await Setting.upsert({ name: readySetting, value: true });
  say(`The demonstration is ready (${Math.round((Date.now() - started) / 1000)} s).`);
  return true;
}
