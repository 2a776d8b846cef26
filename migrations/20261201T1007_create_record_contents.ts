import type { Knex } from 'knex';

// Readings kept whole by content hash; the same file is kept once. `readings` is gzip of JSON.
export const config = { transaction: false };

export async function up(knex: Knex): Promise<void> {
  await knex.raw(`
CREATE TABLE record_contents (
  id BIGINT UNSIGNED NOT NULL AUTO_INCREMENT,
  sha256 CHAR(64) CHARACTER SET ascii COLLATE ascii_bin NOT NULL,
  readings LONGBLOB NOT NULL,
  second_probe LONGBLOB NULL,
  count INT UNSIGNED NOT NULL,
  strip JSON NOT NULL,
  created_at DATETIME(3) NOT NULL DEFAULT CURRENT_TIMESTAMP(3),
  PRIMARY KEY (id),
  UNIQUE KEY record_contents_sha256_unique (sha256)
) ENGINE=InnoDB DEFAULT CHARSET=utf8mb4 COLLATE=utf8mb4_unicode_ci
  `);
}

export async function down(knex: Knex): Promise<void> {
  await knex.raw('DROP TABLE record_contents');
}
