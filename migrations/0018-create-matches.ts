import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS matches (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      kind VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      leftRecordId BIGINT UNSIGNED NOT NULL,
      rightRecordId BIGINT UNSIGNED NOT NULL,
      score DOUBLE NOT NULL,
      weight DOUBLE NOT NULL,
      reasons JSON NOT NULL,
      state VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      decidedById BIGINT UNSIGNED NULL,
      decidedAt DATETIME(3) NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      UNIQUE KEY matches_pair (leftRecordId, rightRecordId),
      KEY matches_right (rightRecordId),
      KEY matches_state (state, id),
      KEY matches_decider (decidedById),
      CONSTRAINT matches_left FOREIGN KEY (leftRecordId) REFERENCES import_records (id) ON DELETE CASCADE,
      CONSTRAINT matches_right FOREIGN KEY (rightRecordId) REFERENCES import_records (id) ON DELETE CASCADE,
      CONSTRAINT matches_decider FOREIGN KEY (decidedById) REFERENCES users (id) ON DELETE SET NULL
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS matches');
};
