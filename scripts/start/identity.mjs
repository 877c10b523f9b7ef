import { execFileSync } from 'node:child_process';
import { existsSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';

/**
 * Which process is meant. A number alone does not say: after a crash or a reboot the same number may belong to a stranger,
 * and stopping that one would be unforgivable. The moment it was started settles it.
 * @typedef {{ pid: number, started: string }} Identity
 */

/**
 * The start of a process in the system's own count; null when it does not run (a zombie no longer runs).
 * @param {number} pid
 * @returns {string | null}
 */
export function startOf(pid) {
  if (!Number.isInteger(pid) || pid <= 1) return null;
  if (existsSync('/proc/self/stat')) {
    let stat;
    try {
      stat = readFileSync(`/proc/${pid}/stat`, 'utf8');
    } catch (error) {
      if (error.code === 'ENOENT' || error.code === 'ESRCH') return null;
      throw error;
    }
    return startInStat(stat);
  }
  try {
    return execFileSync('ps', ['-o', 'lstart=', '-p', String(pid)], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] }).trim() || null;
  } catch (error) {
    // ps ends with 1 when it finds no such process.
    if (error.status === 1) return null;
    throw error;
  }
}

/**
 * Field 22 of /proc/PID/stat, null for a zombie. Counted from the last bracket, because a process may have any name, brackets and spaces included.
 * @param {string} stat
 * @returns {string | null}
 */
export function startInStat(stat) {
  const fields = stat.slice(stat.lastIndexOf(')') + 2).split(' ');
  return fields[0] === 'Z' || fields[0] === 'X' ? null : fields[19];
}

/**
 * @param {number} pid
 * @returns {Identity | null}
 */
export function identify(pid) {
  const started = startOf(pid);
  return started === null ? null : { pid, started };
}

/**
 * @param {Identity | null} identity
 * @returns {boolean}
 */
export function runs(identity) {
  return identity !== null && startOf(identity.pid) === identity.started;
}

/**
 * Reads a record written by `writeRecord`. Null when there is none or when it is no record (a half-written file of an older crash).
 * @param {string} file
 * @returns {(Identity & { port?: number }) | null}
 */
export function readRecord(file) {
  let text;
  try {
    text = readFileSync(file, 'utf8');
  } catch (error) {
    if (error.code === 'ENOENT') return null;
    throw error;
  }
  try {
    const value = JSON.parse(text);
    return Number.isInteger(value?.pid) && typeof value?.started === 'string' ? value : null;
  } catch (error) {
    if (error instanceof SyntaxError) return null;
    throw error;
  }
}

/**
 * @param {string} file
 * @param {Identity & { port?: number }} record
 */
export function writeRecord(file, record) {
  const next = `${file}.${process.pid}`;
  writeFileSync(next, `${JSON.stringify(record)}\n`, { mode: 0o600 });
  renameSync(next, file);
}

/** @param {string} file */
export function dropRecord(file) {
  rmSync(file, { force: true });
}
