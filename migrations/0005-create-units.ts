import { type Migration } from '@/lib/db/migrate';

export const up: Migration = async ({ context: database }) => {
  await database.query(`
    CREATE TABLE IF NOT EXISTS units (
      id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT PRIMARY KEY,
      parentId BIGINT UNSIGNED NULL,
      name VARCHAR(200) NOT NULL,
      kind VARCHAR(24) CHARACTER SET ascii COLLATE ascii_bin NOT NULL DEFAULT 'department',
      seedKey VARCHAR(60) CHARACTER SET ascii COLLATE ascii_bin NULL,
      createdAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      updatedAt DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
      UNIQUE KEY units_seed (seedKey),
      KEY units_parent (parentId),
      CONSTRAINT units_parent FOREIGN KEY (parentId) REFERENCES units (id) ON DELETE RESTRICT
    ) ENGINE = InnoDB DEFAULT CHARSET = utf8mb4 COLLATE = utf8mb4_unicode_520_ci`);
};

export const down: Migration = async ({ context: database }) => {
  await database.query('DROP TABLE IF EXISTS units');
};
