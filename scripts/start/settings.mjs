import { randomBytes } from 'node:crypto';
import { chmodSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';

import { Stop } from './messages.mjs';

/** @typedef {{ development: boolean, port: number, host: string, url: string, demonstration: boolean, databaseUrl: string | null }} StartSettings */

/**
 * What `npm start` was asked to do.
 * @param {string[]} parameters of the command line
 * @param {Record<string, string | undefined>} given environment
 * @returns {StartSettings}
 */
export function readStartSettings(parameters, given) {
  const unknown = parameters.find((parameter) => parameter !== '--dev');
  if (unknown !== undefined) throw new Stop(`"${unknown}" is not known here. The only parameter is --dev; settings are environment variables (HEDDLE_PORT, HEDDLE_HOST, HEDDLE_URL, HEDDLE_DEMO, DATABASE_URL).`);
  const port = readPort(given.HEDDLE_PORT);
  const demo = given.HEDDLE_DEMO || 'on';
  if (demo !== 'on' && demo !== 'off') throw new Stop(`HEDDLE_DEMO must be on or off, not "${demo}".`);
  return {
    development: parameters.includes('--dev'),
    port,
    host: given.HEDDLE_HOST || '127.0.0.1',
    url: given.HEDDLE_URL || `http://localhost:${port}`,
    demonstration: demo === 'on',
    databaseUrl: given.DATABASE_URL || null,
  };
}

function readPort(text) {
  if (text === undefined || text === '') return 3000;
  const port = Number(text);
  if (!/^\d+$/.test(text) || port < 1 || port > 65_535) throw new Stop(`HEDDLE_PORT must be a number from 1 to 65535, not "${text}".`);
  return port;
}

/**
 * The environment of migrations, seeding, web and worker.
 * @param {{ secret: string, databaseUrl: string, dataFolder: string, url: string, demonstration: boolean, nodeEnvironment: string }} values
 * @param {Record<string, string | undefined>} base
 */
export function serviceEnvironment(values, base) {
  return {
    ...base,
    HEDDLE_SECRET: values.secret,
    NEXTAUTH_SECRET: values.secret,
    DATABASE_URL: values.databaseUrl,
    HEDDLE_DATA: values.dataFolder,
    HEDDLE_URL: values.url,
    NEXTAUTH_URL: values.url,
    HEDDLE_DEMO: values.demonstration ? 'on' : 'off',
    NODE_ENV: values.nodeEnvironment,
    NEXT_TELEMETRY_DISABLED: '1',
  };
}

/**
 * The environment without this person's own settings of the service: tests must not depend on them, still less write to their database.
 * @param {Record<string, string | undefined>} given
 */
export function withoutServiceSettings(given) {
  const own = /^(HEDDLE_|NEXTAUTH_|DATABASE_|SMTP_|MAIL_|S3_|REDIS_)/;
  return Object.fromEntries(Object.entries(given).filter(([name]) => !own.test(name) && name !== 'LOG_LEVEL' && name !== 'NODE_ENV'));
}

/**
 * A random secret that is made once and kept in a file that only its owner can read.
 * @param {string} file
 * @returns {string} at least 43 characters of the URL-safe alphabet
 */
export function keptSecret(file) {
  const fresh = randomBytes(32).toString('base64url');
  try {
    writeFileSync(file, `${fresh}\n`, { mode: 0o600, flag: 'wx' });
    return fresh;
  } catch (error) {
    if (error.code !== 'EEXIST') throw error;
  }
  chmodSync(file, 0o600);
  const kept = readFileSync(file, 'utf8').trim();
  if (!/^[\w-]{32,}$/.test(kept)) throw new Stop(`${file} does not hold a usable secret. Delete it to have a new one made.`);
  return kept;
}

/**
 * The project's own folder for everything that must not get into git, with the folders in it.
 * @param {string} root of the project
 */
export function prepareHome(root) {
  const home = path.join(root, '.heddle');
  const logs = path.join(home, 'logs');
  const data = path.join(home, 'data');
  mkdirSync(home, { recursive: true, mode: 0o700 });
  for (const folder of [logs, data]) mkdirSync(folder, { recursive: true });
  return { home, logs, data };
}
