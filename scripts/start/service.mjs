import path from 'node:path';

import { nextCommand } from './build.mjs';
import { Stop } from './messages.mjs';
import { keepRunning } from './processes.mjs';

/** A worker first brings its present batch to an end. */
const stopGraceMs = 20_000;

/**
 * Starts web and worker, kept running until `stop`.
 * @param {{ root: string, home: string, logs: string, host: string, port: number, environment: NodeJS.ProcessEnv, development?: boolean }} options home: where it is recorded who runs
 */
export function startService({ root, home, logs, host, port, environment, development = false }) {
  const common = { command: process.execPath, cwd: root, env: environment, echo: development };
  const webLog = path.join(logs, 'web.log');
  const workerLog = path.join(logs, 'worker.log');
  const web = keepRunning({
    ...common,
    name: 'web server',
    parameters: [nextCommand(root), development ? 'dev' : 'start', '-p', String(port), '-H', host],
    logFile: webLog,
    recordFile: path.join(home, 'web.json'),
  });
  const worker = keepRunning({
    ...common,
    name: 'worker',
    parameters: [...(development ? ['--watch', '--watch-preserve-output'] : []), '--import', 'tsx', path.join('lib', 'jobs', 'worker.ts')],
    logFile: workerLog,
    recordFile: path.join(home, 'worker.json'),
  });
  return {
    web,
    worker,
    webLog,
    workerLog,
    stop: async () => {
      await Promise.all([web.stop(stopGraceMs), worker.stop(stopGraceMs)]);
    },
  };
}

/**
 * Waits until `GET /api/health` answers `{ status: 'ok' }`, which it does once database and worker are there. Throws a Stop when web or worker cannot keep up, or nothing good was heard in time.
 * @param {ReturnType<typeof startService>} service
 * @param {{ host: string, port: number, limitMs?: number, signal?: AbortSignal }} options
 */
export async function waitUntilHealthy(service, { host, port, limitMs = 120_000, signal }) {
  const address = healthAddress(host, port);
  let lastAnswer = 'nothing';
  for (const end = Date.now() + limitMs; Date.now() < end; ) {
    signal?.throwIfAborted();
    if (service.web.unexpectedEnds > 0) throw new Stop('The web server ended while starting.', { logFile: service.webLog });
    // A worker may meet the database a moment too early once, not twice.
    if (service.worker.unexpectedEnds > 1) throw new Stop('The worker ended while starting.', { logFile: service.workerLog });
    try {
      const response = await fetch(address, { signal: AbortSignal.timeout(10_000) });
      const body = await response.text();
      if (response.ok && saysOk(body)) return;
      lastAnswer = `${response.status} ${body.slice(0, 500)}`;
    } catch (error) {
      lastAnswer = error.cause?.message ?? error.message;
    }
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
  throw new Stop(`The service did not become healthy within ${Math.round(limitMs / 1000)} s. ${address} last said: ${lastAnswer}`, { logFile: service.webLog });
}

/** @param {string} body */
export function saysOk(body) {
  try {
    return JSON.parse(body)?.status === 'ok';
  } catch (error) {
    if (error instanceof SyntaxError) return false;
    throw error;
  }
}

/**
 * Where to ask from this machine: a server on all interfaces is asked on loopback.
 * @param {string} host
 * @param {number} port
 */
export function healthAddress(host, port) {
  const reachable = host === '0.0.0.0' ? '127.0.0.1' : host === '::' ? '::1' : host;
  return `http://${reachable.includes(':') ? `[${reachable}]` : reachable}:${port}/api/health`;
}
