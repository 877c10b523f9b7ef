/** The real files of tests/fixtures/corpus, decoded as the service decodes them. */
import { readFileSync } from 'node:fs';

import { createDecoder, createUtf8Validator, detectEncoding } from '@/lib/bibliography/decode';
import { type Format } from '@/lib/bibliography/record';

export interface CorpusFile {
  path: string;
  format: Format;
  entries: number;
  references: number;
  text: string;
}

const root = new URL('../../fixtures/corpus/', import.meta.url);

export function decodeBytes(bytes: Uint8Array, chunkSize = 65_536): { text: string; encoding: string } {
  let { encoding } = detectEncoding(bytes.subarray(0, 65_536)) as { encoding: string };
  const validator = createUtf8Validator();
  if (encoding === 'utf-8' && !(validator.push(bytes) && validator.end())) encoding = 'windows-1252';
  const decoder = createDecoder(encoding);
  const pieces: string[] = [];
  for (let at = 0; at < bytes.length; at += chunkSize) pieces.push(decoder.write(bytes.subarray(at, at + chunkSize)));
  return { text: pieces.join('') + decoder.end(), encoding };
}

export const corpus: CorpusFile[] = readFileSync(new URL('manifest.tsv', root), 'utf8')
  .trim()
  .split('\n')
  .slice(1)
  .map((row) => {
    const [path, , format, entries, references] = row.split('\t');
    return { path, format: format as Format, entries: Number(entries), references: Number(references), text: decodeBytes(readFileSync(new URL(path, root))).text };
  });
