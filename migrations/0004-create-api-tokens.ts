import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS api_tokens (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      userId BIGINT UNSIGNED NOT NULL,
      name VARCHAR(120) NOT NULL,
      tokenHash BINARY(32) NOT NULL,
      hint VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      lastUsedAt DATETIME(3) NULL,
      expiresAt DATETIME(3) NULL,
      revokedAt DATETIME(3) NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      UNIQUE KEY api_tokens_token (tokenHash),
      KEY api_tokens_user (userId),
      CONSTRAINT api_tokens_user FOREIGN KEY (userId) REFERENCES users (id) ON DELETE CASCADE
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS api_tokens');
};
