import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS citations (
      citingWorkId BIGINT UNSIGNED NOT NULL,
      citedWorkId BIGINT UNSIGNED NOT NULL,
      referenceCount INT UNSIGNED NOT NULL,
      PRIMARY KEY (citingWorkId, citedWorkId),
      KEY citations_cited (citedWorkId, citingWorkId),
      CONSTRAINT citations_citing FOREIGN KEY (citingWorkId) REFERENCES works (id) ON DELETE CASCADE,
      CONSTRAINT citations_cited FOREIGN KEY (citedWorkId) REFERENCES works (id) ON DELETE CASCADE
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS citations');
};
