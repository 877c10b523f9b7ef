import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS analyses (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      portfolioId BIGINT UNSIGNED NOT NULL,
      createdById BIGINT UNSIGNED NULL,
      parameters JSON NOT NULL,
      state VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      progressStage VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NULL,
      progressDone BIGINT UNSIGNED NOT NULL DEFAULT 0,
      progressTotal BIGINT UNSIGNED NOT NULL DEFAULT 0,
      inputFingerprint CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NULL,
      resultFingerprint CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NULL,
      verifiedAt DATETIME(3) NULL,
      verified VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NULL,
      engine VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NULL,
      coverage JSON NULL,
      summary JSON NULL,
      error TEXT NULL,
      startedAt DATETIME(3) NULL,
      finishedAt DATETIME(3) NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      updatedAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      KEY analyses_listing (portfolioId, id),
      KEY analyses_creator (createdById),
      CONSTRAINT analyses_portfolio FOREIGN KEY (portfolioId) REFERENCES portfolios (id) ON DELETE CASCADE,
      CONSTRAINT analyses_creator FOREIGN KEY (createdById) REFERENCES users (id) ON DELETE SET NULL
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS analyses');
};
