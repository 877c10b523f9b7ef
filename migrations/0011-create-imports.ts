import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS imports (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      portfolioId BIGINT UNSIGNED NOT NULL,
      uploadedById BIGINT UNSIGNED NULL,
      fileName VARCHAR(255) NOT NULL,
      chosenFormat VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NULL,
      format VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NULL,
      encoding VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NULL,
      sha256 CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      bytes BIGINT UNSIGNED NOT NULL,
      storageKey VARCHAR(200) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      state VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      autoAccept TINYINT(1) NOT NULL DEFAULT 0,
      progressStage VARCHAR(24) CHARACTER SET ascii COLLATE ascii_bin NULL,
      progressDone BIGINT UNSIGNED NOT NULL DEFAULT 0,
      progressTotal BIGINT UNSIGNED NOT NULL DEFAULT 0,
      startedAt DATETIME(3) NULL,
      checkedVersion BIGINT UNSIGNED NULL,
      counts JSON NULL,
      error TEXT NULL,
      acceptedAt DATETIME(3) NULL,
      acceptedById BIGINT UNSIGNED NULL,
      undoneAt DATETIME(3) NULL,
      standing CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      updatedAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      UNIQUE KEY imports_same_file (portfolioId, standing),
      KEY imports_listing (portfolioId, id),
      KEY imports_uploader (uploadedById),
      KEY imports_accepter (acceptedById),
      CONSTRAINT imports_portfolio FOREIGN KEY (portfolioId) REFERENCES portfolios (id) ON DELETE CASCADE,
      CONSTRAINT imports_uploader FOREIGN KEY (uploadedById) REFERENCES users (id) ON DELETE SET NULL,
      CONSTRAINT imports_accepter FOREIGN KEY (acceptedById) REFERENCES users (id) ON DELETE SET NULL
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS imports');
};
