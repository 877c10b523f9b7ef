import { type Migration } from '@/lib/db/migrate';

/** What a person said the columns of a table hold; null where their heads decide. */
export const up: Migration = async ({ context: database }) => {
  await database.query('ALTER TABLE imports ADD COLUMN IF NOT EXISTS columns JSON NULL AFTER encoding');
};

export const down: Migration = async ({ context: database }) => {
  await database.query('ALTER TABLE imports DROP COLUMN IF EXISTS columns');
};
