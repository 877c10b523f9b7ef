import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS jobs (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      kind VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      payload JSON NOT NULL,
      state VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'queued',
      uniqueKey VARCHAR(120) CHARACTER SET ascii COLLATE ascii_bin NULL,
      portfolioId BIGINT UNSIGNED NULL,
      createdById BIGINT UNSIGNED NULL,
      attempts INT UNSIGNED NOT NULL DEFAULT 0,
      maximumAttempts INT UNSIGNED NOT NULL DEFAULT 3,
      runAfter DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      leaseUntil DATETIME(3) NULL,
      worker VARCHAR(80) CHARACTER SET ascii COLLATE ascii_bin NULL,
      cancelRequested TINYINT(1) NOT NULL DEFAULT 0,
      progressStage VARCHAR(40) CHARACTER SET ascii COLLATE ascii_bin NULL,
      progressDone BIGINT UNSIGNED NOT NULL DEFAULT 0,
      progressTotal BIGINT UNSIGNED NOT NULL DEFAULT 0,
      error TEXT NULL,
      startedAt DATETIME(3) NULL,
      finishedAt DATETIME(3) NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      updatedAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      UNIQUE KEY jobs_unique (uniqueKey),
      KEY jobs_claim (state, runAfter, id),
      KEY jobs_portfolio (portfolioId),
      KEY jobs_creator (createdById),
      CONSTRAINT jobs_portfolio FOREIGN KEY (portfolioId) REFERENCES portfolios (id) ON DELETE CASCADE,
      CONSTRAINT jobs_creator FOREIGN KEY (createdById) REFERENCES users (id) ON DELETE SET NULL
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS jobs');
};
