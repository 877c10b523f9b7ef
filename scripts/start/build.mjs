import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import path from 'node:path';

import { takeLock } from './lock.mjs';
import { say, Stop } from './messages.mjs';
import { runToEnd } from './processes.mjs';

/** Everything that ends up in the built application. */
const buildSources = ['app', 'components', 'lib', 'models', 'public', 'next.config.mjs', 'postcss.config.mjs', 'tailwind.config.ts', 'tsconfig.json', 'package.json', 'package-lock.json'];

/**
 * A hash over names and contents of the given files and folders below `root`; what does not exist counts as absent.
 * Contents rather than times: a fresh checkout or a switched branch changes times only.
 * @param {string} root
 * @param {string[]} [sources]
 * @returns {string} 64 hexadecimal digits
 */
export function hashSources(root, sources = buildSources) {
  const hash = createHash('sha256');
  for (const source of sources) addToHash(hash, root, source);
  return hash.digest('hex');
}

function addToHash(hash, root, relative) {
  const full = path.join(root, relative);
  if (!existsSync(full)) return;
  if (statSync(full).isDirectory()) {
    for (const name of readdirSync(full).sort()) addToHash(hash, root, path.posix.join(relative, name));
    return;
  }
  const content = readFileSync(full);
  hash.update(`${relative}\0${content.length}\0`).update(content);
}

/** The program behind a package's command, run by this Node itself: no shell in between that would swallow signals. */
export function nextCommand(root) {
  return path.join(root, 'node_modules', 'next', 'dist', 'bin', 'next');
}

/**
 * Runs `next build` when there is no build or its sources have changed since.
 * @param {string} root
 * @param {{ home: string, logs: string, serving?: () => boolean }} options serving: whether somebody is served from the present build right now
 */
export async function buildWhenNeeded(root, { home, logs, serving = () => false }) {
  const lock = takeLock(path.join(home, 'build.lock'));
  if (!lock.held) throw new Stop(`Another process (${lock.pid}) is building this clone just now. Try again when it is done.`);
  try {
    // The stamp lies in the build's own folder: who deletes the one deletes the other. It is taken before the build, since sources may change during it.
    const stampFile = path.join(root, '.next', 'sources.sha256');
    const stamp = hashSources(root);
    if (existsSync(path.join(root, '.next', 'BUILD_ID')) && existsSync(stampFile) && readFileSync(stampFile, 'utf8') === stamp) return;
    if (serving()) throw new Stop('The sources have changed since the last build, and `npm start` is serving that build from this clone. Stop it first: a new build would pull it away.');
    say('Building the application; this takes a minute or two ...');
    const logFile = path.join(logs, 'build.log');
    const end = await runToEnd({ command: process.execPath, parameters: [nextCommand(root), 'build'], cwd: root, logFile, env: { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' } });
    if (end.code !== 0) throw new Stop('The build failed.', { logFile });
    writeFileSync(stampFile, stamp);
  } finally {
    lock.release();
  }
}
