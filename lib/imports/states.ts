import { type Transaction } from 'sequelize';

import { conflict } from '@/lib/errors';
import { Import, type ImportState } from '@/models/import';

type Changes = Partial<Pick<Import, 'counts' | 'checkedVersion' | 'error' | 'startedAt' | 'acceptedAt' | 'acceptedById' | 'undoneAt' | 'standing' | 'chosenFormat' | 'encoding' | 'format' | 'columns'>>;

/** Moves an import from one of the given states to another; false when somebody else has moved it first. */
export async function moveImport(importId: number, from: ImportState[], to: ImportState, changes: Changes = {}, transaction?: Transaction): Promise<boolean> {
  const [moved] = await Import.update({ progressStage: null, progressDone: 0, progressTotal: 0, ...changes, state: to }, { where: { id: importId, state: from }, transaction });
  return moved > 0;
}

/** As moveImport, but answers a person who came too late. */
export async function moveImportOrRefuse(row: Import, from: ImportState[], to: ImportState, changes: Changes, transaction: Transaction): Promise<void> {
  if (await moveImport(row.id, from, to, changes, transaction)) return;
  const now = await Import.findByPk(row.id, { transaction });
  throw conflict(`The import is ${now?.state ?? 'gone'} now; this can be done while it is ${from.join(' or ')}. Load the page again.`, { state: now?.state ?? null });
}
