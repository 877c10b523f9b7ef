import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, statSync, utimesSync, writeFileSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import path from 'node:path';

import { afterEach, beforeEach, describe, expect, it } from 'vitest';

import { hashSources } from '@/scripts/start/build.mjs';
import { defaultPoolBytes, serverParameters, statementsAtStart } from '@/scripts/start/database.mjs';
import { identify, readRecord, runs, startInStat, writeRecord } from '@/scripts/start/identity.mjs';
import { takeLock } from '@/scripts/start/lock.mjs';
import { lastLines, Stop } from '@/scripts/start/messages.mjs';
import { packagesOutOfStep, reasonInLog } from '@/scripts/start/packages.mjs';
import { freePort, greets, isGreeting, portState } from '@/scripts/start/ports.mjs';
import { keepRunning, runToEnd, secondsBeforeRestart, stopLeftBehind } from '@/scripts/start/processes.mjs';
import { findProgram } from '@/scripts/start/programs.mjs';
import { healthAddress, saysOk } from '@/scripts/start/service.mjs';
import { keptSecret, readStartSettings, serviceEnvironment, withoutServiceSettings } from '@/scripts/start/settings.mjs';

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(path.join(tmpdir(), 'heddle-scripts-'));
});
afterEach(() => {
  rmSync(folder, { recursive: true, force: true });
});

/** A process that lives until it is ended. */
async function sleeper() {
  const child = spawn(process.execPath, ['-e', 'console.log("up"); setInterval(() => {}, 1000)'], { detached: true, stdio: ['ignore', 'pipe', 'ignore'] });
  await once(child.stdout, 'data');
  return child;
}

async function until(condition: () => boolean): Promise<void> {
  for (const end = Date.now() + 20_000; !condition(); ) {
    if (Date.now() > end) throw new Error('waited for 20 s in vain');
    await new Promise((resolve) => setTimeout(resolve, 20));
  }
}

describe('settings of npm start', () => {
  it('starts on loopback, port 3000, with the demonstration, unless told otherwise', () => {
    expect(readStartSettings([], {})).toEqual({ development: false, port: 3000, host: '127.0.0.1', url: 'http://localhost:3000', demonstration: true, databaseUrl: null });
  });

  it('takes port, host, address, demonstration and database from the environment', () => {
    const given = { HEDDLE_PORT: '8080', HEDDLE_HOST: '0.0.0.0', HEDDLE_URL: 'https://library.example', HEDDLE_DEMO: 'off', DATABASE_URL: 'mariadb://a:b@c/d' };
    expect(readStartSettings(['--dev'], given)).toEqual({ development: true, port: 8080, host: '0.0.0.0', url: 'https://library.example', demonstration: false, databaseUrl: 'mariadb://a:b@c/d' });
  });

  it.each(['0', '65536', '-1', '3e3', '80 ', 'web'])('refuses the port %j', (port) => {
    expect(() => readStartSettings([], { HEDDLE_PORT: port })).toThrow(Stop);
  });

  it('refuses unknown parameters and a demonstration that is neither on nor off', () => {
    expect(() => readStartSettings(['--development'], {})).toThrow(/--development/);
    expect(() => readStartSettings([], { HEDDLE_DEMO: 'yes' })).toThrow(/on or off/);
  });

  it('gives the framework and the application the same secret and address', () => {
    const made = serviceEnvironment({ secret: 's', databaseUrl: 'd', dataFolder: 'f', url: 'u', demonstration: false, nodeEnvironment: 'production' }, { PATH: '/bin', HEDDLE_DEMO: 'on' });
    expect(made).toMatchObject({ PATH: '/bin', HEDDLE_SECRET: 's', NEXTAUTH_SECRET: 's', HEDDLE_URL: 'u', NEXTAUTH_URL: 'u', HEDDLE_DEMO: 'off', DATABASE_URL: 'd', HEDDLE_DATA: 'f', NODE_ENV: 'production' });
  });

  it('keeps a tester’s own database and mail server out of the tests', () => {
    expect(withoutServiceSettings({ PATH: '/bin', DATABASE_URL: 'x', SMTP_URL: 'x', HEDDLE_DATA: 'x', NEXTAUTH_URL: 'x', REDIS_URL: 'x', NODE_ENV: 'production' })).toEqual({ PATH: '/bin' });
  });

  it('makes a secret once, readable for its owner only', () => {
    const file = path.join(folder, 'secret');
    const first = keptSecret(file);
    expect(first).toMatch(/^[\w-]{43}$/);
    expect(statSync(file).mode & 0o777).toBe(0o600);
    expect(keptSecret(file)).toBe(first);
  });

  it('refuses a secret file that was emptied instead of running with none', () => {
    writeFileSync(path.join(folder, 'secret'), '\n');
    expect(() => keptSecret(path.join(folder, 'secret'))).toThrow(Stop);
  });
});

