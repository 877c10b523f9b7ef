import { existsSync, readFileSync } from 'node:fs';
import path from 'node:path';

import { say, Stop } from './messages.mjs';
import { findProgram } from './programs.mjs';
import { runToEnd } from './processes.mjs';

/**
 * Which locked packages are not installed as locked. npm writes `node_modules/.package-lock.json` as the last act of an installation;
 * comparing it with the lockfile says more than a time stamp: a checkout that touches the lockfile costs nothing, an interrupted
 * installation is noticed.
 * @param {Record<string, { version?: string, resolved?: string, integrity?: string, optional?: boolean, devOptional?: boolean, dev?: boolean, link?: boolean }>} locked
 * @param {typeof locked} installed
 * @param {{ development: boolean }} need whether what only tests and linting use must be there as well
 * @returns {string[]}
 */
export function packagesOutOfStep(locked, installed, need) {
  return Object.entries(locked)
    .filter(([place, wanted]) => {
      if (place === '') return false;
      const present = installed[place];
      // Optional packages for other systems are locked but never installed here.
      if (!present) return !wanted.optional && !((wanted.dev || wanted.devOptional) && !need.development);
      return present.version !== wanted.version || present.integrity !== wanted.integrity;
    })
    .map(([place]) => place.replace(/^.*node_modules\//, ''));
}

/**
 * Runs `npm ci` when node_modules is missing or differs from the lockfile.
 * @param {string} root
 * @param {{ development: boolean, logFile: string }} options
 */
export async function installPackages(root, { development, logFile }) {
  const reason = reasonToInstall(root, development);
  if (!reason) return;
  const npm = findProgram(['npm']);
  if (!npm) throw new Stop('npm is missing on this machine; it comes with Node.js 20.');
  say(`Installing packages (${reason}) ...`);
  const end = await runToEnd({ command: npm, parameters: ['ci', '--include=dev', '--no-audit', '--no-fund'], cwd: root, logFile, env: { ...process.env, NODE_ENV: 'development' } });
  if (end.code !== 0) throw new Stop(`${reasonInLog(readFileSync(logFile, 'utf8'))}\n\`npm ci\` failed; all of its output: ${logFile}`);
}

/**
 * What npm says is wrong. It begins with its first error line; the last lines are its manual.
 * @param {string} log
 */
export function reasonInLog(log) {
  const lines = log.trimEnd().split('\n');
  const first = lines.findIndex((line) => /^npm (error|ERR!)/.test(line));
  return (first < 0 ? lines.slice(-15) : lines.slice(first, first + 15)).join('\n');
}

function reasonToInstall(root, development) {
  const hidden = path.join(root, 'node_modules', '.package-lock.json');
  if (!existsSync(hidden)) return 'none are installed yet';
  const locked = JSON.parse(readFileSync(path.join(root, 'package-lock.json'), 'utf8')).packages;
  const differing = packagesOutOfStep(locked, JSON.parse(readFileSync(hidden, 'utf8')).packages, { development });
  return differing.length === 0 ? null : `${differing.length} differ from package-lock.json, for one ${differing[0]}`;
}
