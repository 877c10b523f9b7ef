import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS work_texts (
      workId BIGINT UNSIGNED NOT NULL PRIMARY KEY,
      content TEXT NOT NULL,
      FULLTEXT KEY work_texts_content (content),
      CONSTRAINT work_texts_work FOREIGN KEY (workId) REFERENCES works (id) ON DELETE CASCADE
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS work_texts');
};
