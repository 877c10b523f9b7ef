import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS import_problems (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      importId BIGINT UNSIGNED NOT NULL,
      position INT UNSIGNED NULL,
      line INT UNSIGNED NOT NULL,
      severity VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      code VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      message VARCHAR(500) NOT NULL,
      entryKey VARCHAR(255) NULL,
      KEY import_problems_line (importId, line, id),
      CONSTRAINT import_problems_import FOREIGN KEY (importId) REFERENCES imports (id) ON DELETE CASCADE
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS import_problems');
};
