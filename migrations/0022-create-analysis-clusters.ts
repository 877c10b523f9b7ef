import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS analysis_clusters (
      analysisId BIGINT UNSIGNED NOT NULL,
      basis VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      number SMALLINT UNSIGNED NOT NULL,
      letter VARCHAR(4) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      name VARCHAR(300) NOT NULL,
      size INT UNSIGNED NOT NULL,
      terms JSON NOT NULL,
      firmness DOUBLE NULL,
      conductance DOUBLE NULL,
      firstYear SMALLINT NULL,
      medianYear DOUBLE NULL,
      lastYear SMALLINT NULL,
      PRIMARY KEY (analysisId, basis, number),
      CONSTRAINT analysis_clusters_analysis FOREIGN KEY (analysisId) REFERENCES analyses (id) ON DELETE CASCADE
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS analysis_clusters');
};
