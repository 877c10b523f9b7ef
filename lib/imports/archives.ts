import { createWriteStream } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import path from 'node:path';
import { PassThrough, Readable, Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { createGunzip } from 'node:zlib';

import { openPromise, type Entry, type ZipFile } from 'yauzl';

import { type Actor } from '@/lib/access/permissions';
import { environment } from '@/lib/environment';
import { ExpectedError, invalid, tooLarge } from '@/lib/errors';
import { cleanFileName, receiveUpload, type ReceivedImport } from '@/lib/imports/uploads';

type UploadOptions = Parameters<typeof receiveUpload>[3];

const mostFiles = 1_000;
/** A list of references shrinks to a fifth or a tenth; what grows a hundred times over was made to fill the disk. */
const mostGrowth = 200;
/** Below this many bytes growth is no danger. */
const harmless = 16 * 1024 ** 2;

/** Folders that operating systems add, and what they put beside the files. */
const notAFile = (name: string) => name.endsWith('/') || /(^|\/)(__MACOSX\/|\.DS_Store$|Thumbs\.db$)/.test(name);

/** The path within the archive as people see it; it names nothing on any disk. */
export function nameWithin(entry: string): string {
  const parts = entry.split(/[\\/]/).filter((part) => part !== '' && part !== '.' && part !== '..');
  return parts.map(cleanFileName).join(' › ').slice(-255);
}

/** The first bytes of a stream, and a stream that still has all of them. */
async function lookAhead(content: Readable, length: number): Promise<{ head: Buffer; whole: Readable }> {
  const chunks: Buffer[] = [];
  const iterator = content[Symbol.asyncIterator]() as AsyncIterator<Buffer>;
  for (let held = 0; held < length; ) {
    const next = await iterator.next();
    if (next.done) break;
    chunks.push(Buffer.from(next.value));
    held += next.value.length;
  }
  const head = Buffer.concat(chunks);
  async function* all(): AsyncGenerator<Buffer> {
    try {
      if (head.length > 0) yield head;
      for (let next = await iterator.next(); !next.done; next = await iterator.next()) yield next.value;
    } finally {
      // Whoever stops early lets go of the source as well.
      await iterator.return?.();
    }
  }
  return { head, whole: Readable.from(all(), { objectMode: false }) };
}

/** Ends a stream that grows past what such a file can honestly hold. `packed` tells the compressed bytes so far. */
function watchGrowth(name: string, packed: () => number): Transform {
  let bytes = 0;
  return new Transform({
    transform(chunk: Buffer, _encoding, done) {
      bytes += chunk.length;
      if (bytes > harmless && bytes > mostGrowth * packed()) return done(invalid(`${name} grows more than ${mostGrowth} times over when it is unpacked; nothing of it was kept. Upload the file inside it as it is.`, { files: 'grows too much' }));
      done(null, chunk);
    },
  });
}

async function entriesOf(zip: ZipFile, name: string): Promise<Entry[]> {
  const refuse = (why: string) => invalid(`${name} was not unpacked, and nothing of it was kept: ${why}`, { files: 'archive refused' });
  const entries: Entry[] = [];
  let total = 0;
  for await (const entry of zip.eachEntry()) {
    if (entry.fileName === '[Content_Types].xml') throw refuse('it is a document or workbook, not an archive of lists. Export the references as BibTeX, RIS or another format that Heddle reads.');
    if (notAFile(entry.fileName) || entry.uncompressedSize === 0) continue;
    const shown = nameWithin(entry.fileName);
    if (entry.isEncrypted()) throw refuse(`${shown} in it is encrypted. Pack it again without a password.`);
    if (!entry.canDecodeFileData()) throw refuse(`${shown} in it is compressed in a way that is not read. Pack it again as an ordinary zip.`);
    if (entry.uncompressedSize > harmless && entry.uncompressedSize > mostGrowth * entry.compressedSize) throw refuse(`${shown} in it grows more than ${mostGrowth} times over. Upload that file as it is.`);
    total += entry.uncompressedSize;
    entries.push(entry);
    if (entries.length > mostFiles) throw refuse(`it holds more than ${mostFiles} files. Pack them in several archives.`);
  }
  if (total > environment().HEDDLE_UPLOAD_LIMIT) throw tooLarge(`${name} unpacks to more than ${Math.floor(environment().HEDDLE_UPLOAD_LIMIT / 1024 ** 2)} MiB; nothing of it was kept. Pack its files in several archives.`);
  if (entries.length === 0) throw refuse('it holds no file with anything in it.');
  return entries;
}

/** An archive is looked through before the first file of it is taken: what must be refused is refused whole. */
async function receiveZip(actor: Pick<Actor, 'userId'>, portfolioId: number, name: string, content: Readable, options: UploadOptions): Promise<ReceivedImport[]> {
  const folder = await mkdtemp(path.join(tmpdir(), 'heddle-archive-'));
  let zip: ZipFile | null = null;
  try {
    const place = path.join(folder, 'archive.zip');
    await pipeline(content, limited(name, environment().HEDDLE_UPLOAD_LIMIT), createWriteStream(place));
    zip = await openPromise(place, { autoClose: false });
    const received: ReceivedImport[] = [];
    for (const entry of await entriesOf(zip, name)) {
      const shown = nameWithin(entry.fileName);
      try {
        received.push(...(await receiveOne(actor, portfolioId, shown, await zip.openReadStreamPromise(entry), options)));
      } catch (error) {
        const why = error instanceof Error ? error.message : String(error);
        const kept = received.length === 0 ? 'Nothing of it was kept.' : received.length === 1 ? 'The one file before it was kept.' : `The ${received.length} files before it were kept.`;
        if (error instanceof ExpectedError || isBroken(error)) throw invalid(`${name}: ${shown} could not be taken out: ${why} ${kept}`, { files: 'archive broken' });
        throw error;
      }
    }
    return received;
  } catch (error) {
    if (isBroken(error)) throw invalid(`${name} is no zip archive that can be read (${(error as Error).message}); nothing of it was kept.`, { files: 'archive broken' });
    throw error;
  } finally {
    zip?.close();
    await rm(folder, { recursive: true, force: true });
  }
}

/** Faults of the archive itself: the library's own plain errors, and those of the decompression. */
function isBroken(error: unknown): boolean {
  if (!(error instanceof Error) || error instanceof ExpectedError) return false;
  const { code } = error as NodeJS.ErrnoException;
  return code === undefined ? error.constructor === Error : code.startsWith('Z_');
}

function limited(name: string, limit: number): Transform {
  let bytes = 0;
  return new Transform({
    transform(chunk: Buffer, _encoding, done) {
      bytes += chunk.length;
      done(bytes > limit ? tooLarge(`${name} is larger than ${Math.floor(limit / 1024 ** 2)} MiB; nothing of it was kept.`) : null, chunk);
    },
  });
}

/** One file out of an archive: a list, or a list compressed once more; an archive in an archive is refused. */
async function receiveOne(actor: Pick<Actor, 'userId'>, portfolioId: number, name: string, content: Readable, options: UploadOptions): Promise<ReceivedImport[]> {
  const { head, whole } = await lookAhead(content, 4);
  if (isZip(head)) throw invalid('it is an archive within an archive. Unpack it first.', { files: 'nested archive' });
  return [await (isGzip(head) ? receiveGzip(actor, portfolioId, name, whole, options) : receiveUpload(actor, portfolioId, { name, content: whole }, options))];
}

async function receiveGzip(actor: Pick<Actor, 'userId'>, portfolioId: number, name: string, content: Readable, options: UploadOptions): Promise<ReceivedImport> {
  let packed = 0;
  const count = new Transform({
    transform(chunk: Buffer, _encoding, done) {
      packed += chunk.length;
      done(null, chunk);
    },
  });
  const unpacked = new PassThrough();
  const flow = pipeline(content, count, createGunzip(), watchGrowth(name, () => packed), unpacked);
  const [kept, flowed] = await Promise.allSettled([receiveUpload(actor, portfolioId, { name: name.replace(/\.gz$/i, ''), content: unpacked }, options), flow]);
  if (flowed.status === 'rejected' && isBroken(flowed.reason)) throw invalid(`${name} is compressed, and could not be unpacked (${(flowed.reason as Error).message}); nothing of it was kept.`, { files: 'archive broken' });
  if (flowed.status === 'rejected' && flowed.reason instanceof ExpectedError) throw flowed.reason;
  if (kept.status === 'rejected') throw kept.reason;
  if (flowed.status === 'rejected') throw flowed.reason;
  return kept.value;
}

const isZip = (head: Buffer) => head.length >= 4 && head[0] === 0x50 && head[1] === 0x4b && ((head[2] === 3 && head[3] === 4) || (head[2] === 5 && head[3] === 6));
const isGzip = (head: Buffer) => head.length >= 2 && head[0] === 0x1f && head[1] === 0x8b;

/** Takes in a file as it was sent: a list of references, one that is compressed, or a zip archive of such. Told by content, not by name. */
export async function receiveFile(actor: Pick<Actor, 'userId'>, portfolioId: number, file: { name: string; content: Readable }, options: UploadOptions = {}): Promise<ReceivedImport[]> {
  const { head, whole } = await lookAhead(file.content, 4);
  const name = cleanFileName(file.name);
  if (isZip(head)) return receiveZip(actor, portfolioId, name, whole, options);
  return [await (isGzip(head) ? receiveGzip(actor, portfolioId, name, whole, options) : receiveUpload(actor, portfolioId, { name, content: whole }, options))];
}
