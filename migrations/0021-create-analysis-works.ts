import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS analysis_works (
      analysisId BIGINT UNSIGNED NOT NULL,
      position INT UNSIGNED NOT NULL,
      workId BIGINT UNSIGNED NOT NULL,
      catalogued TINYINT(1) NOT NULL,
      title VARCHAR(1000) NULL,
      authorsLabel VARCHAR(300) NULL,
      year SMALLINT NULL,
      venue VARCHAR(300) NULL,
      doi VARCHAR(300) CHARACTER SET utf8mb4 COLLATE utf8mb4_bin NULL,
      retracted TINYINT(1) NOT NULL DEFAULT 0,
      inDegree INT UNSIGNED NOT NULL,
      outDegree INT UNSIGNED NOT NULL,
      pageRank DOUBLE NOT NULL,
      pageRankHigh DOUBLE NOT NULL,
      \`rank\` INT UNSIGNED NOT NULL,
      rankLow INT UNSIGNED NOT NULL,
      rankHigh INT UNSIGNED NOT NULL,
      citationRank INT UNSIGNED NOT NULL,
      citationRankLow INT UNSIGNED NOT NULL,
      citationRankHigh INT UNSIGNED NOT NULL,
      agePercentile DOUBLE NULL,
      citationsPerYear DOUBLE NULL,
      inLoop TINYINT(1) NOT NULL,
      cocitationCluster SMALLINT NULL,
      cocitationFirmness DOUBLE NULL,
      couplingCluster SMALLINT NULL,
      couplingFirmness DOUBLE NULL,
      citationCluster SMALLINT NULL,
      citationFirmness DOUBLE NULL,
      PRIMARY KEY (analysisId, position),
      KEY analysis_works_work (analysisId, workId),
      KEY analysis_works_rank (analysisId, \`rank\`, position),
      KEY analysis_works_degree (analysisId, inDegree, position),
      KEY analysis_works_year (analysisId, year, position),
      CONSTRAINT analysis_works_analysis FOREIGN KEY (analysisId) REFERENCES analyses (id) ON DELETE CASCADE
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS analysis_works');
};
