import { spawn } from 'node:child_process';
import { closeSync, openSync } from 'node:fs';

import { dropRecord, identify, readRecord, runs, writeRecord } from './identity.mjs';
import { say } from './messages.mjs';

/**
 * Every child gets a process group of its own: Ctrl-C in a terminal then reaches only this process, which stops the others in order
 * (the database last), and stopping a group also reaches what the child itself started.
 */

/** Children of `runToEnd` that run now, for `stopRunningSteps`. @type {Set<import('node:child_process').ChildProcess>} */
const runningSteps = new Set();

/**
 * Runs a program to its end. Its output goes to `logFile` when given, else to this process's own output.
 * @param {{ command: string, parameters: string[], cwd: string, env?: NodeJS.ProcessEnv, logFile?: string }} step
 * @returns {Promise<{ code: number | null, signal: string | null }>}
 */
export function runToEnd({ command, parameters, cwd, env = process.env, logFile }) {
  const log = logFile ? openSync(logFile, 'w', 0o600) : null;
  return new Promise((resolve, reject) => {
    const child = spawn(command, parameters, { cwd, env, detached: true, stdio: log === null ? ['ignore', 'inherit', 'inherit'] : ['ignore', log, log] });
    // The child has its own copy by now.
    if (log !== null) closeSync(log);
    runningSteps.add(child);
    child.once('error', (error) => {
      runningSteps.delete(child);
      reject(error);
    });
    child.once('close', (code, signal) => {
      runningSteps.delete(child);
      // A step that was killed leaves what it had started behind.
      if (child.pid) signalGroup(child.pid, 'SIGKILL');
      resolve({ code, signal });
    });
  });
}

/** Ends what `runToEnd` waits for, with everything it started. */
export function stopRunningSteps() {
  for (const child of runningSteps) {
    if (child.pid) signalGroup(child.pid, 'SIGTERM');
  }
}

/**
 * Seconds to wait before start number `failures + 1`: 1, 2, 4 ... 30.
 * @param {number} failures in a row
 */
export function secondsBeforeRestart(failures) {
  return Math.min(30, 2 ** Math.max(0, failures - 1));
}

/** Having run this long, an end counts as a new trouble, not as one more of the same. */
const steadyMs = 60_000;

/**
 * A program that is kept running until `stop`. Restarts are announced once `speak` was called: until it has come up, whoever waits for it says what went wrong.
 * @typedef {{ readonly pid: number | undefined, readonly unexpectedEnds: number, speak: () => void, stop: (graceMs: number) => Promise<void> }} Kept
 */

/**
 * Starts a program and starts it again whenever it ends by itself. Who runs is recorded in `recordFile`, so that the next start can
 * stop it should this process be killed.
 * @param {{ name: string, command: string, parameters: string[], cwd: string, env: NodeJS.ProcessEnv, logFile: string, recordFile: string, port?: number, echo?: boolean }} program
 *   echo: show its output, each line led by its name, instead of writing it to the log.
 * @returns {Kept}
 */
export function keepRunning({ name, command, parameters, cwd, env, logFile, recordFile, port, echo = false }) {
  let child;
  let timer;
  let stopping = false;
  let speaking = false;
  let failuresInARow = 0;
  let unexpectedEnds = 0;

  function launch() {
    const startedAt = Date.now();
    const log = openSync(logFile, 'a', 0o600);
    // The child writes to the file by itself: its output survives the end of this process, and no pipe breaks under it.
    child = spawn(command, parameters, { cwd, env, detached: true, stdio: echo ? ['ignore', 'pipe', 'pipe'] : ['ignore', log, log] });
    closeSync(log);
    if (echo) showLines(child, name);
    const identity = child.pid ? identify(child.pid) : null;
    if (identity) writeRecord(recordFile, { ...identity, ...(port ? { port } : {}) });
    let ended = false;
    const onEnd = (how) => {
      if (ended) return;
      ended = true;
      // What it had started itself must not outlive it, or the next one finds its port taken.
      if (child?.pid) signalGroup(child.pid, 'SIGKILL');
      child = undefined;
      if (stopping) return;
      dropRecord(recordFile);
      unexpectedEnds += 1;
      failuresInARow = Date.now() - startedAt > steadyMs ? 1 : failuresInARow + 1;
      const seconds = secondsBeforeRestart(failuresInARow);
      if (speaking) say(`The ${name} ended unexpectedly (${how}); starting it again in ${seconds} s.${echo ? '' : ` Its log: ${logFile}`}`);
      timer = setTimeout(launch, seconds * 1000);
    };
    child.once('error', (error) => onEnd(error.message));
    child.once('exit', (code, signal) => onEnd(signal ? `signal ${signal}` : `exit code ${code}`));
  }

  launch();
  return {
    get pid() {
      return child?.pid;
    },
    get unexpectedEnds() {
      return unexpectedEnds;
    },
    speak() {
      speaking = true;
    },
    async stop(graceMs) {
      stopping = true;
      clearTimeout(timer);
      if (child?.pid) await endGroup(child.pid, () => child === undefined, graceMs);
      dropRecord(recordFile);
    },
  };
}

/**
 * Stops a program that an earlier start left behind; harmless when it no longer runs or its number now belongs to another.
 * @param {string} recordFile
 * @param {{ name: string, graceMs: number }} options
 * @returns {Promise<(import('./identity.mjs').Identity & { port?: number }) | null>} the record as it was
 */
export async function stopLeftBehind(recordFile, { name, graceMs }) {
  const record = readRecord(recordFile);
  if (record && runs(record)) {
    say(`Stopping the ${name} that an earlier start left running ...`);
    await endGroup(record.pid, () => !runs(record), graceMs);
  }
  dropRecord(recordFile);
  return record;
}

async function endGroup(pid, ended, graceMs) {
  signalGroup(pid, 'SIGTERM');
  if (!(await within(graceMs, ended))) {
    signalGroup(pid, 'SIGKILL');
    await within(10_000, ended);
  }
}

function signalGroup(pid, signal) {
  try {
    process.kill(-pid, signal);
  } catch (error) {
    if (error.code !== 'ESRCH') throw error;
  }
}

/**
 * Whether `condition` came true in time; asked every 50 ms.
 * @param {number} limitMs
 * @param {() => boolean} condition
 */
async function within(limitMs, condition) {
  for (const end = Date.now() + limitMs; Date.now() < end; ) {
    if (condition()) return true;
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
  return condition();
}

function showLines(child, name) {
  for (const stream of [child.stdout, child.stderr]) {
    let rest = '';
    stream.setEncoding('utf8');
    stream.on('data', (chunk) => {
      const lines = (rest + chunk).split('\n');
      rest = lines.pop() ?? '';
      for (const line of lines) say(`${name.padEnd(10)} | ${line}`);
    });
    stream.on('end', () => rest && say(`${name.padEnd(10)} | ${rest}`));
  }
}
