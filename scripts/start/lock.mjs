import { linkSync, renameSync, rmSync, writeFileSync } from 'node:fs';

import { dropRecord, identify, readRecord, runs } from './identity.mjs';

/**
 * Takes a lock file for this process. A lock whose holder no longer runs is taken over.
 * The file appears complete in one step (a link to a finished file), so that nobody ever reads half of it.
 * @param {string} file
 * @returns {{ held: true, release: () => void } | { held: false, pid: number }}
 */
export function takeLock(file) {
  const mine = identify(process.pid);
  const draft = `${file}.${process.pid}.draft`;
  writeFileSync(draft, `${JSON.stringify(mine)}\n`, { mode: 0o600 });
  try {
    for (;;) {
      try {
        linkSync(draft, file);
        return { held: true, release: () => release(file) };
      } catch (error) {
        if (error.code !== 'EEXIST') throw error;
      }
      const holder = readRecord(file);
      if (holder && runs(holder)) return { held: false, pid: holder.pid };
      setAside(file, holder);
    }
  } finally {
    rmSync(draft, { force: true });
  }
}

/** Moves a stale lock away. If another start took it over in the meantime, what was moved is that one's lock: it goes back. */
function setAside(file, stale) {
  const aside = `${file}.${process.pid}.stale`;
  try {
    renameSync(file, aside);
  } catch (error) {
    if (error.code === 'ENOENT') return;
    throw error;
  }
  const moved = readRecord(aside);
  if (moved && moved.pid !== stale?.pid && runs(moved)) linkSync(aside, file);
  rmSync(aside, { force: true });
}

function release(file) {
  if (readRecord(file)?.pid === process.pid) dropRecord(file);
}