describe('who runs', () => {
  it('finds the start of a process whose name holds brackets and spaces, and none for a zombie', () => {
    const fields = 'S 1 2 3 4 5 6 7 8 9 10 11 12 13 14 15 16 17 18 4711 20';
    expect(startInStat(`12 (a) b) ${fields}`)).toBe('4711');
    expect(startInStat(`12 (a) ${fields.replace('S', 'Z')}`)).toBeNull();
  });

  it('does not take another process of the same number for the one that was recorded', () => {
    const mine = identify(process.pid)!;
    expect(runs(mine)).toBe(true);
    expect(runs({ ...mine, started: `${mine.started}0` })).toBe(false);
    expect(runs({ pid: 2 ** 22 + 1, started: '1' })).toBe(false);
  });

  it('treats a half-written record as none', () => {
    const file = path.join(folder, 'web.json');
    writeFileSync(file, '{"pid":12');
    expect(readRecord(file)).toBeNull();
    expect(readRecord(path.join(folder, 'missing.json'))).toBeNull();
  });

  it('gives a lock to one only, and again after its release', () => {
    const file = path.join(folder, 'start.lock');
    const first = takeLock(file);
    expect(takeLock(file)).toEqual({ held: false, pid: process.pid });
    if (first.held) first.release();
    expect(takeLock(file).held).toBe(true);
    expect(readdirSync(folder)).toEqual(['start.lock']);
  });

  it('takes over the lock of a process that is gone, and of a stranger who got its number', () => {
    const file = path.join(folder, 'start.lock');
    for (const stale of [{ pid: 2 ** 22 + 1, started: '1' }, { pid: process.ppid, started: '1' }]) {
      writeRecord(file, stale);
      expect(takeLock(file).held).toBe(true);
      expect(readRecord(file)?.pid).toBe(process.pid);
    }
  });
});

describe('processes', () => {
  it('starts a killed program again and records the new one', async () => {
    const recordFile = path.join(folder, 'worker.json');
    const kept = keepRunning({ name: 'worker', command: process.execPath, parameters: ['-e', 'setInterval(() => {}, 1000)'], cwd: folder, env: process.env, logFile: path.join(folder, 'worker.log'), recordFile });
    const first = kept.pid!;
    process.kill(first, 'SIGKILL');
    await until(() => kept.pid !== undefined && kept.pid !== first);
    expect(kept.unexpectedEnds).toBe(1);
    expect(readRecord(recordFile)?.pid).toBe(kept.pid);
    const second = identify(kept.pid!);
    await kept.stop(5_000);
    expect(runs(second)).toBe(false);
    expect(readRecord(recordFile)).toBeNull();
  });

  it('kills a program that does not heed the request to end', async () => {
    const stubborn = 'process.on("SIGTERM", () => {}); console.log("up"); setInterval(() => {}, 1000)';
    const logFile = path.join(folder, 'web.log');
    const kept = keepRunning({ name: 'web', command: process.execPath, parameters: ['-e', stubborn], cwd: folder, env: process.env, logFile, recordFile: path.join(folder, 'web.json') });
    await until(() => lastLines(logFile) === 'up');
    const identity = identify(kept.pid!);
    await kept.stop(200);
    expect(runs(identity)).toBe(false);
  });

  it('stops what an earlier start left behind, but never a stranger', async () => {
    const child = await sleeper();
    const recordFile = path.join(folder, 'database.json');
    const identity = identify(child.pid!)!;
    writeRecord(recordFile, { pid: identity.pid, started: '1' });
    await stopLeftBehind(recordFile, { name: 'database', graceMs: 2_000 });
    expect(runs(identity)).toBe(true);
    writeRecord(recordFile, { ...identity, port: 4000 });
    expect((await stopLeftBehind(recordFile, { name: 'database', graceMs: 2_000 }))?.port).toBe(4000);
    expect(runs(identity)).toBe(false);
    expect(readRecord(recordFile)).toBeNull();
  });

  it('reports how a step ended and keeps its output', async () => {
    const logFile = path.join(folder, 'step.log');
    const end = await runToEnd({ command: process.execPath, parameters: ['-e', 'console.log("said"); process.exit(3)'], cwd: folder, logFile });
    expect(end).toEqual({ code: 3, signal: null });
    expect(lastLines(logFile)).toBe('said');
    await expect(runToEnd({ command: path.join(folder, 'missing'), parameters: [], cwd: folder, logFile })).rejects.toThrow(/ENOENT/);
  });

  it('waits longer with each failure in a row, half a minute at most', () => {
    expect([1, 2, 3, 4, 5, 6, 60].map(secondsBeforeRestart)).toEqual([1, 2, 4, 8, 16, 30, 30]);
  });
});

