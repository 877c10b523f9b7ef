import { detectEncoding, createDecoder } from '@/lib/bibliography/decode';
import { detectFormat } from '@/lib/bibliography/detect';
import { sketchTable, type ColumnKind, type TableSketch } from '@/lib/bibliography/readers/delimited-columns';
import { keyHash } from '@/lib/catalogue/key-hash';
import { invalid } from '@/lib/errors';
import { storage } from '@/lib/services/storage';
import { ColumnMapping } from '@/models/column-mapping';
import { type Import } from '@/models/import';

/** Bytes of the file that are looked at: head and first rows of any table that people make. */
const looked = 256 * 1024;

async function beginningOf(row: Pick<Import, 'storageKey' | 'encoding'>): Promise<string> {
  const chunks: Buffer[] = [];
  let bytes = 0;
  for await (const chunk of storage().stream(row.storageKey) as AsyncIterable<Buffer>) {
    chunks.push(chunk);
    bytes += chunk.length;
    if (bytes >= looked) break;
  }
  const head = Buffer.concat(chunks).subarray(0, looked);
  const text = createDecoder(row.encoding ?? detectEncoding(head).encoding).write(head);
  // The last line may be cut in the middle.
  return bytes >= looked ? text.slice(0, text.lastIndexOf('\n') + 1) : text;
}

/** Tables with the same head, whatever its case and blanks, are read alike. */
const hashOf = (heads: readonly string[]) => keyHash(JSON.stringify(heads.map((head) => head.toLowerCase().replace(/\s+/g, ' '))));

export interface TableColumns extends TableSketch {
  /** What a person said that the columns hold; null where their heads decided. */
  chosen: (ColumnKind | null)[] | null;
}

/** Head, guesses and first rows of an import that is a table. Throws 422 for one that is none. */
export async function describeColumns(row: Import): Promise<TableColumns> {
  const sketch = (row.format ?? row.chosenFormat ?? 'delimited') === 'delimited' ? sketchTable(await beginningOf(row)) : null;
  if (!sketch) throw invalid(`${row.fileName} was not read as a table with columns. If it is one, read it again as a delimited table first.`, { format: 'no table' });
  return { ...sketch, chosen: row.columns?.length === sketch.heads.length ? row.columns : null };
}

/** Keeps what a person says about a table's columns, for all later tables of theirs with the same head. Throws 422 when it does not fit the table. */
export async function rememberColumns(userId: number, row: Import, columns: (ColumnKind | null)[]): Promise<void> {
  const { heads } = await describeColumns(row);
  if (columns.length !== heads.length) throw invalid(`The table has ${heads.length} columns, and ${columns.length} were named.`, { columns: 'not as many as the table has' });
  if (!columns.includes('title') && !columns.includes('doi')) throw invalid('Say which column holds the title, or the DOI; without either nothing tells what a work is.', { columns: 'neither title nor DOI' });
  await ColumnMapping.upsert({ userId, headHash: hashOf(heads), columns });
}

/** What the uploader said of an earlier table with the same head. Null for files that are no table, and where nothing was said. */
export async function recallColumns(row: Import): Promise<(ColumnKind | null)[] | null> {
  if (row.uploadedById === null || (row.chosenFormat !== null && row.chosenFormat !== 'delimited')) return null;
  const beginning = await beginningOf(row);
  if (row.chosenFormat === null && detectFormat(beginning)?.format !== 'delimited') return null;
  const sketch = sketchTable(beginning);
  const known = sketch && (await ColumnMapping.findOne({ where: { userId: row.uploadedById, headHash: hashOf(sketch.heads) } }));
  return known && known.columns.length === sketch.heads.length ? known.columns : null;
}
