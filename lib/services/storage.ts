import { createHash, randomUUID } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import { mkdir, readFile, rename, rm, writeFile } from 'node:fs/promises';
import path from 'node:path';
import { Transform, type Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';

import { environment } from '@/lib/environment';
import { tooLarge } from '@/lib/errors';

/** Where uploads and artifacts are kept. Keys are slash-separated, made by the service, never by a person. */
export interface Storage {
  /** Streams to a new object; gives its size and SHA-256. Throws ExpectedError 413 past the limit, and leaves nothing behind then. */
  put(key: string, content: Readable, limit: number): Promise<{ bytes: number; sha256: string }>;
  write(key: string, content: Buffer | string): Promise<void>;
  read(key: string): Promise<Buffer>;
  stream(key: string): Readable;
  remove(key: string): Promise<void>;
}

class FolderStorage implements Storage {
  constructor(private readonly folder: string) {}

  private place(key: string): string {
    if (!/^[a-z0-9][a-z0-9./_-]*$/i.test(key) || key.includes('..')) throw new Error(`Not a storage key: ${key}`);
    return path.join(this.folder, key);
  }

  async put(key: string, content: Readable, limit: number): Promise<{ bytes: number; sha256: string }> {
    const place = this.place(key);
    const half = `${place}.${randomUUID()}.part`;
    await mkdir(path.dirname(place), { recursive: true });
    const hash = createHash('sha256');
    let bytes = 0;
    const measure = new Transform({
      transform(chunk: Buffer, _encoding, done) {
        bytes += chunk.length;
        if (bytes > limit) return done(tooLarge(`The file is larger than ${Math.floor(limit / 1024 ** 2)} MiB; nothing of it was kept. Split it and upload the parts.`));
        hash.update(chunk);
        done(null, chunk);
      },
    });
    try {
      await pipeline(content, measure, createWriteStream(half));
      // Renaming is what makes the object appear: a killed process or a full disk never leaves half a file under its name.
      await rename(half, place);
    } catch (error) {
      await rm(half, { force: true });
      throw error;
    }
    return { bytes, sha256: hash.digest('hex') };
  }

  async write(key: string, content: Buffer | string): Promise<void> {
    const place = this.place(key);
    const half = `${place}.${randomUUID()}.part`;
    await mkdir(path.dirname(place), { recursive: true });
    await writeFile(half, content);
    await rename(half, place);
  }

  read(key: string): Promise<Buffer> {
    return readFile(this.place(key));
  }

  stream(key: string): Readable {
    return createReadStream(this.place(key), { highWaterMark: 256 * 1024 });
  }

  async remove(key: string): Promise<void> {
    await rm(this.place(key), { force: true });
  }
}

let open: Storage | undefined;

export function storage(): Storage {
  open ??= new FolderStorage(path.resolve(environment().HEDDLE_DATA));
  return open;
}
