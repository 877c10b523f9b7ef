// `npm test`: from a fresh clone to one last line `N passed, N failed`. Plain Node without a dependency, because node_modules may be missing.
import { randomBytes } from 'node:crypto';
import { mkdirSync, mkdtempSync, readdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { fileURLToPath } from 'node:url';

import { buildWhenNeeded, nextCommand } from './start/build.mjs';
import { startThrowAwayDatabase } from './start/database.mjs';
import { readRecord, runs } from './start/identity.mjs';
import { explain, lastLines, say, Stop, surviveClosedOutput } from './start/messages.mjs';
import { installPackages } from './start/packages.mjs';
import { freePort } from './start/ports.mjs';
import { runToEnd, stopRunningSteps } from './start/processes.mjs';
import { requireChromium, requireMariadb } from './start/programs.mjs';
import { startService, waitUntilHealthy } from './start/service.mjs';
import { prepareHome, serviceEnvironment, withoutServiceSettings } from './start/settings.mjs';
import { whenAskedToStop } from './start/signals.mjs';
import { readTestPlan } from './test/arguments.mjs';
import { addTallies, summaryLine } from './test/tally.mjs';
import { runVitest } from './test/vitest.mjs';

const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '..');
const { home, logs } = prepareHome(root);
const secret = randomBytes(32).toString('base64url');

/** @type {import('./test/tally.mjs').Tally[]} */
const tallies = [];
/** What must be ended or deleted, latest first. @type {(() => Promise<void> | void)[]} */
const cleanUps = [];
const interruption = new AbortController();

surviveClosedOutput();
whenAskedToStop((reason) => {
  say(`\nStopping (${reason}) ...`);
  interruption.abort();
  stopRunningSteps();
});

try {
  await runPlan(readTestPlan(process.argv.slice(2)));
} catch (error) {
  if (!interruption.signal.aborted) explain(error);
  tallies.push({ passed: 0, failed: 1, notes: [interruption.signal.aborted ? 'The tests were interrupted.' : 'The tests could not be brought to their end.'] });
}
for (const cleanUp of cleanUps.reverse()) {
  try {
    await cleanUp();
  } catch (error) {
    tallies.push({ passed: 0, failed: 1, notes: [`Cleaning up failed: ${error.message}`] });
  }
}
const total = addTallies(tallies);
say(['', ...total.notes, summaryLine(total)].join('\n'));
process.exit(total.failed > 0 ? 1 : 0);

/** @param {import('./test/arguments.mjs').TestPlan} plan */
async function runPlan({ parts, filters }) {
  await step(() => installPackages(root, { development: true, logFile: path.join(logs, 'packages.log') }));
  const has = (part) => parts.includes(part);
  // What is missing is said before minutes of tests, not after them.
  if (has('integration') || has('e2e')) requireMariadb();
  const chromium = has('e2e') ? requireChromium() : null;

  const inspections = [...(has('lint') ? [lint] : []), ...(has('typecheck') ? [checkTypes] : [])];
  await step(() => Promise.all(inspections.map((inspect) => inspect())));
  if (has('pure')) {
    const folder = mkdtempSync(path.join(home, 'report-'));
    cleanUps.push(() => rmSync(folder, { recursive: true, force: true }));
    await step(() => runProject({ project: 'pure', folder, filters, environment: withoutServiceSettings(process.env) }));
  }
  if (!has('integration') && !has('e2e')) return;

  say('Starting a throw-away database ...');
  const database = await step(() => startThrowAwayDatabase({ home, prefix: 'test', databases: ['heddle_test', 'heddle_e2e'] }), (made) => cleanUps.push(made.remove));
  if (has('integration')) {
    const environment = testEnvironment(database, 'heddle_test', { url: 'http://localhost:3000' });
    await runScript('migrate', environment);
    await step(() => runProject({ project: 'integration', folder: database.folder, filters, environment }));
  }
  if (has('e2e')) await runEndToEnd({ database, filters, chromium });
}

