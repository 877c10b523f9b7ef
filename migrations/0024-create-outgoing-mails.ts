import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS outgoing_mails (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      recipient VARCHAR(254) NOT NULL,
      subject VARCHAR(300) NOT NULL,
      body TEXT NOT NULL,
      state VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      error TEXT NULL,
      sentAt DATETIME(3) NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      KEY outgoing_mails_time (createdAt, id)
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS outgoing_mails');
};
