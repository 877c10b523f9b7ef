// `npm run bench -- network imports ...`: runs suites of tests/bench and prints what they measured.
import { readdirSync, readFileSync } from 'node:fs';
import { cpus, totalmem } from 'node:os';
import path from 'node:path';
import { pathToFileURL } from 'node:url';

import { formatMeasurements, wantsDatabase, type Measurement } from './bench/table';
import { startThrowAwayDatabase } from './start/database.mjs';
import { explain, say, Stop } from './start/messages.mjs';
import { runToEnd, stopRunningSteps } from './start/processes.mjs';
import { prepareHome, serviceEnvironment, withoutServiceSettings } from './start/settings.mjs';
import { whenAskedToStop } from './start/signals.mjs';

interface Suite {
  run(): Promise<Measurement[]>;
}

const root = path.resolve(import.meta.dirname, '..');
const folder = path.join(root, 'tests', 'bench');
const cleanUps: (() => Promise<void>)[] = [];
let stopping = false;

whenAskedToStop((reason) => {
  stopping = true;
  say(`\nStopping (${reason}) ...`);
  stopRunningSteps();
  void cleanUp().then(() => process.exit(1));
});

try {
  await runSuites(process.argv.slice(2));
} catch (error) {
  process.exitCode = 1;
  if (!stopping) explain(error);
}
await cleanUp();
process.exit();

async function runSuites(names: string[]): Promise<void> {
  const available = readdirSync(folder).filter((file) => file.endsWith('.ts')).map((file) => file.slice(0, -3)).sort();
  const unknown = names.filter((name) => !available.includes(name));
  if (names.length === 0 || unknown.length > 0) {
    const problem = unknown.length > 0 ? `There is no suite called ${unknown.join(', ')}.` : 'Name the suites to run.';
    throw new Stop(`${problem} There ${available.length === 1 ? 'is' : 'are'}: ${available.join(', ') || 'none yet'}.`);
  }
  say(`${cpus().length} x ${cpus()[0]?.model.trim() ?? 'unknown processor'}, ${(totalmem() / 1024 ** 3).toFixed(1)} GiB, Node ${process.version}`);
  // Models read the settings as soon as they are loaded, so the database must stand before the first suite is imported.
  if (names.some((name) => wantsDatabase(readFileSync(path.join(folder, `${name}.ts`), 'utf8')))) await provideDatabase();
  for (const name of names) {
    const suite = (await import(pathToFileURL(path.join(folder, `${name}.ts`)).href)) as Partial<Suite>;
    if (typeof suite.run !== 'function') throw new Stop(`tests/bench/${name}.ts exports no function run(), so it is no suite.`);
    say(`\n${name}`);
    const startedAt = performance.now();
    const measurements = await suite.run();
    if (measurements.length === 0) throw new Stop(`The suite ${name} measured nothing.`);
    say(formatMeasurements(measurements));
    say(`(${((performance.now() - startedAt) / 1000).toFixed(1)} s in all)`);
  }
}

async function provideDatabase(): Promise<void> {
  const { home } = prepareHome(root);
  const throwAway = await startThrowAwayDatabase({ home, prefix: 'bench', databases: ['heddle_bench'], poolBytes: Math.min(1024 ** 3, Math.floor(totalmem() / 4)) });
  cleanUps.push(throwAway.remove);
  const settings = serviceEnvironment(
    {
      secret: 'measured-on-a-database-nobody-keeps',
      databaseUrl: throwAway.server.url('heddle_bench'),
      dataFolder: path.join(throwAway.folder, 'data'),
      url: 'http://localhost:3000',
      demonstration: true,
      nodeEnvironment: 'production',
    },
    withoutServiceSettings(process.env),
  );
  Object.assign(process.env, settings, { HEDDLE_TEST: '1', LOG_LEVEL: 'warn' });
  const end = await runToEnd({ command: process.execPath, parameters: ['--import', 'tsx', path.join('scripts', 'migrate.ts')], cwd: root });
  if (end.code !== 0) throw new Stop('scripts/migrate.ts failed; its message stands above.');
  cleanUps.push(async () => (await import('@/lib/db/connection')).closeDatabase());
}

async function cleanUp(): Promise<void> {
  for (const clean of cleanUps.splice(0).reverse()) await clean();
}
