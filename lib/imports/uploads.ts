import { randomUUID } from 'node:crypto';
import { type Readable } from 'node:stream';

import { UniqueConstraintError } from 'sequelize';

import { type Actor } from '@/lib/access/permissions';
import { type Format } from '@/lib/bibliography/record';
import { database } from '@/lib/db/connection';
import { environment } from '@/lib/environment';
import { invalid } from '@/lib/errors';
import { enqueue } from '@/lib/jobs/queue';
import { storage } from '@/lib/services/storage';
import { Import } from '@/models/import';

/** A file name as a person may see it: no path, no control characters, at most 255 characters. */
export function cleanFileName(name: string): string {
  const bare = name.split(/[\\/]/).pop() ?? '';
   
  const clean = bare.replace(/[\u0000-\u001f\u007f\u202a-\u202e\u2066-\u2069]/g, '').trim().slice(0, 255);
  return clean || 'unnamed';
}

export interface ReceivedImport {
  row: Import;
  /** The same file already stands in this portfolio; `row` is the earlier import. */
  alreadyThere: boolean;
}

/**
 * Streams one uploaded file to storage and queues its reading. The same file twice in one portfolio is recognised by its SHA-256: a unique
 * key settles it, also between two people at once.
 */
export async function receiveUpload(
  actor: Pick<Actor, 'userId'>,
  portfolioId: number,
  file: { name: string; content: Readable },
  options: { format?: Format | null; autoAccept?: boolean } = {},
): Promise<ReceivedImport> {
  const storageKey = `uploads/${randomUUID()}`;
  const { bytes, sha256 } = await storage().put(storageKey, file.content, environment().HEDDLE_UPLOAD_LIMIT);
  const fileName = cleanFileName(file.name);
  if (bytes === 0) {
    await storage().remove(storageKey);
    throw invalid(`${fileName} is empty; nothing was imported.`, { files: 'empty file' });
  }
  try {
    const row = await database().transaction(async (transaction) => {
      const created = await Import.create(
        { portfolioId, uploadedById: actor.userId, fileName, chosenFormat: options.format ?? null, sha256, standing: sha256, bytes, storageKey, state: 'uploaded', autoAccept: options.autoAccept ?? false },
        { transaction },
      );
      await enqueue('import.read', { importId: created.id }, { portfolioId, createdById: actor.userId, transaction });
      return created;
    });
    return { row, alreadyThere: false };
  } catch (error) {
    await storage().remove(storageKey);
    if (!(error instanceof UniqueConstraintError)) throw error;
    const earlier = await Import.findOne({ where: { portfolioId, standing: sha256 } });
    if (!earlier) throw error;
    return { row: earlier, alreadyThere: true };
  }
}
