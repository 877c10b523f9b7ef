import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS portfolio_works (
      portfolioId BIGINT UNSIGNED NOT NULL,
      workId BIGINT UNSIGNED NOT NULL,
      membership VARCHAR(8) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      addedById BIGINT UNSIGNED NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      PRIMARY KEY (portfolioId, workId),
      KEY portfolio_works_work (workId),
      KEY portfolio_works_adder (addedById),
      CONSTRAINT portfolio_works_portfolio FOREIGN KEY (portfolioId) REFERENCES portfolios (id) ON DELETE CASCADE,
      CONSTRAINT portfolio_works_work FOREIGN KEY (workId) REFERENCES works (id) ON DELETE CASCADE,
      CONSTRAINT portfolio_works_adder FOREIGN KEY (addedById) REFERENCES users (id) ON DELETE SET NULL
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS portfolio_works');
};
