import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS cited_references (
      recordId BIGINT UNSIGNED NOT NULL,
      position INT UNSIGNED NOT NULL,
      line INT UNSIGNED NOT NULL,
      variantHash BINARY(16) NOT NULL,
      raw VARCHAR(4000) NOT NULL,
      PRIMARY KEY (recordId, position),
      KEY cited_references_variant (variantHash, recordId),
      CONSTRAINT cited_references_record FOREIGN KEY (recordId) REFERENCES import_records (id) ON DELETE CASCADE
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS cited_references');
};
