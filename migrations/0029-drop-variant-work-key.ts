import { type Migration } from '@/lib/db/migrate';

/**
 * Where a variant leads is derived, and written a hundred thousand rows at a time, in the transaction that
 * writes the works themselves.
 * The index stays. tests/integration/catalogue proves that no variant leads to a work that is gone.
 */
export const up: Migration = async ({ context: database }) => {
  await database.query('ALTER TABLE reference_variants DROP FOREIGN KEY IF EXISTS reference_variants_work');
};

export const down: Migration = async ({ context: database }) => {
  await database.query('ALTER TABLE reference_variants ADD CONSTRAINT reference_variants_work FOREIGN KEY (workId) REFERENCES works (id) ON DELETE SET NULL');
};
