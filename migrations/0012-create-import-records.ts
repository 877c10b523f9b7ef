import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS import_records (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      importId BIGINT UNSIGNED NOT NULL,
      position INT UNSIGNED NOT NULL,
      line INT UNSIGNED NOT NULL,
      entryKey VARCHAR(255) NULL,
      title VARCHAR(500) NULL,
      raw MEDIUMTEXT NOT NULL,
      fields LONGTEXT NULL,
      outcome VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NULL,
      catalogued TINYINT(1) NOT NULL DEFAULT 0,
      citing TINYINT(1) NOT NULL DEFAULT 0,
      referenceCount INT UNSIGNED NOT NULL DEFAULT 0,
      workId BIGINT UNSIGNED NULL,
      UNIQUE KEY import_records_position (importId, position),
      KEY import_records_outcome (importId, outcome, position),
      KEY import_records_work (workId, citing),
      CONSTRAINT import_records_import FOREIGN KEY (importId) REFERENCES imports (id) ON DELETE CASCADE,
      CONSTRAINT import_records_work FOREIGN KEY (workId) REFERENCES works (id) ON DELETE SET NULL
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS import_records');
};