describe('ports', () => {
  it('finds a free port and tells a taken one', async () => {
    const server = createServer().listen(0, '127.0.0.1');
    await once(server, 'listening');
    const { port } = server.address() as AddressInfo;
    expect(await portState(port)).toBe('taken');
    expect(await freePort(port)).not.toBe(port);
    server.close();
    await once(server, 'close');
    expect(await portState(port)).toBe('free');
    expect(await freePort(port)).toBe(port);
  });

  it('takes only the greeting of a database for an answer', async () => {
    expect(isGreeting(Uint8Array.from([90, 0, 0, 0, 10, 53]))).toBe(true);
    expect(isGreeting(Uint8Array.from([90, 0, 0, 0, 255, 16]))).toBe(false);
    const server = createServer((socket) => socket.end('HTTP/1.1 400 Bad Request\r\n')).listen(0, '127.0.0.1');
    await once(server, 'listening');
    const { port } = server.address() as AddressInfo;
    expect(await greets(port)).toBe(false);
    server.close();
    await once(server, 'close');
    expect(await greets(port)).toBe(false);
  });

  it('asks a server on all interfaces over loopback', () => {
    expect(healthAddress('0.0.0.0', 3000)).toBe('http://127.0.0.1:3000/api/health');
    expect(healthAddress('::', 3000)).toBe('http://[::1]:3000/api/health');
    expect(healthAddress('10.0.0.5', 80)).toBe('http://10.0.0.5:80/api/health');
  });

  it('takes only an answer of good health for one', () => {
    expect(saysOk('{"status":"ok"}')).toBe(true);
    expect(saysOk('{"status":"degraded"}')).toBe(false);
    expect(saysOk('<html>')).toBe(false);
  });
});

describe('what must be done again', () => {
  it('builds anew when content or names change, not when times do', () => {
    mkdirSync(path.join(folder, 'app'));
    const page = path.join(folder, 'app', 'page.tsx');
    writeFileSync(page, 'one');
    const first = hashSources(folder, ['app', 'lib']);
    utimesSync(page, 1, 1);
    expect(hashSources(folder, ['app', 'lib'])).toBe(first);
    writeFileSync(page, 'two');
    const second = hashSources(folder, ['app', 'lib']);
    expect(second).not.toBe(first);
    writeFileSync(path.join(folder, 'app', 'empty.ts'), '');
    expect(hashSources(folder, ['app', 'lib'])).not.toBe(second);
  });

  it('installs when a package is missing, of another version or of other content', () => {
    const locked = { '': {}, 'node_modules/a': { version: '1.0.0', integrity: 'x' }, 'node_modules/a/node_modules/b': { version: '2.0.0', integrity: 'y' } };
    expect(packagesOutOfStep(locked, locked, { development: true })).toEqual([]);
    expect(packagesOutOfStep(locked, { 'node_modules/a': { version: '1.0.0', integrity: 'x' } }, { development: true })).toEqual(['b']);
    expect(packagesOutOfStep(locked, { ...locked, 'node_modules/a': { version: '1.0.0', integrity: 'z' } }, { development: true })).toEqual(['a']);
    expect(packagesOutOfStep(locked, { ...locked, 'node_modules/a': { version: '1.0.1', integrity: 'x' } }, { development: true })).toEqual(['a']);
  });

  it('shows what npm found wrong rather than the manual that follows it', () => {
    const manual = Array.from({ length: 60 }, () => 'npm error [--install-links]').join('\n');
    expect(reasonInLog(`npm warn old\nnpm error code EUSAGE\nnpm error Missing: a@1\n${manual}\n`)).toMatch(/^npm error code EUSAGE\nnpm error Missing: a@1\n/);
    expect(reasonInLog('killed\n')).toBe('killed');
  });

  it('does not miss packages for other systems, nor those of tests where they are not needed', () => {
    const locked = { 'node_modules/other-system': { version: '1.0.0', optional: true }, 'node_modules/tester': { version: '1.0.0', dev: true } };
    expect(packagesOutOfStep(locked, {}, { development: false })).toEqual([]);
    expect(packagesOutOfStep(locked, {}, { development: true })).toEqual(['tester']);
  });
});