/** Ends the plan here when somebody has asked to stop. `keep` is told the result first, so that what was started gets ended. */
async function step(work, keep) {
  interruption.signal.throwIfAborted();
  const result = await work();
  keep?.(result);
  interruption.signal.throwIfAborted();
  return result;
}

function testEnvironment(database, name, { url }) {
  const dataFolder = path.join(database.folder, `${name}-data`);
  mkdirSync(dataFolder, { recursive: true });
  const values = { secret, databaseUrl: database.server.url(name), dataFolder, url, demonstration: true, nodeEnvironment: 'test' };
  return { ...serviceEnvironment(values, withoutServiceSettings(process.env)), HEDDLE_TEST: '1', LOG_LEVEL: 'warn' };
}

async function lint() {
  await inspect('lint', [path.join(root, 'node_modules', 'eslint', 'bin', 'eslint.js'), '.', '--max-warnings', '0']);
}

async function checkTypes() {
  // Types of routes are made by the framework; stale ones of an older tree would be checked instead.
  if (readdirSync(path.join(root, 'app')).length > 0) {
    const logFile = path.join(logs, 'typegen.log');
    const end = await runToEnd({ command: process.execPath, parameters: [nextCommand(root), 'typegen'], cwd: root, logFile, env: { ...withoutServiceSettings(process.env), NEXT_TELEMETRY_DISABLED: '1' } });
    if (end.code !== 0) say(`${lastLines(logFile)}\nThe types of the routes could not be made.`);
  }
  await inspect('typecheck', [path.join(root, 'node_modules', 'typescript', 'bin', 'tsc'), '--noEmit']);
}

/** Lint and typecheck count as one test each. */
async function inspect(name, parameters) {
  const logFile = path.join(logs, `${name}.log`);
  const end = await runToEnd({ command: process.execPath, parameters, cwd: root, logFile, env: withoutServiceSettings(process.env) });
  const passed = end.code === 0;
  if (!passed) say(lastLines(logFile, 200));
  say(`${name} ${passed ? 'passed' : 'failed'}`);
  tallies.push({ passed: passed ? 1 : 0, failed: passed ? 0 : 1, notes: passed ? [] : [`${name} failed; all of its output: ${logFile}`] });
}

async function runProject(run) {
  tallies.push(await runVitest({ root, ...run }));
}

async function runScript(name, environment) {
  const end = await step(() => runToEnd({ command: process.execPath, parameters: ['--import', 'tsx', path.join('scripts', `${name}.ts`)], cwd: root, env: environment }));
  if (end.code !== 0) throw new Stop(`scripts/${name}.ts failed; its message stands above.`);
}

/** A server like people use it: built, seeded with the demonstration, with a worker, on a database of its own. */
async function runEndToEnd({ database, filters, chromium }) {
  const serving = () => runs(readRecord(path.join(home, 'start.lock')));
  await step(() => buildWhenNeeded(root, { home, logs, serving }));
  const port = await freePort();
  const url = `http://localhost:${port}`;
  const environment = testEnvironment(database, 'heddle_e2e', { url });
  await runScript('migrate', environment);
  await runScript('seed', environment);
  const service = await step(
    () => startService({ root, home: database.folder, logs: database.logs, host: '127.0.0.1', port, environment: { ...environment, NODE_ENV: 'production' } }),
    (started) => cleanUps.push(started.stop),
  );
  await waitUntilHealthy(service, { host: '127.0.0.1', port, signal: interruption.signal });
  await step(() => runProject({ project: 'e2e', folder: database.folder, filters, environment: { ...environment, HEDDLE_CHROMIUM: chromium, HEDDLE_E2E_URL: url } }));
  for (const [name, program, logFile] of [['web server', service.web, service.webLog], ['worker', service.worker, service.workerLog]]) {
    if (program.unexpectedEnds === 0) continue;
    say(`--- the last lines of the ${name}'s log\n${lastLines(logFile, 60)}\n---`);
    tallies.push({ passed: 0, failed: 1, notes: [`e2e: the ${name} ended unexpectedly ${program.unexpectedEnds} times during the tests.`] });
  }
}
