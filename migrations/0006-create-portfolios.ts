import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS portfolios (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      unitId BIGINT UNSIGNED NULL,
      name VARCHAR(200) NOT NULL,
      description VARCHAR(2000) NOT NULL DEFAULT '',
      periodFrom SMALLINT NULL,
      periodTo SMALLINT NULL,
      createdById BIGINT UNSIGNED NULL,
      demonstration TINYINT(1) NOT NULL DEFAULT 0,
      seedKey VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NULL,
      deletedAt DATETIME(3) NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      updatedAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      UNIQUE KEY portfolios_seed (seedKey),
      KEY portfolios_unit (unitId),
      KEY portfolios_creator (createdById),
      KEY portfolios_name (name),
      CONSTRAINT portfolios_unit FOREIGN KEY (unitId) REFERENCES units (id) ON DELETE SET NULL,
      CONSTRAINT portfolios_creator FOREIGN KEY (createdById) REFERENCES users (id) ON DELETE SET NULL
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS portfolios');
};
