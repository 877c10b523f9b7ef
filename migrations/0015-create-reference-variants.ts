import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS reference_variants (
      hash BINARY(16) NOT NULL PRIMARY KEY,
      doi VARCHAR(300) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
      pmid VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NULL,
      identifierKey BINARY(16) NULL,
      fieldKey BINARY(16) NULL,
      titleKey BINARY(16) NULL,
      ownKey BINARY(16) NOT NULL,
      author VARCHAR(200) NULL,
      family VARCHAR(120) NULL,
      year SMALLINT NULL,
      title VARCHAR(600) NULL,
      source VARCHAR(300) NULL,
      volume VARCHAR(60) NULL,
      issue VARCHAR(60) NULL,
      page VARCHAR(60) NULL,
      raw VARCHAR(1000) NOT NULL,
      standing INT NOT NULL DEFAULT 0,
      workId BIGINT UNSIGNED NULL,
      how VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NULL,
      KEY reference_variants_identifier (identifierKey),
      KEY reference_variants_field (fieldKey),
      KEY reference_variants_title (titleKey),
      KEY reference_variants_work (workId),
      CONSTRAINT reference_variants_work FOREIGN KEY (workId) REFERENCES works (id) ON DELETE SET NULL
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS reference_variants');
};
