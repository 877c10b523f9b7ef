import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS audit_events (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      userId BIGINT UNSIGNED NULL,
      action VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      subjectType VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NULL,
      subjectId VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NULL,
      portfolioId BIGINT UNSIGNED NULL,
      address VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NULL,
      details JSON NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      KEY audit_events_user (userId),
      KEY audit_events_portfolio (portfolioId),
      KEY audit_events_time (createdAt, id)
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS audit_events');
};
