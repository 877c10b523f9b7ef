import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS users (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      email VARCHAR(254) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
      name VARCHAR(200) NOT NULL,
      role VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      passwordHash VARCHAR(255) CHARACTER SET ascii COLLATE ascii_bin NULL,
      sessionVersion INT UNSIGNED NOT NULL DEFAULT 0,
      disabledAt DATETIME(3) NULL,
      lastSignInAt DATETIME(3) NULL,
      demonstration TINYINT(1) NOT NULL DEFAULT 0,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      updatedAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      UNIQUE KEY users_email (email)
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS users');
};
