import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS invitations (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      email VARCHAR(254) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NOT NULL,
      name VARCHAR(200) NOT NULL,
      role VARCHAR(16) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      tokenHash BINARY(32) NOT NULL,
      invitedById BIGINT UNSIGNED NULL,
      expiresAt DATETIME(3) NOT NULL,
      acceptedAt DATETIME(3) NULL,
      revokedAt DATETIME(3) NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      UNIQUE KEY invitations_token (tokenHash),
      KEY invitations_email (email),
      KEY invitations_inviter (invitedById),
      CONSTRAINT invitations_inviter FOREIGN KEY (invitedById) REFERENCES users (id) ON DELETE SET NULL
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS invitations');
};
