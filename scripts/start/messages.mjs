import { closeSync, fstatSync, openSync, readSync } from 'node:fs';

/**
 * A reason to stop that a person can act on: printed without a stack trace, followed by the last lines of a log where one tells more.
 * Anything else that is thrown is a fault of ours and keeps its trace.
 */
export class Stop extends Error {
  /**
   * @param {string} message what is wrong and what to do about it
   * @param {{ logFile?: string }} [more]
   */
  constructor(message, more = {}) {
    super(message);
    this.name = 'Stop';
    this.logFile = more.logFile;
  }
}

/** @param {string} text */
export function say(text) {
  process.stdout.write(`${text}\n`);
}

/**
 * The end of a text file, read from its end so that a log of gigabytes costs nothing; '' when there is no such file.
 * @param {string} file
 * @param {number} [count] lines
 * @returns {string}
 */
export function lastLines(file, count = 25) {
  let handle;
  try {
    handle = openSync(file, 'r');
  } catch (error) {
    if (error.code === 'ENOENT') return '';
    throw error;
  }
  try {
    const { size } = fstatSync(handle);
    const buffer = Buffer.alloc(Math.min(size, 64 * 1024));
    const read = readSync(handle, buffer, 0, buffer.length, size - buffer.length);
    return buffer.subarray(0, read).toString('utf8').trimEnd().split('\n').slice(-count).join('\n');
  } finally {
    closeSync(handle);
  }
}

/** @param {unknown} error */
export function explain(error) {
  if (!(error instanceof Stop)) {
    say(error instanceof Error ? (error.stack ?? error.message) : String(error));
    return;
  }
  const tail = error.logFile ? lastLines(error.logFile) : '';
  if (tail) say(`--- the last lines of ${error.logFile}\n${tail}\n---`);
  say(error.message);
}

/**
 * A reader that closes the pipe early (`npm start | head`) must not take the service down with it.
 */
export function surviveClosedOutput() {
  for (const stream of [process.stdout, process.stderr]) {
    stream.on('error', (error) => {
      if (error.code !== 'EPIPE') throw error;
    });
  }
}