describe('the database server of our own', () => {
  const place = { dataFolder: '/d', socket: '/s', port: 4000, pidFile: '/p', firstStatements: '/f', temporary: '/t', poolBytes: 1024 };

  it('reads no configuration of the machine and listens on loopback only', () => {
    const parameters = serverParameters({ ...place, purpose: 'kept' });
    expect(parameters[0]).toBe('--no-defaults');
    expect(parameters).toContain('--bind-address=127.0.0.1');
  });

  it('gives up safety on disk only where the data is thrown away', () => {
    expect(serverParameters({ ...place, purpose: 'kept' })).toContain('--innodb-flush-log-at-trx-commit=1');
    expect(serverParameters({ ...place, purpose: 'kept' })).not.toContain('--skip-innodb-doublewrite');
    expect(serverParameters({ ...place, purpose: 'throwAway' })).toContain('--innodb-flush-log-at-trx-commit=2');
  });

  it('uses a quarter of the memory, one gibibyte at most', () => {
    const gibibyte = 1024 ** 3;
    expect(defaultPoolBytes(24 * gibibyte)).toBe(gibibyte);
    expect(defaultPoolBytes(2 * gibibyte)).toBe(gibibyte / 2);
    expect(defaultPoolBytes(1)).toBe(64 * 1024 ** 2);
  });

  it('lets the application reach its own databases over loopback and nothing else', () => {
    const grants = statementsAtStart(['heddle_test'], 'secret').filter((statement) => statement.startsWith('GRANT'));
    expect(grants).toEqual(["GRANT ALL PRIVILEGES ON `heddle\\_test`.* TO 'heddle'@'127.0.0.1';", "GRANT ALL PRIVILEGES ON `heddle\\_%`.* TO 'heddle'@'127.0.0.1';"]);
  });

  it('puts each statement on one line, as the server wants them', () => {
    for (const statement of statementsAtStart(['heddle'], 'secret')) expect(statement).toMatch(/^[^\n]*;$/);
  });
});

describe('what is found and shown', () => {
  it('finds the first program that may be run, passing over folders and plain files', () => {
    mkdirSync(path.join(folder, 'mariadbd'));
    writeFileSync(path.join(folder, 'mysqld'), '', { mode: 0o644 });
    expect(findProgram(['mariadbd', 'mysqld'], folder)).toBeNull();
    writeFileSync(path.join(folder, 'server'), '', { mode: 0o755 });
    expect(findProgram(['mariadbd', 'server'], `/nowhere:${folder}`)).toBe(path.join(folder, 'server'));
  });

  it('shows the end of a log, however long it is', () => {
    const log = path.join(folder, 'web.log');
    writeFileSync(log, `${Array.from({ length: 50_000 }, (_, index) => `line ${index}`).join('\n')}\n`);
    expect(lastLines(log, 2)).toBe('line 49998\nline 49999');
    expect(lastLines(path.join(folder, 'missing.log'))).toBe('');
    expect(readFileSync(log, 'utf8').length).toBeGreaterThan(64 * 1024);
  });
});
