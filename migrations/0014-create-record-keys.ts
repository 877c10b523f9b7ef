import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS record_keys (
      keyHash BINARY(16) NOT NULL,
      recordId BIGINT UNSIGNED NOT NULL,
      kind TINYINT UNSIGNED NOT NULL,
      PRIMARY KEY (keyHash, recordId),
      KEY record_keys_record (recordId),
      CONSTRAINT record_keys_record FOREIGN KEY (recordId) REFERENCES import_records (id) ON DELETE CASCADE
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS record_keys');
};
