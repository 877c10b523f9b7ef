import { Readable } from 'node:stream';
import { type ReadableStream } from 'node:stream/web';

import busboy from 'busboy';

import { type Actor } from '@/lib/access/permissions';
import { formats, type Format } from '@/lib/bibliography/record';
import { invalid, unsupported } from '@/lib/errors';
import { receiveFile } from '@/lib/imports/archives';
import { type ReceivedImport } from '@/lib/imports/uploads';

const filesAtOnce = 100;

/**
 * Takes a multipart upload apart as it comes in: each file goes straight to storage, nothing is held in memory.
 * A zip archive gives an import for every file in it. An optional field `format` before the files chooses the format of those that follow.
 */
export async function receiveFiles(actor: Actor, portfolioId: number, request: Request, autoAccept: boolean): Promise<ReceivedImport[]> {
  const type = request.headers.get('content-type') ?? '';
  if (!/^multipart\/form-data\b/i.test(type) || !request.body) throw unsupported('Send the files as multipart/form-data, in the field "files".');
  let parser: busboy.Busboy;
  try {
    parser = busboy({ headers: { 'content-type': type }, defParamCharset: 'utf8', limits: { files: filesAtOnce, fields: 20, fieldSize: 1_000 } });
  } catch {
    throw unsupported('The multipart body names no boundary.');
  }
  let format: Format | null = null;
  const received: Promise<ReceivedImport[]>[] = [];
  const settled = new Promise<void>((resolve, reject) => {
    parser.on('field', (name, value) => {
      if (name !== 'format' || value === '') return;
      if ((formats as readonly string[]).includes(value)) format = value as Format;
      else reject(invalid(`The format "${value.slice(0, 40)}" is not known; it is one of ${formats.join(', ')}.`, { format: 'unknown format' }));
    });
    parser.on('file', (name, stream, information) => {
      if (name !== 'files') {
        stream.resume();
        return;
      }
      const one = receiveFile(actor, portfolioId, { name: information.filename ?? 'unnamed', content: stream }, { format, autoAccept });
      // The file that fails must not stall the parser: what is left of it is read and thrown away.
      one.catch((error: unknown) => {
        stream.resume();
        reject(error instanceof Error ? error : new Error(String(error)));
      });
      received.push(one);
    });
    parser.on('filesLimit', () => reject(invalid(`At most ${filesAtOnce} files can be sent at once.`)));
    parser.on('error', () => reject(invalid('The upload broke off or is not a valid multipart body. Files that had arrived whole were kept.')));
    parser.on('close', resolve);
  });
  const body = Readable.fromWeb(request.body as ReadableStream);
  body.on('error', (error) => parser.destroy(error));
  body.pipe(parser);
  try {
    await settled;
  } catch (error) {
    body.unpipe(parser);
    body.resume();
    await Promise.allSettled(received);
    throw error;
  }
  if (received.length === 0) throw invalid('No file came with the request; the field is called "files".', { files: 'missing' });
  return (await Promise.all(received)).flat();
}
