import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS portfolio_grants (
      portfolioId BIGINT UNSIGNED NOT NULL,
      userId BIGINT UNSIGNED NOT NULL,
      level VARCHAR(12) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
      grantedById BIGINT UNSIGNED NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      PRIMARY KEY (portfolioId, userId),
      KEY portfolio_grants_user (userId),
      KEY portfolio_grants_granter (grantedById),
      CONSTRAINT portfolio_grants_portfolio FOREIGN KEY (portfolioId) REFERENCES portfolios (id) ON DELETE CASCADE,
      CONSTRAINT portfolio_grants_user FOREIGN KEY (userId) REFERENCES users (id) ON DELETE CASCADE,
      CONSTRAINT portfolio_grants_granter FOREIGN KEY (grantedById) REFERENCES users (id) ON DELETE SET NULL
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS portfolio_grants');
};
