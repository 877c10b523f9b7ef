import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS works (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      workKey BINARY(16) NOT NULL,
      catalogued TINYINT(1) NOT NULL,
      type VARCHAR(20) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'other',
      title TEXT NULL,
      titleSort VARCHAR(160) NULL,
      authors JSON NULL,
      authorsLabel VARCHAR(300) NULL,
      firstFamily VARCHAR(120) NULL,
      year SMALLINT NULL,
      venue VARCHAR(600) NULL,
      volume VARCHAR(60) NULL,
      issue VARCHAR(60) NULL,
      firstPage VARCHAR(60) NULL,
      lastPage VARCHAR(60) NULL,
      articleNumber VARCHAR(60) NULL,
      publisher VARCHAR(300) NULL,
      doi VARCHAR(300) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
      identifiers JSON NULL,
      abstract MEDIUMTEXT NULL,
      keywords JSON NULL,
      language VARCHAR(40) NULL,
      url VARCHAR(1000) NULL,
      retracted TINYINT(1) NOT NULL DEFAULT 0,
      recordCount INT UNSIGNED NOT NULL DEFAULT 0,
      referenceCount INT UNSIGNED NOT NULL DEFAULT 0,
      citingCount INT UNSIGNED NOT NULL DEFAULT 0,
      citedCount INT UNSIGNED NOT NULL DEFAULT 0,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      updatedAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      UNIQUE KEY works_key (workKey),
      KEY works_doi (doi),
      KEY works_listing_cited (catalogued, citedCount, id),
      KEY works_listing_year (catalogued, year, id),
      KEY works_listing_title (catalogued, titleSort, id)
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS works');
};
