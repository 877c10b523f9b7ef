import { execFileSync, spawnSync } from 'node:child_process';
import { accessSync, constants, statSync } from 'node:fs';
import path from 'node:path';

import { say, Stop } from './messages.mjs';

// An ordinary user's PATH on Debian has no sbin, yet the server lies there.
const furtherFolders = ['/usr/sbin', '/usr/local/sbin', '/usr/libexec', '/usr/local/bin', '/usr/bin', '/opt/homebrew/bin', '/opt/homebrew/opt/mariadb/bin'];

/**
 * The path of the first of these programs that this user may run.
 * @param {string[]} names
 * @param {string} [searchPath]
 * @returns {string | null}
 */
export function findProgram(names, searchPath = [process.env.PATH ?? '', ...furtherFolders].join(path.delimiter)) {
  for (const name of names) {
    for (const folder of searchPath.split(path.delimiter)) {
      if (folder && mayRun(path.join(folder, name))) return path.join(folder, name);
    }
  }
  return null;
}

function mayRun(file) {
  try {
    accessSync(file, constants.X_OK);
    return statSync(file).isFile();
  } catch (error) {
    if (['ENOENT', 'EACCES', 'ENOTDIR', 'ELOOP'].includes(error.code)) return false;
    throw error;
  }
}

/** @returns {{ server: string, install: string } | null} */
function findMariadb() {
  const server = findProgram(['mariadbd', 'mysqld']);
  const install = findProgram(['mariadb-install-db', 'mysql_install_db']);
  // The set-up program calls this one; Debian ships it with the client.
  const defaults = findProgram(['my_print_defaults']);
  if (!server || !install || !defaults) return null;
  // mysqld may also be another server of the same family, which lacks what the migrations use.
  const version = execFileSync(server, ['--no-defaults', '--version'], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] });
  return /mariadb/i.test(version) ? { server, install } : null;
}

/** @returns {string | null} */
function findChromium() {
  const given = process.env.HEDDLE_CHROMIUM;
  if (given) {
    if (!mayRun(given)) throw new Stop(`HEDDLE_CHROMIUM names ${given}, which cannot be run.`);
    return given;
  }
  return findProgram(['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable']);
}

/** The MariaDB programs, installed first when root runs this on Debian and they are missing. */
export function requireMariadb() {
  // The -core packages hold the programs without any service of their own: nothing gets started, no server of the machine's is touched.
  return requireProgram('MariaDB', ['mariadb-server-core', 'mariadb-client-core'], findMariadb);
}

/** The browser of the end-to-end tests, installed like MariaDB. */
export function requireChromium() {
  return requireProgram('Chromium', ['chromium'], findChromium);
}

/**
 * @template Found
 * @param {string} title
 * @param {string[]} debianPackages
 * @param {() => Found | null} find
 * @returns {Found}
 */
function requireProgram(title, debianPackages, find) {
  const found = find();
  if (found) return found;
  const names = debianPackages.join(' ');
  const apt = findProgram(['apt-get']);
  if (!apt) throw new Stop(`${title} is missing on this machine. Install it (on Debian: ${names}) and start again.`);
  if (process.getuid?.() !== 0) {
    throw new Stop(`${title} is missing on this machine. Install it with this one command and start again:\n  sudo sh -c 'apt-get update && apt-get install -y --no-install-recommends ${names}'`);
  }
  say(`Installing ${title} (${names}) ...`);
  runApt(apt, ['update']);
  runApt(apt, ['install', '-y', '--no-install-recommends', ...debianPackages]);
  const installed = find();
  if (!installed) throw new Stop(`${names} was installed, yet ${title} is still not found.`);
  return installed;
}

function runApt(apt, parameters) {
  const run = spawnSync(apt, ['-q', ...parameters], {
    encoding: 'utf8',
    stdio: ['ignore', 'pipe', 'pipe'],
    maxBuffer: 64 * 1024 * 1024,
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
  });
  if (run.status === 0) return;
  const tail = `${run.stdout ?? ''}${run.stderr ?? ''}`.trimEnd().split('\n').slice(-15).join('\n');
  throw new Stop(`${tail}\napt-get ${parameters.join(' ')} failed (${run.error?.message ?? `exit code ${run.status}`}).`);
}
